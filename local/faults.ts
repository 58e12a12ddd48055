import type { IncomingMessage, RequestListener, ServerResponse } from 'node:http';
import { setTimeout as wait } from 'node:timers/promises';

/**
 * How a stand-in misbehaves until told otherwise: `slow` answers after `ms` milliseconds, `refuse` answers with
 * its refusal, `defer` with "try later" where the protocol knows it, `gone` drops every connection.
 */
export type Fault =
  | { kind: 'none' }
  | { kind: 'slow'; ms: number }
  | { kind: 'refuse' }
  | { kind: 'defer' }
  | { kind: 'gone' };

/** Where the switch answers on each stand-in's web address. */
export const faultPath = '/_fault';

/** Sets the fault of the stand-in at `origin`. Throws when the stand-in does not take it. */
export async function setFault(origin: string, fault: Fault): Promise<void> {
  const response = await fetch(new URL(faultPath, origin), {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(fault),
  });
  if (!response.ok) throw new Error(`${origin} did not take the fault: ${response.status}`);
}

/** Holds the current fault of one stand-in. */
export class FaultSwitch {
  current: Fault = { kind: 'none' };

  /** `onChange` is told of each new fault before it is in force. */
  constructor(
    private readonly onChange: (fault: Fault) => Promise<void> = () => Promise.resolve(),
  ) {}

  async set(fault: Fault): Promise<void> {
    await this.onChange(fault);
    this.current = fault;
  }

  /** Waits as long as a `slow` fault says, otherwise not at all. */
  async delay(): Promise<void> {
    if (this.current.kind === 'slow') await wait(this.current.ms);
  }
}

/**
 * Puts the switch beside a web server: takes new faults at `/_fault`, hands everything else to `handler`.
 * Requests for another host name are turned away, so that a web page cannot reach the stand-in by pointing a
 * name of its own at this machine.
 */
export function withSwitch(faults: FaultSwitch, handler: RequestListener): RequestListener {
  return (request, response) => {
    if (!/^(?:127\.0\.0\.1|localhost)(?::\d+)?$/.test(request.headers.host ?? ''))
      response.writeHead(421).end('This address is for this computer only.\n');
    else if (request.url === faultPath) void takeFault(faults, request, response);
    else handler(request, response);
  };
}

/** Answers with `refusal`, late or not at all instead of with `handler` while a fault is in force. */
export function failing(
  faults: FaultSwitch,
  refusal: (response: ServerResponse) => void,
  handler: RequestListener,
): RequestListener {
  return (request, response) => {
    const { kind } = faults.current;
    if (kind === 'gone') {
      request.socket.destroy();
    } else if (kind === 'refuse' || kind === 'defer') {
      request.resume();
      refusal(response);
    } else {
      void faults.delay().then(() => handler(request, response));
    }
  };
}

async function takeFault(faults: FaultSwitch, request: IncomingMessage, response: ServerResponse) {
  // A page of another origin cannot send this content type without asking first, and is never answered.
  if (request.method !== 'POST' || request.headers['content-type'] !== 'application/json') {
    response.writeHead(415).end('Send the fault as JSON by POST.\n');
    return;
  }
  let body = '';
  for await (const chunk of request) body += String(chunk);
  try {
    await faults.set(JSON.parse(body) as Fault);
    response.writeHead(204).end();
  } catch (error) {
    response.writeHead(400).end(`${String(error)}\n`);
  }
}
