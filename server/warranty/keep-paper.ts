import { createHash } from 'node:crypto';
import { PutObjectCommand } from '@aws-sdk/client-s3';
import { Unavailable } from '#domain/errors.ts';
import { env } from '#server/env.ts';
import { callStore } from '#server/storage/call-store.ts';
import { openBucket, storeClient } from '#server/storage/client.ts';
import { newKey } from '#server/storage/keys.ts';

/**
 * Keeps a paper in the store under a new random key, and makes sure that the store has every byte.
 * @returns the key
 * @throws Unavailable while the store is silent or has kept something else
 */
export async function keepPaper(pdf: Buffer): Promise<string> {
  await openBucket();
  const key = newKey('papers');
  // Whole, not as a stream: the SDK then sends it again when a connection breaks.
  const answer = await callStore((abortSignal) =>
    storeClient().send(
      new PutObjectCommand({
        Bucket: env().S3_BUCKET,
        Key: key,
        Body: pdf,
        ContentLength: pdf.length,
        ContentType: 'application/pdf',
      }),
      { abortSignal },
    ),
  );
  const encrypted = answer?.ServerSideEncryption?.startsWith('aws:kms') ?? false;
  const md5 = createHash('md5').update(pdf).digest('hex');
  if (!answer || (!encrypted && answer.ETag?.replaceAll('"', '') !== md5)) {
    throw new Unavailable('store');
  }
  return key;
}
