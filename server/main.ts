import { createServer } from 'node:http';
import type { Express } from 'express';
import { env } from './env.ts';
import { openLog } from './evidence/open-log.ts';
import { log } from './log.ts';
import { keepWorker } from './worker-process.ts';

// The server process: serves the built application and keeps one worker beside it.
process.env.NODE_ENV ??= 'production';

/** A photo on a slow line takes minutes; a request that takes longer is not one any more. */
const REQUEST_MS = 15 * 60_000;
/** How long open requests and jobs may take to end when the server is asked to stop. */
const DRAIN_MS = 8_000;

interface Application {
  createApp: () => Express;
  serverBuild: () => Promise<unknown>;
  closeDatabase: () => Promise<void>;
}

const BUILT = new URL('../build/server/index.js', import.meta.url).href;

async function application(): Promise<Application> {
  try {
    return (await import(BUILT)) as Application;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ERR_MODULE_NOT_FOUND') throw error;
    throw new Error('The application is not built yet. Run: npm run build', { cause: error });
  }
}

function sentence(error: unknown): string {
  const { code, message } = error as NodeJS.ErrnoException;
  if (code === 'EADDRINUSE') return `Port ${env().PORT} is in use. Stop what uses it, or set PORT.`;
  if (code === 'EACCES')
    return `Port ${env().PORT} needs rights we do not have. Set PORT above 1023.`;
  return message;
}

async function main(): Promise<void> {
  const { HOST, PORT } = env();
  const { createApp, closeDatabase, serverBuild } = await application();
  // Loaded before the first request, so that a broken build is told at the start.
  await serverBuild();
  await openLog();
  const server = createServer(createApp());
  server.requestTimeout = REQUEST_MS;
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(PORT, HOST, resolve);
  });
  const worker = keepWorker();
  log.info({ host: HOST, port: PORT }, 'the server listens');

  const stop = async () => {
    const closed = new Promise<void>((resolve) => server.close(() => resolve()));
    server.closeIdleConnections();
    const cap = setTimeout(() => server.closeAllConnections(), DRAIN_MS);
    await Promise.all([closed, worker.stop(DRAIN_MS)]);
    clearTimeout(cap);
    await closeDatabase();
    process.exit(0);
  };
  process.once('SIGTERM', () => void stop());
  process.once('SIGINT', () => void stop());
}

await main().catch((error: unknown) => {
  process.stderr.write(`${sentence(error)}\n`);
  process.exit(1);
});
