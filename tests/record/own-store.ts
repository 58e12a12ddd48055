import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll } from 'vitest';
import { setFault, type Fault } from '#local/faults.ts';
import { startStore } from '#local/store.ts';

/**
 * Gives this test file an object store of its own, whose faults touch nobody else. Call it at the top
 * level, before anything reads the settings: `const store = await ownStore();`.
 */
export async function ownStore(): Promise<{ fault(fault: Fault): Promise<void> }> {
  const directory = await mkdtemp(join(tmpdir(), 'witnessmark-store-'));
  const store = await startStore({
    directory,
    port: 0,
    accessKeyId: String(process.env.S3_ACCESS_KEY_ID),
    secretAccessKey: String(process.env.S3_SECRET_ACCESS_KEY),
    bucket: String(process.env.S3_BUCKET),
  });
  process.env.S3_ENDPOINT = store.endpoint;
  afterAll(async () => {
    await store.stop();
    await rm(directory, { recursive: true, force: true });
  });
  return { fault: (fault) => setFault(store.endpoint, fault) };
}
