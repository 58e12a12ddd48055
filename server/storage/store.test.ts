import { createHash, randomBytes } from 'node:crypto';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { buffer } from 'node:stream/consumers';
import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { Unavailable } from '#domain/errors.ts';
import { env } from '#server/env.ts';
import { ownStore } from '#tests/record/own-store.ts';
import { closeStore, openBucket } from './client.ts';
import { newKey } from './keys.ts';
import { getStream, lengthOf, listObjects, removeObject } from './objects.ts';
import { putStream } from './put-stream.ts';

const store = await ownStore();

const facts = (length: number) => ({ length, mediaType: 'image/jpeg' });

async function* inPieces(bytes: Buffer, size = 60_000) {
  for (let at = 0; at < bytes.length; at += size) yield bytes.subarray(at, at + size);
}

async function read(key: string, range?: { start: number; end: number }): Promise<Buffer | null> {
  const stream = await getStream(key, range);
  return stream === undefined ? null : buffer(stream);
}

async function keysOf(shelf: 'originals' | 'notes'): Promise<string[]> {
  const keys: string[] = [];
  for await (const page of listObjects(shelf)) keys.push(...page.map(({ key }) => key));
  return keys;
}

afterEach(async () => {
  await store.fault({ kind: 'none' });
});

describe('keys', () => {
  it('are random, name their shelf and fit their column', () => {
    const keys = Array.from({ length: 100 }, () => newKey('originals'));
    expect(new Set(keys).size).toBe(100);
    for (const key of keys) expect(key).toMatch(/^originals\/([0-9a-f]{2})\/\1[0-9a-f]{38}$/);
  });
});

describe('an object', () => {
  const bytes = randomBytes(1_000_123);
  const key = newKey('originals');

  beforeAll(async () => {
    const { md5 } = await putStream(key, inPieces(bytes), facts(bytes.length));
    expect(md5).toBe(createHash('md5').update(bytes).digest('hex'));
  });

  it('comes back byte for byte, whole and in part', async () => {
    expect((await read(key))?.equals(bytes)).toBe(true);
    const part = await read(key, { start: 1000, end: 1999 });
    expect(part?.equals(bytes.subarray(1000, 2000))).toBe(true);
    expect(await lengthOf(key)).toBe(bytes.length);
  });

  it('is never written over', async () => {
    const other = Buffer.alloc(10);
    await expect(putStream(key, inPieces(other), facts(10))).rejects.toThrow(Unavailable);
    expect(await lengthOf(key)).toBe(bytes.length);
  });

  it('is listed by its shelf, and gone once it is removed', async () => {
    const gone = newKey('notes');
    await putStream(gone, inPieces(Buffer.from('note')), facts(4));
    expect(await keysOf('notes')).toEqual([gone]);
    await removeObject(gone);
    await removeObject(gone);
    expect(await keysOf('notes')).toEqual([]);
    expect(await read(gone)).toBeNull();
    expect(await lengthOf(gone)).toBeUndefined();
  });

  it('is not there when its source breaks off, and the source’s own error is thrown', async () => {
    async function* breaking() {
      yield randomBytes(70_000);
      yield randomBytes(70_000);
      throw new Error('the phone went away');
    }
    const cut = newKey('originals');
    await expect(putStream(cut, breaking(), facts(300_000))).rejects.toThrow('the phone went away');
    expect(await read(cut)).toBeNull();
  });
});

describe('a bucket that is not there', () => {
  it('is made at first use', async () => {
    closeStore();
    const held = env().S3_BUCKET;
    env().S3_BUCKET = `${held}-new`;
    try {
      await openBucket();
      const key = newKey('notes');
      await putStream(key, inPieces(Buffer.from('note')), facts(4));
      expect(await read(key)).toEqual(Buffer.from('note'));
    } finally {
      env().S3_BUCKET = held;
      closeStore();
    }
  });
});

describe('a store in trouble', () => {
  const sentence = 'The shop’s photo store does not answer. Wait a minute and try again.';
  const attempts: [string, () => Promise<unknown>][] = [
    ['putting', () => putStream(newKey('notes'), inPieces(Buffer.from('note')), facts(4))],
    ['getting', () => getStream(newKey('notes'))],
    ['asking the length', () => lengthOf(newKey('notes'))],
    ['removing', () => removeObject(newKey('notes'))],
    ['listing', () => keysOf('notes')],
  ];

  it.each(attempts)('refuses: %s says so', async (_name, attempt) => {
    await store.fault({ kind: 'refuse' });
    await expect(attempt()).rejects.toThrow(sentence);
  });

  it.each(attempts)('is gone: %s says so', async (_name, attempt) => {
    await store.fault({ kind: 'gone' });
    await expect(attempt()).rejects.toThrow(sentence);
  });

  it('is slow: nothing is lost', async () => {
    await store.fault({ kind: 'slow', ms: 400 });
    const key = newKey('notes');
    await putStream(key, inPieces(Buffer.from('note')), facts(4));
    expect(await read(key)).toEqual(Buffer.from('note'));
  });
});

describe('a store that takes a file and then says nothing', () => {
  const held = env().S3_ENDPOINT;
  let silent: Server | undefined;

  afterEach(() => {
    silent?.closeAllConnections();
    silent?.close();
    env().S3_ENDPOINT = held;
    closeStore();
  });

  it('is given up after its time, and the sender’s own time does not count', async () => {
    silent = createServer((request, response) => {
      if (request.method === 'HEAD') response.end();
      else request.resume();
    });
    await new Promise<void>((ready) => silent?.listen(0, '127.0.0.1', ready));
    closeStore();
    env().S3_ENDPOINT = `http://127.0.0.1:${(silent.address() as AddressInfo).port}`;

    async function* slowly() {
      yield Buffer.alloc(10);
      await new Promise((go) => setTimeout(go, 400));
      yield Buffer.alloc(10);
    }
    const begun = Date.now();
    const putting = putStream(newKey('notes'), slowly(), facts(20), 200);
    await expect(putting).rejects.toThrow(Unavailable);
    expect(Date.now() - begun).toBeGreaterThanOrEqual(590);
  });
});
