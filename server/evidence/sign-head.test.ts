import { randomBytes } from 'node:crypto';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { Conflict, Unavailable } from '#domain/errors.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { rootOfLeaves } from '#evidence/merkle/root-of-leaves.ts';
import { verifyConsistency } from '#evidence/merkle/verify-consistency.ts';
import { verifyInclusion } from '#evidence/merkle/verify-inclusion.ts';
import { signCheckpoint } from '#evidence/note/sign-checkpoint.ts';
import { readEntryBundle } from '#evidence/tiles/entry-bundle.ts';
import { entriesPath } from '#evidence/tiles/tile-path.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import { runDueJobs } from '#server/jobs/run-due-jobs.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { ownStore } from '#tests/record/own-store.ts';
import { appendEntry } from './append-entry.ts';
import { readOwnNote } from './compare-with-store.ts';
import { keepLogObject, LAST_NOTE, noteKey, readLogObject } from './log-store.ts';
import { readLogState } from './log-state.ts';
import { newestCheckpoint, newestHead } from './newest-checkpoint.ts';
import { openLog } from './open-log.ts';
import { consistencyProof, inclusionProofs } from './prove.ts';
import { readLogEntries } from './read-log.ts';
import { signHead } from './sign-head.ts';
import { signingKey } from './signing-key.ts';

const store = await ownStore();
useDatabase();

const AT = new Date('2026-03-01T08:00:00.000Z');

const append = () =>
  transaction((tx) =>
    appendEntry(tx, {
      chain: randomBytes(16),
      kind: 'authorisation',
      visibility: 'shared',
      occurredAt: null,
      parts: { shown: { v: 1, text: 'Authorised in person.' } },
      photos: [],
      names: [],
      now: AT,
    }),
  );

beforeAll(() => openLog({ now: AT }));
beforeEach(() => store.fault({ kind: 'none' }));

describe('signing the head', () => {
  it('signs what is committed, keeps note and entries in the store, then publishes', async () => {
    expect(await newestCheckpoint()).toBeNull();
    await append();
    const head = await signHead({ now: AT });
    const { origin, size } = await readLogState();
    expect(head.size).toBe(size);
    const entries = await readLogEntries(0, size);
    expect(Buffer.from(head.root)).toEqual(
      Buffer.from(rootOfLeaves(entries.map((entry) => leafHash(entry)))),
    );
    expect((await readOwnNote(toUtf8(head.note), origin))?.size).toBe(size);
    expect(String(await readLogObject(LAST_NOTE))).toBe(head.note);
    expect(String(await readLogObject(noteKey(size)))).toBe(head.note);
    const bundle = await readLogObject(`log/${entriesPath(0, size)}`);
    expect(readEntryBundle(bundle!).map((bytes) => Buffer.from(bytes))).toEqual(entries);
    expect(await newestCheckpoint()).toBe(head.note);
    expect(await signHead({ now: new Date(AT.getTime() + 1000) })).toEqual(head);
  });

  it('proves every leaf and every earlier head under the newest', async () => {
    const old = await newestHead();
    for (let i = 0; i < 9; i += 1) await append();
    const head = await signHead();
    const leaves = Array.from({ length: head.size }, (_, i) => i);
    const proofs = await inclusionProofs(leaves, head.size);
    const entries = await readLogEntries(0, head.size);
    for (const index of leaves) {
      const leaf = { index, size: head.size, leafHash: leafHash(entries[index]!) };
      expect(
        verifyInclusion({ ...leaf, proof: proofs.get(index)!, root: head.root }),
        `leaf ${index}`,
      ).toBe(true);
    }
    const proof = await consistencyProof(old!.size, head.size);
    const heads = { first: old!.size, second: head.size };
    const roots = { firstRoot: old!.root, secondRoot: head.root };
    expect(verifyConsistency({ ...heads, ...roots, proof })).toBe(true);
  });

  it.each([{ kind: 'refuse' as const }, { kind: 'gone' as const }])(
    'waits while the store is out of order ($kind); appending goes on',
    async (fault) => {
      const before = await newestHead();
      await store.fault(fault);
      const { leafIndex } = await append();
      await expect(signHead()).rejects.toThrow(Unavailable);
      expect(await newestHead()).toEqual(before);
      await store.fault({ kind: 'none' });
      expect((await signHead()).size).toBe(leafIndex + 1);
    },
  );

  it('is asked for by an append, once an hour, and done by the worker', async () => {
    const { leafIndex } = await append();
    await append();
    const jobs = await select<{ once_key: string; due_at: Date }>(
      "SELECT once_key, due_at FROM outbox WHERE kind = 'sign-head' AND once_key IS NOT NULL AND done_at IS NULL",
    );
    // Fifteen appends so far; two jobs only if a full hour has just passed.
    expect([1, 2]).toContain(jobs.length);
    expect(jobs.every(({ due_at }) => due_at.getTime() % 3_600_000 === 0)).toBe(true);
    const last = new Date(Math.max(...jobs.map(({ due_at }) => due_at.getTime())));
    await runDueJobs({ now: last, kinds: ['sign-head'] });
    expect((await newestHead())!.size).toBe(leafIndex + 2);
  });

  it('goes on where a killed process stopped: head made, nothing signed', async () => {
    await append();
    const { size } = await readLogState();
    const head = await signHead();
    await run('UPDATE log_heads SET note = NULL, published_at = NULL WHERE size = ?', [size]);
    expect((await newestHead())!.size).toBeLessThan(size);
    expect((await signHead()).note).toBe(head.note);
    expect(await newestCheckpoint()).toBe(head.note);
  });
});

describe('a database that is not the one whose head was signed', () => {
  it('gets no signature when it is behind the store', async () => {
    const { origin, size } = await readLogState();
    const kept = await readLogObject(LAST_NOTE);
    const { secretKey } = await signingKey('log');
    const ahead = signCheckpoint({ origin, size: size + 3, root: randomBytes(32) }, secretKey);
    await keepLogObject(LAST_NOTE, toUtf8(ahead), 'text/plain');
    await append();
    await expect(signHead()).rejects.toThrow(
      `The database has ${size + 1} log entries, the store’s last head has ${size + 3}: the database is behind, as after a restore. Nothing is signed until this is settled: run npm run log:check.`,
    );
    expect((await newestHead())!.size).toBeLessThanOrEqual(size);
    await keepLogObject(LAST_NOTE, kept!, 'text/plain');
  });

  it('gets no signature when its entries are other ones', async () => {
    const { origin, size } = await readLogState();
    const kept = await readLogObject(LAST_NOTE);
    const { secretKey } = await signingKey('log');
    const other = signCheckpoint({ origin, size: size - 1, root: randomBytes(32) }, secretKey);
    await keepLogObject(LAST_NOTE, toUtf8(other), 'text/plain');
    await expect(signHead()).rejects.toThrow(
      `The database’s first ${size - 1} log entries are not the ones whose head was signed before.`,
    );
    await keepLogObject(LAST_NOTE, kept!, 'text/plain');
  });

  it('gets no signature beside the head of another log', async () => {
    const kept = await readLogObject(LAST_NOTE);
    const foreign = { origin: `witnessmark/${'0'.repeat(12)}4${'0'.repeat(3)}8${'0'.repeat(15)}` };
    const note = signCheckpoint({ ...foreign, size: 2, root: randomBytes(32) }, randomBytes(32));
    await keepLogObject(LAST_NOTE, toUtf8(note), 'text/plain');
    await expect(signHead()).rejects.toThrow(Conflict);
    await keepLogObject(LAST_NOTE, kept!, 'text/plain');
    await signHead();
  });
});
