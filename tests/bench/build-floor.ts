import { execFile } from 'node:child_process';
import { cp, mkdtemp, rm, symlink } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { promisify } from 'node:util';
import { createRequestHandler } from '@react-router/express';
import express from 'express';
import type { ServerBuild } from 'react-router';

const root = resolve(import.meta.dirname, '../..');

/**
 * Builds the empty page with the same framework settings as the product and serves it on loopback.
 * It is the floor that the weight of our pages is held against.
 */
export async function serveFloor(): Promise<{ url: string; stop: () => Promise<void> }> {
  const folder = await mkdtemp(join(tmpdir(), 'witnessmark-floor-'));
  await cp(join(import.meta.dirname, 'floor'), folder, { recursive: true });
  await cp(join(root, 'react-router.config.ts'), join(folder, 'react-router.config.ts'));
  await cp(join(root, 'package.json'), join(folder, 'package.json'));
  await symlink(join(root, 'node_modules'), join(folder, 'node_modules'));
  await promisify(execFile)('node', ['node_modules/@react-router/dev/bin.js', 'build'], {
    cwd: folder,
    env: { ...process.env, NODE_ENV: 'production' },
  });

  const build = (await import(
    pathToFileURL(join(folder, 'build/server/index.js')).href
  )) as ServerBuild;
  const app = express();
  app.use(express.static(join(folder, 'build/client')));
  app.use(createRequestHandler({ build }));
  const server = createServer(app);
  await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
  return {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}/`,
    stop: async () => {
      server.closeAllConnections();
      await new Promise((done) => server.close(done));
      await rm(folder, { recursive: true, force: true });
    },
  };
}
