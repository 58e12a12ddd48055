import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { Conflict, NotAllowed, NotFound } from '#domain/errors.ts';
import type { EntryShown } from '#evidence/chain/entry-shown.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { run, select } from '#server/db/sql.ts';
import { openLog } from '#server/evidence/open-log.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { addPhoto, writeDraft } from '#tests/record/entries.ts';
import {
  OWNER_NAME,
  setUpShop,
  takeInCase,
  type TestCase,
  type TestShop,
} from '#tests/record/shop.ts';
import { amendEntry } from './amend-entry.ts';
import { changeVisibility } from './change-visibility.ts';
import { closeCase } from './close-case.ts';
import { handBack } from './hand-back.ts';
import { readSealedBench, readSealedShown } from './read-sealed.ts';
import { sealEntry } from './seal-entry.ts';

useDatabase();

const NOW = new Date('2026-04-09T09:12:44.318Z');
let shop: TestShop;
let repair: TestCase;

beforeAll(async () => {
  shop = await setUpShop();
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
});
beforeEach(async () => {
  repair = await takeInCase(shop);
});

const seal = (entryId: string, by = shop.technician) =>
  sealEntry(by, { caseNumber: repair.number, entryId }, { now: NOW });

async function sealedRow(leafIndex: number) {
  const [row] = await select<{ kind: 'entry'; header: Buffer; commitment: Buffer }>(
    'SELECT kind, header, commitment FROM sealed_entries WHERE leaf_index = ?',
    [leafIndex],
  );
  const parts = await select<{ name: 'shown'; bytes: Buffer }>(
    'SELECT name, bytes FROM sealed_parts WHERE leaf_index = ?',
    [leafIndex],
  );
  return {
    header: readHeader(row!.header),
    commitment: row!.commitment.toString('hex'),
    parts: Object.fromEntries(
      parts.map(({ name, bytes }) => [name, readPart(row!.kind, name, bytes)]),
    ) as Record<string, unknown>,
  };
}

describe('sealing', () => {
  it('moves the words into parts, people by role and number, names apart', async () => {
    const entryId = await writeDraft(repair, shop.technician, {
      title: 'Taken in',
      phase: 'before',
      benchNote: 'Smells of smoke.',
      minutes: 20,
      occurredAt: new Date('2026-04-09T08:00:00.000Z'),
    });
    const shared = await addPhoto(repair, entryId, shop.technician, { caption: 'Gap at the back' });
    const kept = await addPhoto(repair, entryId, shop.technician, {
      visibility: 'bench',
      caption: 'Label',
    });
    const { leafIndex, leafHash } = await seal(entryId, shop.owner);
    const { header, parts } = await sealedRow(leafIndex);
    expect(parts.shown).toMatchObject({
      v: 2,
      title: 'Taken in',
      by: 'technician 2',
      photos: [{ n: shared, caption: 'Gap at the back' }],
    });
    expect(parts.bench).toMatchObject({
      v: 2,
      text: 'Smells of smoke.',
      minutes: 20,
      entry: null,
      photos: [{ n: kept, caption: 'Label' }],
    });
    expect(parts.owner).toEqual({
      v: 1,
      name: OWNER_NAME,
      text: 'It buzzes and the bridge lifts.',
    });
    expect(parts.staff).toEqual({
      v: 1,
      names: { 'shop owner 1': 'Quilla Marsh', 'technician 2': 'Bram Ottway' },
    });
    expect(JSON.stringify(parts.shown)).not.toMatch(/Ottway|Carrow|smoke/);
    expect(header).toMatchObject({
      kind: 'entry',
      visibility: 'shared',
      occurredAt: '2026-04-09T08:00:00.000Z',
      recordedAt: NOW.toISOString(),
      photos: [
        { n: shared, visibility: 'shared' },
        { n: kept, visibility: 'bench' },
      ],
    });
    const [entry] = await select<Record<string, unknown>>(
      'SELECT draft, leaf_index, sealed_at, sealed_by FROM entries WHERE id = ?',
      [entryId],
    );
    expect(entry).toMatchObject({ draft: null, leaf_index: String(leafIndex), sealed_at: NOW });
    const links = await select<{ caption: string | null; salted: number }>(
      'SELECT caption, LENGTH(original_salt) + LENGTH(published_salt) AS salted FROM entry_photos WHERE entry_id = ?',
      [entryId],
    );
    expect(links.map(({ caption, salted }) => [caption, Number(salted)])).toEqual([
      [null, 64],
      [null, 64],
    ]);
    const shown = await readSealedShown([leafIndex]);
    expect(shown.get(leafIndex)).toMatchObject({ leafHash, body: { title: 'Taken in' } });
    const [mail] = await select<{ payload: string }>(
      'SELECT payload FROM outbox WHERE once_key = ?',
      [`entry-shared/${entryId}`],
    );
    expect(JSON.parse(mail!.payload)).toMatchObject({ data: { title: 'Taken in' } });
  });

  it('shows nothing of an entry for the bench only, and tells nobody', async () => {
    const entryId = await writeDraft(repair, shop.technician, {
      visibility: 'bench',
      title: 'Neck angle',
      occurredAt: NOW,
    });
    const n = await addPhoto(repair, entryId, shop.technician, { visibility: 'shared' });
    const { leafIndex } = await seal(entryId);
    const { header, parts } = await sealedRow(leafIndex);
    expect(parts.shown).toBeUndefined();
    expect(parts.bench).toMatchObject({ v: 2, entry: { title: 'Neck angle', photos: [{ n }] } });
    expect(header.occurredAt).toBeNull();
    expect(header.photos).toMatchObject([{ n, visibility: 'bench' }]);
    expect((await readSealedShown([leafIndex])).get(leafIndex)?.body).toBeNull();
    expect((await readSealedBench([leafIndex])).get(leafIndex)?.body?.title).toBe('Neck angle');
    const mails = await select('SELECT id FROM outbox WHERE once_key = ?', [
      `entry-shared/${entryId}`,
    ]);
    expect(mails).toEqual([]);
  });

  it('refuses what is not ready, sealed already, another’s, or in a closed case', async () => {
    const waiting = await writeDraft(repair, shop.technician);
    await addPhoto(repair, waiting, shop.technician, { state: 'waiting' });
    await expect(seal(waiting)).rejects.toThrow(
      'Photo 1 is still being prepared. Wait a moment, then seal the entry.',
    );
    const failed = await writeDraft(repair, shop.technician);
    await addPhoto(repair, failed, shop.technician, { state: 'failed' });
    await expect(seal(failed)).rejects.toThrow(
      'Photo 2 could not be read. Take it off this entry, then seal it.',
    );
    await run('DELETE FROM entry_photos WHERE entry_id IN (?)', [[waiting, failed]]);
    await expect(seal(waiting, shop.desk)).rejects.toThrow(NotAllowed);
    const own = await writeDraft(repair, shop.desk);
    await seal(own, shop.desk);
    await expect(seal(own)).rejects.toThrow('This entry is sealed already.');
    await seal(waiting);
    await seal(failed);
    await closeCase(shop.desk, { caseNumber: repair.number }, { now: NOW });
    const late = await writeDraft(repair, shop.technician);
    await expect(seal(late)).rejects.toThrow(
      'This case is closed: nothing is added to it any more.',
    );
    const elsewhere = await takeInCase(shop);
    await expect(
      sealEntry(shop.technician, { caseNumber: elsewhere.number, entryId: late }, { now: NOW }),
    ).rejects.toThrow(NotFound);
  });

  it('waits for a photo that is still on somebody’s phone', async () => {
    const entryId = await writeDraft(repair, shop.technician);
    const photoId = '01890000-0000-7000-8000-000000000001';
    await run(
      "UPDATE entries SET draft = JSON_SET(draft, '$.expected', JSON_ARRAY(JSON_OBJECT('photoId', ?, 'caption', 'Head', 'visibility', 'shared'))) WHERE id = ?",
      [photoId, entryId],
    );
    await expect(seal(entryId)).rejects.toThrow(
      '1 photo is still going up. Wait for it, or take it off the entry.',
    );
  });
});

describe('correcting', () => {
  it('adds an amendment that names the original and tells it whole, even after the close', async () => {
    const entryId = await writeDraft(repair, shop.technician, { title: 'Bridge of' });
    const n = await addPhoto(repair, entryId, shop.technician, { caption: 'Bridge' });
    const original = await sealedRow((await seal(entryId)).leafIndex);
    await closeCase(shop.desk, { caseNumber: repair.number }, { now: NOW });
    const amend = () => amendEntry(shop.technician, { caseNumber: repair.number, entryId });
    const { entryId: draftId } = await amend();
    expect((await amend()).entryId).toBe(draftId);
    await run("UPDATE entries SET draft = JSON_SET(draft, '$.title', 'Bridge off') WHERE id = ?", [
      draftId,
    ]);
    const more = await addPhoto(repair, draftId, shop.technician, { caption: 'Its underside' });
    const { header, parts } = await sealedRow((await seal(draftId)).leafIndex);
    expect(header.kind).toBe('amendment');
    expect(header.names).toEqual([original.commitment]);
    expect(header.photos.map((photo) => photo.n)).toEqual([more]);
    const shown = parts.shown as EntryShown;
    expect(shown.title).toBe('Bridge off');
    expect(shown.photos.map((photo) => [photo.n, photo.caption])).toEqual([
      [n, 'Bridge'],
      [more, 'Its underside'],
    ]);
    // A correction of the correction names the original again.
    const again = await amendEntry(shop.owner, { caseNumber: repair.number, entryId: draftId });
    const second = await sealedRow((await seal(again.entryId, shop.owner)).leafIndex);
    expect(second.header.names).toEqual([original.commitment]);
    expect((second.parts.shown as EntryShown).photos).toHaveLength(2);
  });

  it('refuses a draft, an event, and a photo that stands there already', async () => {
    const entryId = await writeDraft(repair, shop.technician);
    const caseNumber = repair.number;
    await expect(amendEntry(shop.technician, { caseNumber, entryId })).rejects.toThrow(
      'This entry is not sealed yet. Edit it as it is.',
    );
    await addPhoto(repair, entryId, shop.technician);
    await seal(entryId);
    await expect(amendEntry(shop.desk, { caseNumber, entryId })).rejects.toThrow(NotAllowed);
    const { entryId: draftId } = await amendEntry(shop.technician, { caseNumber, entryId });
    await run(
      `INSERT INTO entry_photos (id, entry_id, photo_id, visibility)
       SELECT UUID(), ?, photo_id, 'shared' FROM entry_photos WHERE entry_id = ?`,
      [draftId, entryId],
    );
    await expect(seal(draftId)).rejects.toThrow(
      'Photo 1 stands in the entry already. Take it off the correction, then seal it.',
    );
    await run('DELETE FROM entry_photos WHERE entry_id = ?', [draftId]);
    await seal(draftId);
    await closeCase(shop.desk, { caseNumber }, { now: NOW });
    const [close] = await select<{ id: string }>(
      "SELECT id FROM entries WHERE case_id = ? AND kind = 'close'",
      [repair.id],
    );
    await expect(amendEntry(shop.owner, { caseNumber, entryId: close!.id })).rejects.toThrow(
      'This entry records an event and has no words to correct.',
    );
  });
});

describe('closing and handing back', () => {
  it('names every entry before it and counts them; drafts hold it up by name', async () => {
    const caseNumber = repair.number;
    await expect(closeCase(shop.desk, { caseNumber })).rejects.toThrow(
      'Nothing is sealed in this case. Seal at least one entry, then close it.',
    );
    const first = await writeDraft(repair, shop.technician, { title: 'Bridge off' });
    await addPhoto(repair, first, shop.technician);
    const second = await writeDraft(repair, shop.technician, { title: 'Cleats' });
    await expect(closeCase(shop.desk, { caseNumber })).rejects.toThrow(
      '2 entries are not sealed yet: “Bridge off”, “Cleats”. Seal or remove them, then close the case.',
    );
    const sealed = [await seal(first), await seal(second)];
    await closeCase(shop.desk, { caseNumber }, { now: NOW });
    const [row] = await select<{ leaf_index: string }>(
      "SELECT leaf_index FROM entries WHERE case_id = ? AND kind = 'close'",
      [repair.id],
    );
    const { header } = await sealedRow(Number(row!.leaf_index));
    const commitments = await Promise.all(
      sealed.map(async ({ leafIndex }) => (await sealedRow(leafIndex)).commitment),
    );
    expect(header.names).toEqual(commitments);
    const [part] = await select<{ bytes: Buffer }>(
      "SELECT bytes FROM sealed_parts WHERE leaf_index = ? AND name = 'shown'",
      [Number(row!.leaf_index)],
    );
    expect(readPart('close', 'shown', part!.bytes)).toMatchObject({ entries: 2, photos: 1 });
    const [closed] = await select<{ closed_at: Date; owner_told_at: Date; version: string }>(
      'SELECT closed_at, owner_told_at, version FROM cases WHERE id = ?',
      [repair.id],
    );
    expect(closed).toMatchObject({ closed_at: NOW, owner_told_at: NOW });
    expect(Number(closed!.version)).toBeGreaterThan(2);
    await expect(closeCase(shop.desk, { caseNumber })).rejects.toThrow('closed already');
  });

  it('hands back after the close, closing anew where something came between', async () => {
    const caseNumber = repair.number;
    await expect(handBack(shop.desk, { caseNumber })).rejects.toThrow(
      'This case is not closed yet. Close it, then hand the instrument back.',
    );
    const entryId = await writeDraft(repair, shop.technician);
    await seal(entryId);
    await closeCase(shop.desk, { caseNumber }, { now: NOW });
    const { entryId: draftId } = await amendEntry(shop.technician, { caseNumber, entryId });
    await seal(draftId);
    await handBack(shop.technician, { caseNumber }, { now: NOW });
    const rows = await select<{ kind: string; header: Buffer; commitment: Buffer }>(
      'SELECT kind, header, commitment FROM sealed_entries WHERE chain = ? ORDER BY seq',
      [repair.record],
    );
    expect(rows.map(({ kind }) => kind)).toEqual([
      'entry',
      'close',
      'amendment',
      'close',
      'handed-back',
    ]);
    const hex = rows.map(({ commitment }) => commitment.toString('hex'));
    const back = readHeader(rows[4]!.header);
    expect([back.prev, back.names]).toEqual([hex[3], [hex[3]]]);
    expect(readHeader(rows[3]!.header).names).toEqual(hex.slice(0, 3));
    await expect(handBack(shop.desk, { caseNumber })).rejects.toThrow(Conflict);
  });
});

describe('changing who may see it', () => {
  it('is a sealed event of its own, for entry or photos, and can be taken back', async () => {
    const caseNumber = repair.number;
    const entryId = await writeDraft(repair, shop.technician);
    const n = await addPhoto(repair, entryId, shop.technician);
    const { commitment } = await sealedRow((await seal(entryId)).leafIndex);
    const change = (to: 'shared' | 'bench', photos: number[] | null, by = shop.desk) =>
      changeVisibility(by, { caseNumber, entryId, to, photos }, { now: NOW });
    await expect(change('bench', null, shop.technician)).rejects.toThrow(NotAllowed);
    await change('bench', [n]);
    await expect(change('bench', [n])).rejects.toThrow('Nothing changes');
    await change('bench', null);
    await change('shared', null);
    const events = await select<{ header: Buffer; bytes: Buffer }>(
      `SELECT s.header, p.bytes FROM sealed_entries s
       JOIN sealed_parts p ON p.leaf_index = s.leaf_index AND p.name = 'shown'
       WHERE s.chain = ? AND s.kind = 'visibility' ORDER BY s.seq`,
      [repair.record],
    );
    expect(events.map(({ bytes }) => readPart('visibility', 'shown', bytes))).toEqual([
      { v: 1, to: 'bench', n: [n] },
      { v: 1, to: 'bench', n: null },
      { v: 1, to: 'shared', n: null },
    ]);
    for (const { header } of events) expect(readHeader(header).names).toEqual([commitment]);
    const [link] = await select<{ visibility: string }>(
      'SELECT visibility FROM entry_photos WHERE entry_id = ?',
      [entryId],
    );
    expect(link!.visibility).toBe('bench');
  });

  it('does not share an entry that was sealed for the bench only', async () => {
    const entryId = await writeDraft(repair, shop.technician, { visibility: 'bench' });
    await seal(entryId);
    const input = { caseNumber: repair.number, entryId, to: 'shared' as const, photos: null };
    await expect(changeVisibility(shop.owner, input, { now: NOW })).rejects.toThrow(
      'This entry was sealed for the bench only.',
    );
  });
});
