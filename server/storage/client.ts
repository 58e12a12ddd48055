import { CreateBucketCommand, HeadBucketCommand, S3Client } from '@aws-sdk/client-s3';
import { env } from '#server/env.ts';
import { callStore } from './call-store.ts';

// What fails is logged where it is caught, once.
const silent = { debug() {}, info() {}, warn() {}, error() {} };

let client: S3Client | undefined;
let opened: Promise<void> | undefined;

/** This process's connection to the object store of `S3_*`. */
export function storeClient(): S3Client {
  client ??= new S3Client({
    endpoint: env().S3_ENDPOINT,
    region: env().S3_REGION,
    forcePathStyle: true,
    credentials: {
      accessKeyId: env().S3_ACCESS_KEY_ID,
      secretAccessKey: env().S3_SECRET_ACCESS_KEY,
    },
    // By default the SDK frames a streamed body for its checksum, and a store that does not know
    // the framing keeps it as part of the file.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    maxAttempts: 2,
    logger: silent,
    requestHandler: {
      connectionTimeout: 3_000,
      // A reader may be slower than the store is silent.
      socketTimeout: 60_000,
      httpAgent: { keepAlive: true, maxSockets: 64 },
    },
  });
  return client;
}

async function makeBucket(): Promise<void> {
  const bucket = { Bucket: env().S3_BUCKET };
  const there = await callStore((abortSignal) =>
    storeClient().send(new HeadBucketCommand(bucket), { abortSignal }),
  );
  if (there) return;
  await callStore((abortSignal) =>
    storeClient().send(new CreateBucketCommand(bucket), { abortSignal }),
  );
}

/**
 * Makes sure, once per process, that the bucket is there; after a failure the next call tries again.
 * Throws Unavailable when the store does not answer.
 */
export async function openBucket(): Promise<void> {
  opened ??= makeBucket();
  try {
    await opened;
  } catch (error) {
    opened = undefined;
    throw error;
  }
}

/** Closes the connections to the store; a later call opens new ones. */
export function closeStore(): void {
  client?.destroy();
  client = undefined;
  opened = undefined;
}
