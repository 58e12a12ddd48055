import { GetObjectCommand, PutObjectCommand } from '@aws-sdk/client-s3';
import { env } from '#server/env.ts';
import { callStore } from '#server/storage/call-store.ts';
import { openBucket, storeClient } from '#server/storage/client.ts';

/**
 * What the object store keeps of the log, outside the database: every signed note, the last one
 * under a name of its own, and the entries in bundles of 256.
 */
export const LAST_NOTE = 'log/checkpoint';

/** Name of the note of a head of `size` entries. */
export const noteKey = (size: number) => `log/checkpoints/${size}`;

/** Keeps bytes under a fixed name, over what was there. Throws Unavailable. */
export async function keepLogObject(
  key: string,
  bytes: Uint8Array,
  mediaType: string,
): Promise<void> {
  await openBucket();
  await callStore((abortSignal) =>
    storeClient().send(
      new PutObjectCommand({
        Bucket: env().S3_BUCKET,
        Key: key,
        Body: bytes,
        ContentLength: bytes.length,
        ContentType: mediaType,
      }),
      { abortSignal },
    ),
  );
}

/** Reads a log object whole; undefined when there is none. Throws Unavailable. */
export async function readLogObject(key: string): Promise<Buffer | undefined> {
  await openBucket();
  const bytes = await callStore(async (abortSignal) => {
    const answer = await storeClient().send(
      new GetObjectCommand({ Bucket: env().S3_BUCKET, Key: key }),
      { abortSignal },
    );
    return answer.Body?.transformToByteArray();
  });
  return bytes && Buffer.from(bytes);
}
