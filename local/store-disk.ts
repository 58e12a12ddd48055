import { createHash, randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdir, readdir, rename, rm, writeFile } from 'node:fs/promises';
import { IncomingMessage } from 'node:http';
import { dirname, join, relative, sep } from 'node:path';
import { Readable, Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Listing, StoredObject } from 's3rver/lib/stores/filesystem';
import { FilesystemStore, S3Error, S3Object } from './store-parts.ts';

const objectSuffix = '._S3rver_object';

/** What came in through one stream and lies complete on the disk under a name of its own. */
interface Incoming {
  path: string;
  size: number;
  md5: string;
}

/**
 * The store's files, with what s3rver's own lacks: an object appears whole or not at all (an upload cut off in
 * the middle leaves nothing), two writers of one key do not mix, digests sent along are checked, `If-None-Match: *`
 * holds at the moment of writing, and lists are complete and in the order of the keys' bytes.
 */
export class DiskStore extends FilesystemStore {
  private readonly writing = new Map<string, Promise<unknown>>();

  /** `incoming` is a folder on the same disk as the objects, for what is not whole yet. */
  constructor(
    rootDirectory: string,
    private readonly incoming: string,
  ) {
    super(rootDirectory);
  }

  override async putObject(object: StoredObject): Promise<{ size: number; md5: string }> {
    const { bucket, key, content, metadata } = object;
    const headers = content instanceof IncomingMessage ? content.headers : {};
    const { path, size, md5 } = await this.take(content);
    const place = this.getResourcePath(bucket, key, 'object');
    try {
      await this.alone(place, async () => {
        const onlyIfNew = headers['if-none-match'] === '*';
        if (onlyIfNew && (await this.existsObject(bucket, key))) throw alreadyThere();
        await mkdir(dirname(place), { recursive: true });
        await this.putMetadata(bucket, key, metadata, md5);
        await rename(path, place);
      });
    } finally {
      await rm(path, { force: true });
    }
    return { size, md5 };
  }

  override async putPart(bucket: string, uploadId: string, partNumber: string, content: Readable) {
    const { path, size, md5 } = await this.take(content);
    const folder = join(this.getResourcePath(bucket, undefined, 'uploads'), uploadId);
    await mkdir(folder, { recursive: true });
    await writeFile(join(folder, `${partNumber}.md5`), md5);
    await rename(path, join(folder, partNumber));
    return { size, md5 };
  }

  /** Forgets an upload in parts and what came in for it. */
  async abortUpload(bucket: string, uploadId: string): Promise<void> {
    const uploads = this.getResourcePath(bucket, undefined, 'uploads');
    await rm(join(uploads, uploadId), { recursive: true, force: true });
  }

  override async listObjects(
    bucket: string,
    { delimiter = '', startAfter = '', prefix = '', maxKeys = Infinity },
  ): Promise<Listing> {
    const keys = (await this.allKeys(bucket)).filter(
      (key) => key > startAfter && key.startsWith(prefix),
    );
    const isBelow = (key: string) =>
      delimiter !== '' && key.slice(prefix.length).includes(delimiter);
    const belowPrefixes = keys
      .filter(isBelow)
      .map((key) => key.slice(0, key.indexOf(delimiter, prefix.length) + delimiter.length));
    const here = keys.filter((key) => !isBelow(key));
    const objects = await Promise.all(
      here.slice(0, maxKeys).map(async (key) => {
        const metadata = await this.getMetadata(bucket, key).catch(() => undefined);
        return metadata && new S3Object(bucket, key, null, metadata);
      }),
    );
    return {
      objects: objects.filter((object) => object !== undefined),
      commonPrefixes: [...new Set(belowPrefixes)],
      isTruncated: here.length > maxKeys,
    };
  }

  private async allKeys(bucket: string): Promise<string[]> {
    const root = this.getBucketPath(bucket);
    const entries = await readdir(root, { recursive: true, withFileTypes: true });
    return entries
      .filter((entry) => entry.isFile() && entry.name.endsWith(objectSuffix))
      .map((entry) => relative(root, join(entry.parentPath, entry.name)))
      .map((path) => path.split(sep).join('/').slice(0, -objectSuffix.length))
      .sort((a, b) => Buffer.compare(Buffer.from(a), Buffer.from(b)));
  }

  /** Writes a stream to the incoming folder to its last byte, or throws and leaves nothing. */
  private async take(content: Readable | Buffer): Promise<Incoming> {
    const headers = content instanceof IncomingMessage ? content.headers : {};
    const path = join(this.incoming, randomUUID());
    const md5 = createHash('md5');
    const sha256 = createHash('sha256');
    let size = 0;
    const count = new Transform({
      transform(chunk: Buffer, _encoding, done) {
        md5.update(chunk);
        sha256.update(chunk);
        size += chunk.length;
        done(null, chunk);
      },
    });
    try {
      const source = Buffer.isBuffer(content) ? Readable.from([content]) : content;
      await pipeline(source, count, createWriteStream(path, { flush: true }));
      checkDigests(headers, size, md5.copy().digest('base64'), sha256.digest('hex'));
    } catch (error) {
      await rm(path, { force: true });
      throw error;
    }
    return { path, size, md5: md5.digest('hex') };
  }

  /** Runs `work` when no other work for this key runs. */
  private async alone(key: string, work: () => Promise<void>): Promise<void> {
    const before = this.writing.get(key);
    const mine = (before ?? Promise.resolve()).catch(() => undefined).then(work);
    this.writing.set(key, mine);
    await mine.finally(() => {
      if (this.writing.get(key) === mine) this.writing.delete(key);
    });
  }
}

/** The error for a write that was only to happen when the key is new. */
export const alreadyThere = () =>
  new S3Error('PreconditionFailed', 'An object with this key is there already.', {
    Condition: 'If-None-Match',
  });

function checkDigests(
  headers: IncomingMessage['headers'],
  size: number,
  md5: string,
  sha256: string,
) {
  const length = headers['content-length'];
  if (length !== undefined && Number(length) !== size)
    throw new S3Error('IncompleteBody', 'Fewer bytes came than Content-Length said.');
  const sentMd5 = headers['content-md5'];
  if (sentMd5 !== undefined && sentMd5 !== md5)
    throw new S3Error('BadDigest', 'The Content-MD5 does not match what came.');
  const sentSha256 = String(headers['x-amz-content-sha256'] ?? '');
  if (/^[0-9a-f]{64}$/i.test(sentSha256) && sentSha256.toLowerCase() !== sha256)
    throw new S3Error('BadDigest', 'The x-amz-content-sha256 does not match what came.');
}
