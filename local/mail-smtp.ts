import type { AddressInfo } from 'node:net';
import { buffer } from 'node:stream/consumers';
import { SMTPServer } from 'smtp-server';
import type { FaultSwitch } from './faults.ts';
import { Failure } from '../scripts/sentences.mjs';

const largestMessage = 50 * 1024 * 1024;

/** Takes one whole message; the sender is told that it is accepted when this resolves. */
export type Deliver = (from: string, to: string[], message: Buffer) => Promise<unknown>;

/** An SMTP port on 127.0.0.1 that can be closed and opened again. */
export class SmtpPort {
  private server: SMTPServer | undefined;

  /** `port` 0 chooses a free one at the first opening and keeps it. */
  constructor(
    public port: number,
    private readonly faults: FaultSwitch,
    private readonly deliver: Deliver,
  ) {}

  /** Starts to listen, unless it does. Throws a sentence when the port is taken. */
  async open(): Promise<void> {
    if (this.server) return;
    const server = this.create();
    await new Promise<void>((resolve, reject) => {
      server.on('error', (error: NodeJS.ErrnoException) => {
        // Connections that break off are a client's affair; only a failure to listen is ours.
        if (error.code === 'EADDRINUSE')
          reject(
            new Failure(
              `The mail catcher needs port ${this.port}, which another program is using.`,
            ),
          );
      });
      server.listen(this.port, '127.0.0.1', resolve);
    });
    this.port = (server.server.address() as AddressInfo).port;
    this.server = server;
  }

  /** Stops listening and ends every conversation, unless it is closed. */
  async close(): Promise<void> {
    const { server } = this;
    if (!server) return;
    this.server = undefined;
    await new Promise<void>((resolve) => {
      server.close(() => resolve());
      for (const connection of server.connections) connection._socket.destroy();
    });
  }

  private create(): SMTPServer {
    return new SMTPServer({
      authOptional: true,
      disabledCommands: ['STARTTLS', 'AUTH'],
      disableReverseLookup: true,
      size: largestMessage,
      onRcptTo: (_address, _session, answer) => answer(this.refusal()),
      onData: (stream, { envelope }, answer) => {
        const from = envelope.mailFrom ? envelope.mailFrom.address : '';
        const to = envelope.rcptTo.map(({ address }) => address);
        buffer(stream)
          .then(async (message) => {
            if (stream.sizeExceeded) throw reply(552, 'The message is larger than 50 MB.');
            await this.faults.delay();
            await this.deliver(from, to, message);
            answer();
          })
          .catch(answer);
      },
    });
  }

  private refusal(): Error | null {
    const { kind } = this.faults.current;
    if (kind === 'refuse') return reply(550, 'No such mailbox here.');
    return kind === 'defer' ? reply(451, 'Try again later.') : null;
  }
}

const reply = (responseCode: number, text: string) =>
  Object.assign(new Error(text), { responseCode });
