import { Readable } from 'node:stream';
import { PutObjectCommand } from '@aws-sdk/client-s3';
import { env } from '#server/env.ts';
import { PATIENCE, storeProblem } from './call-store.ts';
import { openBucket, storeClient } from './client.ts';

/** What the store says it has kept. */
export interface Kept {
  /** MD5 of the bytes in hex, where the store's ETag is one; null where it encrypts with its own key. */
  md5: string | null;
}

/**
 * Streams `source` to a new object of exactly `length` bytes. An existing key is never overwritten.
 * What `source` throws is thrown on, and the object is then not there or is for the caller to
 * remove; a store that refuses, is gone or stays silent for `patience` ms gives Unavailable.
 */
export async function putStream(
  key: string,
  source: AsyncIterable<Uint8Array>,
  facts: { length: number; mediaType: string },
  patience = PATIENCE,
): Promise<Kept> {
  await openBucket();
  const stop = new AbortController();
  const failure: { cause?: unknown } = {};
  let timer: NodeJS.Timeout | undefined;
  const waitForStore = () => (timer = setTimeout(() => stop.abort(), patience));

  async function* watched(): AsyncGenerator<Uint8Array> {
    try {
      // Only the store's silence is timed here: the source may take its own time.
      for await (const chunk of source) {
        waitForStore();
        yield chunk;
        clearTimeout(timer);
      }
      waitForStore();
    } catch (error) {
      failure.cause = error;
      stop.abort();
      throw error;
    }
  }

  const body = Readable.from(watched(), { objectMode: false });
  // The SDK pipes the body and does not listen for its errors.
  body.on('error', () => undefined);
  try {
    const answer = await storeClient().send(
      new PutObjectCommand({
        Bucket: env().S3_BUCKET,
        Key: key,
        Body: body,
        ContentLength: facts.length,
        ContentType: facts.mediaType,
        IfNoneMatch: '*',
      }),
      { abortSignal: stop.signal },
    );
    const encrypted = answer.ServerSideEncryption?.startsWith('aws:kms') ?? false;
    return { md5: encrypted ? null : (answer.ETag?.replaceAll('"', '') ?? null) };
  } catch (error) {
    if ('cause' in failure) throw failure.cause;
    throw storeProblem(error);
  } finally {
    clearTimeout(timer);
    body.destroy();
  }
}
