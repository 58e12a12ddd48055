import { createServer } from 'node:http';
import type { RequestListener } from 'node:http';
import type { AddressInfo } from 'node:net';
import { Failure } from '../scripts/sentences.mjs';

/** A web server on this machine alone. */
export interface WebServer {
  /** Such as `http://127.0.0.1:3001`. */
  origin: string;
  close: () => Promise<void>;
}

/** Serves `handler` on 127.0.0.1 at `port` (0 chooses a free one). Throws a sentence when the port is taken. */
export async function serveLocally(
  what: string,
  port: number,
  handler: RequestListener,
): Promise<WebServer> {
  const server = createServer(handler);
  await new Promise<void>((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) =>
      reject(
        error.code === 'EADDRINUSE'
          ? new Failure(`${what} needs port ${port}, which another program is using.`)
          : error,
      ),
    );
    server.listen(port, '127.0.0.1', resolve);
  });
  return {
    origin: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}
