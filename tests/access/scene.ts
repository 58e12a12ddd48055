import { v7 } from 'uuid';
import { vi } from 'vitest';
import type { StaffViewer } from '#domain/viewer.ts';
import { run, select } from '#server/db/sql.ts';
import { startSession } from '#server/auth/start-session.ts';
import { takeIn } from '#server/cases/take-in.ts';
import { addEntry } from '#server/entries/add-entry.ts';
import { runDueJobs } from '#server/jobs/run-due-jobs.ts';
import { putPhoto } from '#server/photos/put-photo.ts';
import { closeCase } from '#server/record/close-case.ts';
import { sealEntry } from '#server/record/seal-entry.ts';
import { issueWarranty } from '#server/warranty/issue-warranty.ts';
import { anOwner, takeInForm } from '#tests/cases/take-in-form.ts';
import { aJpeg } from '#tests/photos/pictures.ts';
import { inPieces, sent } from '#tests/photos/sending.ts';
import { setUpShop, type TestShop } from '#tests/record/shop.ts';
import { Visitor } from './visitor.ts';

/** Words that stand in one place each, so that a page that should not have them gives itself away. */
export const SHARED_WORDS = 'The bridge came off in one piece';
export const BENCH_WORDS = 'The owner glued it once before';
export const COMPLAINT = 'A rattle under the treble side';

export const NOBODY = { number: '2026-999', id: '01912d68-783e-7000-8000-000000000000' };

/** Addresses of one owner's things. */
export interface Things {
  /** Closed, with a sealed entry, a warranty and its paper. */
  closed: string;
  /** Open, with a draft. */
  open: string;
  draft: string;
  photos: { shared: string; bench: string; draft: string };
  code: string;
  tag: string;
  paper: string;
}

export interface Scene {
  shop: TestShop;
  viewers: Record<'proprietor' | 'technician' | 'desk' | 'owner' | 'other' | 'public', Visitor>;
  things: Things;
  /** Another owner's open case. */
  otherCase: string;
}

const patience = { timeout: 60_000, interval: 50 };

async function addPhoto(by: StaffViewer, caseNumber: string, entryId: string, salt: number) {
  const file = await aJpeg({ salt });
  const photo = sent(caseNumber, file, { entryId });
  await putPhoto(by, photo, inPieces(file));
  return photo.photoId;
}

// The running program's own worker is at it too, but behind everything else on a busy machine.
async function ready(photoId: string): Promise<void> {
  await vi.waitUntil(async () => {
    await runDueJobs();
    const [photo] = await select<{ state: string }>('SELECT state FROM photos WHERE id = ?', [
      photoId,
    ]);
    return photo?.state === 'ready';
  }, patience);
}

async function issued(caseNumber: string): Promise<{ code: string; paper: string }> {
  return vi.waitUntil(async () => {
    await runDueJobs();
    const [warranty] = await select<{ code: string; paper: string }>(
      `SELECT w.code, p.id AS paper FROM warranties w JOIN papers p ON p.warranty_id = w.id
       JOIN cases c ON c.id = w.case_id
       WHERE w.step = 'issued' AND CONCAT(c.year, '-', LPAD(c.ordinal, 3, '0')) = ?`,
      [caseNumber],
    );
    return warranty;
  }, patience);
}

const benchDraft = (title: string) => ({
  title,
  text: SHARED_WORDS,
  benchNote: BENCH_WORDS,
  used: [],
  temperature: null,
  humidity: null,
  minutes: null,
  occurredClock: null,
  rest: null,
});

async function makeThings({ owner: proprietor, technician, desk }: TestShop, name: string) {
  const owner = anOwner(name);
  const closed = await takeIn(desk, takeInForm({ owner, complaint: COMPLAINT }));
  const write = (caseNumber: string, title: string) =>
    addEntry(technician, {
      caseNumber,
      entryId: v7(),
      phase: 'during',
      visibility: 'shared',
      draft: benchDraft(title),
      photos: [],
    });
  const { entryId } = await write(closed.number, 'Bridge taken off');
  const shared = await addPhoto(technician, closed.number, entryId, 1);
  const bench = await addPhoto(technician, closed.number, entryId, 2);
  await hide(bench);
  await Promise.all([shared, bench].map(ready));
  for (const id of [closed.entryId, entryId]) {
    await sealEntry(proprietor, { caseNumber: closed.number, entryId: id });
  }
  await closeCase(desk, { caseNumber: closed.number });
  const work = [{ text: 'Bridge reglued', personId: technician.personId }];
  await issueWarranty(desk, { caseNumber: closed.number, months: 24, work });

  const [party] = await select<{ id: string; tag: string }>(
    `SELECT p.customer_id AS id, c.tag_code AS tag FROM parties p JOIN cases c ON c.id = p.case_id
     WHERE p.part = 'owner' AND CONCAT(c.year, '-', LPAD(c.ordinal, 3, '0')) = ?`,
    [closed.number],
  );
  const known = { owner: { ...owner, id: party!.id }, complaint: COMPLAINT };
  const open = await takeIn(desk, takeInForm(known));
  const draft = (await write(open.number, 'Saddle slot filled')).entryId;
  const inDraft = await addPhoto(technician, open.number, draft, 3);
  await ready(inDraft);
  const things: Things = {
    closed: closed.number,
    open: open.number,
    draft,
    photos: { shared, bench, draft: inDraft },
    tag: party!.tag,
    ...(await issued(closed.number)),
  };
  return { customerId: party!.id, things };
}

async function hide(photoId: string): Promise<void> {
  await run("UPDATE entry_photos SET visibility = 'bench' WHERE photo_id = ?", [photoId]);
}

/** A shop with two owners; the first one's things are looked at by everyone. */
export async function setScene(origin: string): Promise<Scene> {
  const shop = await setUpShop();
  const { customerId, things } = await makeThings(shop, 'Marguerite Osei');
  const otherOwner = anOwner('Juno Marek');
  const other = await takeIn(shop.desk, takeInForm({ owner: otherOwner }));
  const [stranger] = await select<{ id: string }>('SELECT id FROM customers WHERE email = ?', [
    otherOwner.email,
  ]);
  const signIn = async (holder: Parameters<typeof startSession>[1]) => {
    const visitor = new Visitor(origin);
    visitor.take(await startSession(new Request(origin), holder));
    return visitor;
  };
  const staff = ({ personId }: StaffViewer) => signIn({ personId, freshAt: new Date() });
  return {
    shop,
    things,
    otherCase: other.number,
    viewers: {
      proprietor: await staff(shop.owner),
      technician: await staff(shop.technician),
      desk: await staff(shop.desk),
      owner: await signIn({ customerId }),
      other: await signIn({ customerId: stranger!.id }),
      public: new Visitor(origin),
    },
  };
}
