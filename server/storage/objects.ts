import type { Readable } from 'node:stream';
import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  paginateListObjectsV2,
} from '@aws-sdk/client-s3';
import { env } from '#server/env.ts';
import { callStore, storeProblem } from './call-store.ts';
import { openBucket, storeClient } from './client.ts';
import type { Shelf } from './keys.ts';

const at = (key: string) => ({ Bucket: env().S3_BUCKET, Key: key });

/**
 * The object's bytes as a stream, all or those from `start` to `end` (both counted from 0, both
 * included); undefined when there is none. Throws Unavailable; a stream that is cut emits an error.
 */
export async function getStream(
  key: string,
  range?: { start: number; end: number },
): Promise<Readable | undefined> {
  const Range = range && `bytes=${range.start}-${range.end}`;
  const answer = await callStore((abortSignal) =>
    storeClient().send(new GetObjectCommand({ ...at(key), Range }), { abortSignal }),
  );
  return answer?.Body as Readable | undefined;
}

/** The object's length in bytes; undefined when there is none. Throws Unavailable. */
export async function lengthOf(key: string): Promise<number | undefined> {
  const answer = await callStore((abortSignal) =>
    storeClient().send(new HeadObjectCommand(at(key)), { abortSignal }),
  );
  return answer?.ContentLength;
}

/** Removes the object; nothing happens when there is none. Throws Unavailable. */
export async function removeObject(key: string): Promise<void> {
  await callStore((abortSignal) =>
    storeClient().send(new DeleteObjectCommand(at(key)), { abortSignal }),
  );
}

/** Every object of a shelf, page by page, with the time it was kept. Throws Unavailable. */
export async function* listObjects(
  shelf: Shelf,
): AsyncGenerator<{ key: string; keptAt: Date }[], void> {
  await openBucket();
  try {
    const pages = paginateListObjectsV2(
      { client: storeClient() },
      { Bucket: env().S3_BUCKET, Prefix: `${shelf}/` },
    );
    for await (const { Contents = [] } of pages) {
      yield Contents.map(({ Key, LastModified }) => ({
        key: Key ?? '',
        keptAt: LastModified ?? new Date(),
      }));
    }
  } catch (error) {
    throw storeProblem(error);
  }
}
