import { createHash } from 'node:crypto';
import { buffer } from 'node:stream/consumers';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { NotFound, Unavailable } from '#domain/errors.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import { select } from '#server/db/sql.ts';
import { currentKey } from '#server/evidence/current-key.ts';
import { newestHead } from '#server/evidence/newest-checkpoint.ts';
import { openLog } from '#server/evidence/open-log.ts';
import { signHead } from '#server/evidence/sign-head.ts';
import { runDueJobs } from '#server/jobs/run-due-jobs.ts';
import { handBack } from '#server/record/hand-back.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { closedCase } from '#tests/record/closed-case.ts';
import { ownStore } from '#tests/record/own-store.ts';
import {
  OWNER_EMAIL,
  setUpShop,
  takeInCase,
  type TestCase,
  type TestShop,
} from '#tests/record/shop.ts';
import { advanceWarranty, continueWarranty } from './continue-warranty.ts';
import { drawWarranty } from './draw-warranty.ts';
import { issueWarranty } from './issue-warranty.ts';
import { readPaper } from './read-paper.ts';
import { sealedWarranty } from './sealed-warranty.ts';
import { unsafeWarranty } from './warranty.ts';
import { warrantyBundle } from './warranty-bundle.ts';

const store = await ownStore();
useDatabase();

const NOW = new Date('2026-04-24T15:05:00.000Z');
const later = (seconds: number) => new Date(NOW.getTime() + seconds * 1000);
let shop: TestShop;

beforeAll(async () => {
  shop = await setUpShop();
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
});
beforeEach(() => store.fault({ kind: 'none' }));

async function begin(repair: TestCase) {
  const { lines } = await drawWarranty(shop.desk, { caseNumber: repair.number });
  const work = lines.filter(({ proposed }) => proposed);
  return issueWarranty(shop.desk, { caseNumber: repair.number, months: 24, work }, { now: NOW });
}

async function verify(warrantyId: string, withCredential = true) {
  const warranty = await sealedWarranty(await unsafeWarranty(warrantyId));
  const head = await newestHead();
  const text = await warrantyBundle(warranty, head!, { withCredential, now: later(60) });
  const { id } = await currentKey('log');
  const outside = { logKeyId: id, logKeyFrom: 'address', address: 'shop.example' } as const;
  const seal16 = new Uint8Array(warranty.seal.subarray(0, 16));
  return { text, report: verifyBundle(text, { ...outside, seal16, code: warranty.code }) };
}

const kindsOf = async (repair: TestCase) =>
  (
    await select<{ kind: string }>('SELECT kind FROM sealed_entries WHERE chain = ? ORDER BY seq', [
      repair.record,
    ])
  ).map(({ kind }) => kind);

const paperIdOf = async (warrantyId: string) =>
  (await select<{ id: string }>('SELECT id FROM papers WHERE warranty_id = ?', [warrantyId]))[0]
    ?.id ?? '00000000-0000-7000-8000-000000000000';

describe('a warranty', () => {
  it('is drawn from the titles of a closed case, in the shop’s days', async () => {
    const repair = await closedCase(shop, { now: NOW });
    const drawn = await drawWarranty(shop.desk, { caseNumber: repair.number });
    expect(drawn.lines.map(({ text, proposed }) => [text, proposed])).toEqual([
      ['Taken in', false],
      ['Bridge reglued', true],
      ['Strung up', false],
    ]);
    // 24 months on from 24 April 2026; the last day ends at 23:00 UTC while London keeps summer time.
    expect(drawn.term).toEqual({
      startsOn: '2026-04-24',
      lastDay: '2028-04-24',
      endsAt: new Date('2028-04-24T23:00:00.000Z'),
    });
  });

  it('is issued whole, verifies, and is handed out by mail', async () => {
    const repair = await closedCase(shop, { now: NOW });
    const { warrantyId, code } = await begin(repair);
    await continueWarranty(warrantyId, { now: NOW });
    const warranty = await unsafeWarranty(warrantyId);
    expect(warranty.step).toBe('issued');
    expect(warranty.validUntil).toEqual(new Date('2028-04-24T22:59:59.999Z'));

    const { report } = await verify(warrantyId);
    expect(report.findings.filter(({ outcome }) => outcome === 'failed')).toEqual([]);
    expect(report.verdict).toBe('Intact');
    expect(report.standing.word).toBe('in force');

    const paper = await readPaper(shop.technician, { paperId: await paperIdOf(warrantyId) });
    const pdf = await buffer(await paper.open());
    expect(pdf.length).toBe(paper.length);
    expect(createHash('sha256').update(pdf).digest('hex')).toBe(paper.sha256);
    expect(paper.fileName).toBe(`${code.slice(0, 4)}-${code.slice(4, 8)}-${code.slice(8)}.pdf`);

    const [mail] = await select<{ payload: string }>(
      'SELECT payload FROM outbox WHERE once_key = ?',
      [`warranty-issued/${warrantyId}`],
    );
    expect(JSON.parse(mail!.payload)).toMatchObject({
      template: 'warranty-issued',
      to: OWNER_EMAIL,
      data: { validUntil: '24 April 2028' },
    });
  });

  it('goes on after being killed between any two steps, and does nothing twice', async () => {
    const repair = await closedCase(shop, { now: NOW });
    const { warrantyId } = await begin(repair);
    const steps = [];
    for (let step = ''; step !== 'issued';) {
      step = await advanceWarranty(warrantyId, { now: NOW });
      steps.push(step);
      if (step !== 'issued') {
        await expect(
          readPaper(shop.desk, { paperId: await paperIdOf(warrantyId) }),
        ).rejects.toThrow(NotFound);
      }
    }
    expect(steps).toEqual(['credential', 'sealed', 'paper', 'issued']);
    expect(await advanceWarranty(warrantyId)).toBe('issued');
    await continueWarranty(warrantyId, { now: NOW });
    expect((await kindsOf(repair)).slice(-3)).toEqual(['close', 'warranty', 'paper']);
    const papers = await select('SELECT id FROM papers WHERE warranty_id = ?', [warrantyId]);
    expect(papers).toHaveLength(1);
  });

  it('waits while the store is gone, at each step that needs it', async () => {
    const repair = await closedCase(shop, { now: NOW });
    const { warrantyId } = await begin(repair);
    await advanceWarranty(warrantyId, { now: NOW });
    await advanceWarranty(warrantyId, { now: NOW });
    await store.fault({ kind: 'refuse' });
    await expect(advanceWarranty(warrantyId, { now: NOW })).rejects.toThrow(Unavailable);
    expect((await unsafeWarranty(warrantyId)).step).toBe('sealed');
    await store.fault({ kind: 'none' });
    expect(await advanceWarranty(warrantyId, { now: NOW })).toBe('paper');
    // The paper's leaf is written; its checkpoint waits, and so does handing it out.
    await store.fault({ kind: 'refuse' });
    await expect(advanceWarranty(warrantyId, { now: NOW })).rejects.toThrow(Unavailable);
    expect((await unsafeWarranty(warrantyId)).step).toBe('paper');
    await store.fault({ kind: 'none' });
    expect(await advanceWarranty(warrantyId, { now: NOW })).toBe('issued');
    expect((await kindsOf(repair)).filter((kind) => kind === 'paper')).toHaveLength(1);
    expect((await verify(warrantyId)).report.verdict).toBe('Intact');
  });

  it('stays intact when the instrument is handed back after it', async () => {
    const repair = await closedCase(shop, { now: NOW });
    const { warrantyId } = await begin(repair);
    await continueWarranty(warrantyId, { now: NOW });
    await handBack(shop.desk, { caseNumber: repair.number }, { now: later(10) });
    // Something stands between the first close and the hand-back, so the case was closed anew.
    expect((await kindsOf(repair)).slice(-5)).toEqual([
      'close',
      'warranty',
      'paper',
      'close',
      'handed-back',
    ]);
    await signHead();
    const { report } = await verify(warrantyId);
    expect(report.findings.filter(({ outcome }) => outcome === 'failed')).toEqual([]);
    expect([report.verdict, report.standing.word]).toEqual(['Intact', 'in force']);
  });

  it('without its credential says less and is not called intact', async () => {
    const repair = await closedCase(shop, { now: NOW, consent: 'number' });
    const { warrantyId } = await begin(repair);
    await continueWarranty(warrantyId, { now: NOW });
    const { text, report } = await verify(warrantyId, false);
    expect(report.verdict).toBe('Not fully checked');
    expect(text).not.toContain('Bridge reglued');
    expect(text).not.toContain('Perrin Kell');
  });

  it('is refused for an open case, a second time, and without work', async () => {
    const open = await takeInCase(shop);
    const work = [{ text: 'Nut made', personId: shop.technician.personId }];
    const issue = (input: object) =>
      issueWarranty(shop.desk, input as { caseNumber: string }, { now: NOW });
    await expect(issue({ caseNumber: open.number, months: 12, work })).rejects.toThrow(
      'A warranty is drawn from a closed case. Close the case first.',
    );
    const repair = await closedCase(shop, { now: NOW });
    await expect(issue({ caseNumber: repair.number, months: 12, work: [] })).rejects.toThrow(
      'Nothing is covered. Keep at least one line of work.',
    );
    await expect(issue({ caseNumber: repair.number, months: 0, work })).rejects.toThrow(
      'A warranty lasts a month at least. Write whole months.',
    );
    await begin(repair);
    await expect(issue({ caseNumber: repair.number, months: 12, work })).rejects.toThrow(
      'A warranty for this case is being issued. Wait a moment.',
    );
    const customer = { kind: 'customer', customerId: repair.ownerId, name: '' } as const;
    await expect(
      issueWarranty(customer, { caseNumber: repair.number, months: 12, work }),
    ).rejects.toThrow('Your role does not include this. Ask the shop owner.');
  });

  it('is issued by the worker; what is issued already stays as it is', async () => {
    const waiting = await select<{ id: string; step: string }>(
      "SELECT id, step FROM warranties WHERE step <> 'issued'",
    );
    expect(waiting).toHaveLength(1);
    const { done, failed } = await runDueJobs({ kinds: ['issue-warranty'] });
    expect(failed).toBe(0);
    expect(done).toBeGreaterThan(1);
    expect((await unsafeWarranty(waiting[0]!.id)).step).toBe('issued');
    const [papers] = await select<{ warranties: string; papers: string }>(
      `SELECT (SELECT COUNT(*) FROM warranties) AS warranties, (SELECT COUNT(*) FROM papers) AS papers`,
    );
    expect(papers!.papers).toBe(papers!.warranties);
  });
});
