import type { Context } from 's3rver';
import { alreadyThere } from './store-disk.ts';
import type { DiskStore } from './store-disk.ts';
import { S3Error } from './store-parts.ts';

/**
 * What a real object store refuses and s3rver lets through: requests without a signature (whether a signature is
 * right it cannot tell), writes to a key that must be new, bodies in a framing it would store as content; and
 * two things it cannot do: the last bytes of an object, and giving up an upload in parts.
 */
export async function guard(context: Context, next: () => Promise<void>): Promise<void> {
  const { method, headers, query, req } = context;
  if (!isSigned(context))
    throw new S3Error('AccessDenied', 'Requests without a signature are refused.');
  const [, bucket = '', ...rest] = decodeURIComponent(context.path).split('/');
  const key = rest.join('/');
  const store = context.store as DiskStore;
  if (method === 'PUT' && isFramed(headers))
    throw new S3Error(
      'NotImplemented',
      'Chunk framing is not understood here: set requestChecksumCalculation to WHEN_REQUIRED.',
    );
  if (method === 'PUT' && headers['if-none-match'] === '*') {
    // Answered before the body has come; the store looks again at the moment of writing.
    if (await store.existsObject(bucket, key)) throw alreadyThere();
  }
  if (method === 'DELETE' && query.uploadId !== undefined) {
    await store.abortUpload(bucket, query.uploadId.replace(/[^0-9a-f]/g, ''));
    context.status = 204;
    return;
  }
  const last = /^bytes=-(\d+)$/.exec(headers.range ?? '')?.[1];
  if (last !== undefined) req.headers.range = await fromTheEnd(store, bucket, key, Number(last));
  await next();
}

function isSigned({ headers, query }: Context): boolean {
  return /^AWS4-HMAC-SHA256 /.test(headers.authorization ?? '') || 'X-Amz-Signature' in query;
}

function isFramed(headers: Context['headers']): boolean {
  return (
    /aws-chunked/.test(headers['content-encoding'] ?? '') ||
    /^STREAMING-/.test(headers['x-amz-content-sha256'] ?? '')
  );
}

/** The range of the last `count` bytes, or no range when the object is not there or shorter. */
async function fromTheEnd(store: DiskStore, bucket: string, key: string, count: number) {
  const metadata = await store.getMetadata(bucket, key).catch(() => undefined);
  const size = Number(metadata?.['content-length'] ?? 0);
  return size > count ? `bytes=${size - count}-${size - 1}` : undefined;
}
