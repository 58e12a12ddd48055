import { formatCaseNumber, formatOrdinal, parseCaseNumber } from '#domain/case-number.ts';
import { NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';
import { caseScope } from './case-scope.ts';
import { unsafeReadFacts, type CaseKnown, type StateColumns } from './read-facts.ts';

/** What the case file of one case says beside its timeline. For the shop's people. */
export interface CaseFile extends CaseKnown {
  id: string;
  number: string;
  year: number;
  ordinal: string;
  version: string;
  tagCode: string;
  kind: string;
  maker: string;
  model: string | null;
  serial: string | null;
  strings: string | null;
  job: string;
  complaint: string;
  accessories: string;
  owner: string;
  technicianId: string | null;
  technician: string | null;
  takenInAt: Date;
  takenInBy: string;
  promisedOn: string | null;
  nextStep: string | null;
  place: string | null;
  onHold: string | null;
  consentPhotos: boolean;
  consentPublish: 'number' | 'work';
  closedAt: Date | null;
  ownerToldAt: Date | null;
  handedBackAt: Date | null;
}

interface Row
  extends Omit<CaseFile, keyof CaseKnown | 'number' | 'ordinal' | 'consentPhotos'>, StateColumns {
  ordinal: number;
  consentPhotos: 0 | 1 | boolean;
}

const COLUMNS = `
  c.id, c.year, c.ordinal, c.version, c.tag_code AS tagCode, c.job, c.complaint, c.accessories,
  c.technician_id AS technicianId, c.taken_in_at AS takenInAt, c.promised_on AS promisedOn,
  c.next_step AS nextStep, c.place, c.on_hold AS onHold, c.consent_photos AS consentPhotos,
  c.consent_publish AS consentPublish, c.closed_at AS closedAt, c.owner_told_at AS ownerToldAt,
  c.handed_back_at AS handedBackAt,
  i.kind, i.maker, i.model, i.serial, i.strings, o.name AS owner, t.name AS technician,
  b.name AS takenInBy`;

/**
 * Reads one case for the case file. Four queries.
 * Throws NotFound for a number that is none, unknown, or not in the viewer's scope.
 */
export async function getCase(
  viewer: Viewer,
  { number }: { number: string },
  { now = new Date() } = {},
): Promise<CaseFile> {
  demand(viewer, 'see cases');
  const parsed = parseCaseNumber(number);
  if (!parsed) throw new NotFound('No case has this number. Check it on the tag.');
  const scope = caseScope(viewer);
  const [row] = await select<Row>(
    `SELECT ${COLUMNS}
     FROM cases c
     JOIN instruments i ON i.id = c.instrument_id
     JOIN parties p ON p.case_id = c.id AND p.part = 'owner'
     JOIN customers o ON o.id = p.customer_id
     JOIN people b ON b.id = c.taken_in_by
     LEFT JOIN people t ON t.id = c.technician_id
     WHERE c.year = :year AND c.ordinal = :ordinal AND ${scope.sql}`,
    { ...scope.params, ...parsed },
  );
  const known = row && (await unsafeReadFacts([row], { now })).get(row.id);
  if (!row || !known) throw new NotFound('No case has this number. Check it on the tag.');
  return {
    ...row,
    ...known,
    number: formatCaseNumber(parsed),
    ordinal: formatOrdinal(row.ordinal),
    consentPhotos: Boolean(row.consentPhotos),
  };
}
