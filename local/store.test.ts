import { createHash, randomBytes } from 'node:crypto';
import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { request } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  S3Client,
} from '@aws-sdk/client-s3';
import { Upload } from '@aws-sdk/lib-storage';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { setFault } from './faults.ts';
import { startStoreProgram } from './stand-ins.ts';
import { Supervisor } from './supervisor.ts';

const Bucket = 'photos';
let folder = '';
let endpoint = '';
let supervisor: Supervisor;
let client: S3Client;

async function start() {
  supervisor = new Supervisor(join(folder, 'logs'));
  ({ endpoint } = await startStoreProgram(supervisor, {
    directory: join(folder, 'store'),
    port: 0,
    accessKeyId: 'KEYID',
    secretAccessKey: 'secret',
    bucket: Bucket,
  }));
  client = clientWith('KEYID');
}

const clientWith = (accessKeyId: string) =>
  new S3Client({
    region: 'local',
    endpoint,
    forcePathStyle: true,
    maxAttempts: 1,
    credentials: { accessKeyId, secretAccessKey: 'secret' },
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });

const put = (Key: string, Body: Buffer | string, more: object = {}) =>
  client.send(new PutObjectCommand({ Bucket, Key, Body, ...more }));

async function get(Key: string, Range?: string): Promise<Buffer> {
  const { Body } = await client.send(new GetObjectCommand({ Bucket, Key, Range }));
  return Buffer.from((await Body?.transformToByteArray()) ?? []);
}

const status = (error: unknown) =>
  (error as { $metadata?: { httpStatusCode?: number } }).$metadata?.httpStatusCode;
const statusOf = (sent: Promise<unknown>) => sent.then(() => 200, status);

/** Begins a signed-looking upload, sends half of what it promised, and hangs up. */
async function hangUpHalfway(key: string): Promise<void> {
  const sent = request(`${endpoint}/${Bucket}/${key}`, {
    method: 'PUT',
    headers: {
      authorization: 'AWS4-HMAC-SHA256 Credential=KEYID/x, SignedHeaders=host, Signature=0',
      'x-amz-date': new Date().toISOString().replace(/[-:]|\.\d+/g, ''),
      'x-amz-content-sha256': 'UNSIGNED-PAYLOAD',
      'content-length': 1_000_000,
    },
  });
  sent.on('error', () => undefined);
  await new Promise<void>((resolve) => sent.write(randomBytes(500_000), () => resolve()));
  const incoming = join(folder, 'store/incoming');
  while ((await readdir(incoming)).length === 0) await new Promise((next) => setImmediate(next));
  sent.destroy();
  await new Promise((resolve) => sent.once('close', resolve));
  while ((await readdir(incoming)).length > 0) await new Promise((next) => setImmediate(next));
}

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'witnessmark-store-'));
  await start();
});

afterAll(async () => {
  await supervisor.stop();
  await rm(folder, { recursive: true, force: true });
});

describe('keeping bytes', () => {
  it('gives back a streamed object byte for byte, with the MD5 as its ETag', async () => {
    const bytes = randomBytes(5_000_123);
    const Body = Readable.from([bytes.subarray(0, 3_000_000), bytes.subarray(3_000_000)]);
    const sent = await client.send(
      new PutObjectCommand({ Bucket, Key: 'stream', Body, ContentLength: bytes.length }),
    );
    expect(sent.ETag).toBe(`"${createHash('md5').update(bytes).digest('hex')}"`);
    expect((await get('stream')).equals(bytes)).toBe(true);
  });

  it('gives back an upload in parts byte for byte', async () => {
    const bytes = randomBytes(11_000_000);
    await new Upload({
      client,
      params: { Bucket, Key: 'parts', Body: Readable.from([bytes]) },
    }).done();
    expect((await get('parts')).equals(bytes)).toBe(true);
  });

  it('leaves nothing of an upload that was cut off, new or over an older object', async () => {
    await put('older', 'whole');
    await hangUpHalfway('older');
    await hangUpHalfway('newer');
    expect((await get('older')).toString()).toBe('whole');
    expect(await statusOf(get('newer'))).toBe(404);
  });

  it('never mixes two writers of one key', async () => {
    const bodies = Array.from({ length: 8 }, (_, index) => Buffer.alloc(300_000, index + 1));
    const etags = await Promise.all(
      bodies.map(async (Body) => (await put('contested', Body)).ETag),
    );
    const kept = await client.send(new GetObjectCommand({ Bucket, Key: 'contested' }));
    const bytes = Buffer.from((await kept.Body?.transformToByteArray()) ?? []);
    expect(bodies.some((body) => body.equals(bytes))).toBe(true);
    expect(kept.ETag).toBe(`"${createHash('md5').update(bytes).digest('hex')}"`);
    expect(etags).toContain(kept.ETag);
  });

  it('keeps its objects when it is killed and started again', async () => {
    await put('kept', 'bytes', { ContentType: 'image/jpeg', Metadata: { a: 'b' } });
    supervisor.kill();
    await supervisor.stop();
    await start();
    const head = await client.send(new HeadObjectCommand({ Bucket, Key: 'kept' }));
    expect(head).toMatchObject({
      ContentLength: 5,
      ContentType: 'image/jpeg',
      Metadata: { a: 'b' },
    });
  });
});

describe('refusing', () => {
  it('refuses requests without a signature and unknown keys', async () => {
    const key = `${endpoint}/${Bucket}/kept`;
    expect((await fetch(key)).status).toBe(403);
    expect((await fetch(key, { method: 'PUT', body: 'x' })).status).toBe(403);
    const stranger = clientWith('OTHER').send(new GetObjectCommand({ Bucket, Key: 'kept' }));
    expect(await statusOf(stranger)).toBe(403);
  });

  it('lets one of eight writers make a key that must be new', async () => {
    const writes = Array.from({ length: 8 }, (_, index) =>
      statusOf(put('once', `writer ${index}`, { IfNoneMatch: '*' })),
    );
    expect((await Promise.all(writes)).sort()).toEqual([200, ...Array<number>(7).fill(412)]);
    expect(await statusOf(put('once', 'later', { IfNoneMatch: '*' }))).toBe(412);
  });

  it('refuses bytes that do not match the digest sent along', async () => {
    const wrong = createHash('md5').update('other').digest('base64');
    expect(await statusOf(put('digest', 'bytes', { ContentMD5: wrong }))).toBe(400);
    expect(await statusOf(get('digest'))).toBe(404);
  });

  it('refuses the chunk framing that it would store as content', async () => {
    const framing = new S3Client({
      region: 'local',
      endpoint,
      forcePathStyle: true,
      maxAttempts: 1,
      credentials: { accessKeyId: 'KEYID', secretAccessKey: 'secret' },
    });
    const Body = Readable.from([Buffer.from('bytes')]);
    const sent = framing.send(
      new PutObjectCommand({ Bucket, Key: 'framed', Body, ContentLength: 5 }),
    );
    expect(await statusOf(sent)).toBe(501);
  });
});

describe('reading', () => {
  it('lists every key in the order of its bytes, page by page', async () => {
    const keys = ['list/a', 'list/a-b', 'list/a/b', 'list/ab', 'list/ä', 'list/b'];
    await Promise.all(keys.map((key) => put(key, key)));
    const seen: (string | undefined)[] = [];
    let ContinuationToken: string | undefined;
    do {
      const page = await client.send(
        new ListObjectsV2Command({ Bucket, Prefix: 'list/', MaxKeys: 2, ContinuationToken }),
      );
      seen.push(...(page.Contents ?? []).map(({ Key }) => Key));
      ContinuationToken = page.NextContinuationToken;
    } while (ContinuationToken);
    expect(seen).toEqual(['list/a', 'list/a-b', 'list/a/b', 'list/ab', 'list/b', 'list/ä']);
  });

  it('gives the first, the middle and the last bytes', async () => {
    await put('range', '0123456789');
    expect((await get('range', 'bytes=0-1')).toString()).toBe('01');
    expect((await get('range', 'bytes=4-')).toString()).toBe('456789');
    expect((await get('range', 'bytes=-3')).toString()).toBe('789');
  });

  it('answers 404 for what was deleted', async () => {
    await put('gone', 'x');
    await client.send(new DeleteObjectCommand({ Bucket, Key: 'gone' }));
    expect(await statusOf(get('gone'))).toBe(404);
  });
});

describe('misbehaving on request', () => {
  afterEach(() => setFault(endpoint, { kind: 'none' }));

  it('refuses with 503, drops connections, and is itself again', async () => {
    await put('fault', 'x');
    await setFault(endpoint, { kind: 'refuse' });
    expect(await statusOf(get('fault'))).toBe(503);
    await setFault(endpoint, { kind: 'gone' });
    await expect(get('fault')).rejects.toThrow(/ECONNRESET|socket hang up/);
    await setFault(endpoint, { kind: 'none' });
    expect((await get('fault')).toString()).toBe('x');
  });

  it('is as slow as it is told', async () => {
    await setFault(endpoint, { kind: 'slow', ms: 300 });
    const began = performance.now();
    await get('fault');
    expect(performance.now() - began).toBeGreaterThan(290);
  });

  it('takes no orders from a web page', async () => {
    const body = JSON.stringify({ kind: 'gone' });
    const simple = await fetch(`${endpoint}/_fault`, { method: 'POST', body });
    expect(simple.status).toBe(415);
  });
});
