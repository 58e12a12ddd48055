import { CreateBucketCommand, S3Client } from '@aws-sdk/client-s3';
import { beforeAll } from 'vitest';

/** A client for the store that these settings name, as the server's own, for looking behind its back. */
export function storeClient(env: NodeJS.ProcessEnv = process.env): S3Client {
  return new S3Client({
    region: String(env.S3_REGION),
    endpoint: String(env.S3_ENDPOINT),
    forcePathStyle: true,
    credentials: {
      accessKeyId: String(env.S3_ACCESS_KEY_ID),
      secretAccessKey: String(env.S3_SECRET_ACCESS_KEY),
    },
    // With the default the stand-in would store the chunks' framing as content.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });
}

/** Makes the bucket that these settings name. */
export async function createBucket(env: NodeJS.ProcessEnv = process.env): Promise<void> {
  const client = storeClient(env);
  await client.send(new CreateBucketCommand({ Bucket: env.S3_BUCKET }));
  client.destroy();
}

/** Gives this test file its own empty bucket, the one `S3_BUCKET` names. */
export function useStore(): void {
  beforeAll(() => createBucket());
}
