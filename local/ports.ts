import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';

/** Listens for a moment on 127.0.0.1; gives the port, or undefined when it is taken. */
function tryPort(port: number): Promise<number | undefined> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', (error: NodeJS.ErrnoException) =>
      error.code === 'EADDRINUSE' || error.code === 'EACCES' ? resolve(undefined) : reject(error),
    );
    server.listen(port, '127.0.0.1', () => {
      const { port: bound } = server.address() as AddressInfo;
      server.close(() => resolve(bound));
    });
  });
}

/** Whether nothing listens on this port of 127.0.0.1. */
export async function portIsFree(port: number): Promise<boolean> {
  return (await tryPort(port)) !== undefined;
}

/** A port of 127.0.0.1 that nothing listened on a moment ago. */
export async function freePort(): Promise<number> {
  const port = await tryPort(0);
  if (port === undefined) throw new Error('No free port was found on 127.0.0.1.');
  return port;
}
