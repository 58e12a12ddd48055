import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { FaultSwitch, failing, withSwitch } from './faults.ts';
import { runAsProgram } from './stand-in.ts';
import type { StandIn } from './stand-in.ts';
import { DiskStore } from './store-disk.ts';
import { guard } from './store-guard.ts';
import { DUMMY_ACCOUNT, S3rver } from './store-parts.ts';
import { serveLocally } from './web-server.ts';

export interface StoreOptions {
  /** Where the objects are kept; made when missing. */
  directory: string;
  /** 0 chooses a free one. */
  port: number;
  accessKeyId: string;
  secretAccessKey: string;
  /** Made when missing. */
  bucket: string;
}

export interface Store extends StandIn {
  /** The S3 endpoint, for path-style addresses. */
  endpoint: string;
}

/**
 * Starts the object store on 127.0.0.1. Lists of more than one page need Node to run with
 * `--openssl-legacy-provider`, because s3rver hides its continuation token with an old cipher.
 */
export async function startStore(options: StoreOptions): Promise<Store> {
  const objects = join(options.directory, 'buckets');
  const incoming = join(options.directory, 'incoming');
  await rm(incoming, { recursive: true, force: true });
  await mkdir(incoming, { recursive: true });
  await mkdir(objects, { recursive: true });
  DUMMY_ACCOUNT.revokeAccessKey('S3RVER');
  DUMMY_ACCOUNT.createKeyPair(options.accessKeyId, options.secretAccessKey);
  const s3rver = new S3rver({
    directory: objects,
    silent: true,
    vhostBuckets: false,
    configureBuckets: [{ name: options.bucket }],
  });
  s3rver.store = s3rver.context.store = new DiskStore(objects, incoming);
  // First of all, so that nothing of s3rver sees a request that is refused.
  s3rver.middleware.unshift(guard);
  await s3rver.configureBuckets();
  s3rver.on('error', () => undefined);
  const faults = new FaultSwitch();
  const server = await serveLocally(
    'The object store',
    options.port,
    withSwitch(
      faults,
      failing(
        faults,
        (response) =>
          response
            .writeHead(503, { 'content-type': 'application/xml' })
            .end(
              '<Error><Code>SlowDown</Code><Message>Reduce your request rate.</Message></Error>',
            ),
        s3rver.callback(),
      ),
    ),
  );
  return { endpoint: server.origin, stop: server.close };
}

await runAsProgram(import.meta.url, startStore);
