import { parseCaseNumber } from '#domain/case-number.ts';
import { NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { formatCode } from '#evidence/code/format-code.ts';
import type { StandingWord } from '#evidence/standing/standing-shape.ts';
import { select } from '#server/db/sql.ts';
import { newestHead } from '#server/evidence/newest-checkpoint.ts';
import { ownerScope } from './owner-scope.ts';
import { sealedWarranty } from './sealed-warranty.ts';
import { standingUnder } from './standing.ts';
import { unsafeWarranties, type Step, type Warranty } from './warranty.ts';
import { termInWords } from './words.ts';

/** A warranty as the shop's people and the owner see it. */
export interface WarrantyFile {
  id: string;
  /** In groups, 4-4-3. */
  code: string;
  step: Step;
  work: { text: string; name: string }[];
  /** "2 years" */
  term: string;
  validFrom: Date;
  validUntil: Date;
  drawnAt: Date;
  issuedAt: Date | null;
  issuedBy: string;
  /** What it is now, under the newest published head; null before it is issued. */
  standing: StandingWord | null;
  /** 64 hex; null before it is sealed. */
  sealValue: string | null;
  /** The paper that was handed out; null before. */
  paperId: string | null;
}

async function standingNow(warranty: Warranty, now: Date): Promise<StandingWord | null> {
  const head = await newestHead();
  if (warranty.step !== 'issued' || !head) return null;
  return standingUnder(await sealedWarranty(warranty), head, now);
}

async function paperOf(warranty: Warranty): Promise<string | null> {
  if (warranty.step !== 'issued') return null;
  const [paper] = await select<{ id: string }>(
    'SELECT id FROM papers WHERE warranty_id = ? AND leaf_index IS NOT NULL ORDER BY id DESC LIMIT 1',
    [warranty.id],
  );
  return paper?.id ?? null;
}

/**
 * The warranty of a case for the shop's people, and for the instrument's owner once it is issued.
 * @returns null when the case has none that this viewer may see
 * @throws NotFound for a number that is none, unknown, or not in the viewer's scope
 */
export async function getWarranty(
  viewer: Viewer,
  { caseNumber }: { caseNumber: string },
  { now = new Date() }: { now?: Date } = {},
): Promise<WarrantyFile | null> {
  demand(viewer, 'see cases', { own: true });
  const number = parseCaseNumber(caseNumber);
  if (!number) throw new NotFound();
  const scope = ownerScope(viewer);
  const issued = viewer.kind === 'staff' ? 'TRUE' : "w.step = 'issued'";
  const [warranty] = await unsafeWarranties(
    `c.year = :year AND c.ordinal = :ordinal AND ${issued} AND ${scope.sql}`,
    { ...scope.params, ...number },
  );
  if (!warranty) return null;
  const people = await select<{ id: string; name: string }>(
    'SELECT id, name FROM people WHERE id IN (?)',
    [[warranty.issuedBy, ...warranty.work.map(({ personId }) => personId)]],
  );
  const nameOf = (id: string) => people.find((person) => person.id === id)?.name ?? '';
  const { id, step, validFrom, validUntil, drawnAt, issuedAt } = warranty;
  return {
    ...{ id, step, validFrom, validUntil, drawnAt, issuedAt },
    code: formatCode(warranty.code),
    work: warranty.work.map(({ text, personId }) => ({ text, name: nameOf(personId) })),
    term: termInWords(warranty.months),
    issuedBy: nameOf(warranty.issuedBy),
    standing: await standingNow(warranty, now),
    sealValue: warranty.seal?.toString('hex') ?? null,
    paperId: await paperOf(warranty),
  };
}
