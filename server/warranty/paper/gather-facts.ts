import { dayIn, type Day } from '#domain/calendar.ts';
import { formatCaseNumber } from '#domain/case-number.ts';
import { kindInSentence } from '#domain/instrument-kinds.ts';
import type { Role } from '#domain/viewer.ts';
import { toHex } from '#evidence/bytes/hex.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { formatCode } from '#evidence/code/format-code.ts';
import { qrFragment } from '#evidence/code/qr-fragment.ts';
import { select } from '#server/db/sql.ts';
import { env } from '#server/env.ts';
import { currentKey } from '#server/evidence/current-key.ts';
import { issuerOf } from '../issuer-of.ts';
import type { SealedWarranty } from '../sealed-warranty.ts';
import { dayInWords, termInWords, timeInWords } from '../words.ts';
import { gatherPair } from './gather-pair.ts';
import type { PaperFacts } from './paper-facts.ts';

interface Row {
  year: number;
  ordinal: number;
  taken_in_at: Date;
  closed_at: Date;
  kind: string;
  maker: string;
  serial: string | null;
  owner: string;
  shop: string;
  place: string;
  address: string;
  telephone: string;
  zone: string;
  conditions: string;
  sealed_at: Date;
  close: Buffer;
}

const ROLE: Record<Role, string> = {
  proprietor: 'shop owner',
  technician: 'technician',
  desk: 'front desk',
};

async function rowOf({ caseId, leafIndex, record, closeSeq }: SealedWarranty): Promise<Row> {
  const [row] = await select<Row>(
    `SELECT c.year, c.ordinal, c.taken_in_at, c.closed_at, i.kind, i.maker, i.serial,
            o.name AS owner, s.name AS shop, s.place, s.address, s.telephone,
            s.time_zone AS zone, s.warranty_terms AS conditions, w.recorded_at AS sealed_at,
            p.bytes AS close
     FROM cases c
     JOIN shops s ON s.id = 1
     JOIN instruments i ON i.id = c.instrument_id
     JOIN parties a ON a.case_id = c.id AND a.part = 'owner'
     JOIN customers o ON o.id = a.customer_id
     JOIN sealed_entries w ON w.leaf_index = :leafIndex
     JOIN sealed_entries e ON e.chain = :record AND e.seq = :closeSeq
     JOIN sealed_parts p ON p.leaf_index = e.leaf_index AND p.name = 'shown'
     WHERE c.id = :caseId`,
    { caseId, leafIndex, record, closeSeq },
  );
  if (!row) throw new Error('What a warranty is about cannot be read. Run npm run log:check.');
  return row;
}

/** "on 24 April 2026", "between 9 and 24 April 2026", "between 31 March and 24 April 2026" */
export function spanInWords(from: Day, to: Day): string {
  if (from === to) return `on ${dayInWords(to)}`;
  const [day, month, year] = dayInWords(from).split(' ');
  const start =
    from.slice(0, 7) === to.slice(0, 7)
      ? day
      : from.slice(0, 4) === to.slice(0, 4)
        ? `${day} ${month}`
        : `${day} ${month} ${year}`;
  return `between ${start} and ${dayInWords(to)}`;
}

async function namesOf(ids: string[]): Promise<Map<string, string>> {
  const rows = await select<{ id: string; name: string }>(
    'SELECT id, name FROM people WHERE id IN (?)',
    [ids],
  );
  return new Map(rows.map(({ id, name }) => [id, name]));
}

const counted = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

/** Looks up everything that a warranty's paper says. */
export async function gatherFacts(warranty: SealedWarranty): Promise<PaperFacts> {
  const row = await rowOf(warranty);
  const [issuer, names, key, pair] = await Promise.all([
    issuerOf(warranty.issuedBy),
    namesOf(warranty.work.map(({ personId }) => personId)),
    currentKey('log'),
    gatherPair(warranty.caseId, row.zone),
  ]);
  const day = (at: Date) => dayIn(at, row.zone);
  const { entries, photos } = readPart('close', 'shown', row.close);
  const address = new URL('/verify', env().PUBLIC_URL);
  return {
    shop: {
      name: row.shop,
      place: row.place,
      address: row.address,
      // A telephone number does not break over two lines.
      telephone: row.telephone.replaceAll(' ', '\u00a0'),
      conditions: row.conditions.trim(),
    },
    code: formatCode(warranty.code),
    caseNumber: formatCaseNumber(row),
    instrument: `${kindInSentence(row.kind)} by ${row.maker}`,
    serial: row.serial,
    owner: row.owner,
    repaired: spanInWords(day(row.taken_in_at), day(row.closed_at)),
    pair,
    work: warranty.work.map(({ text, personId }) => ({ text, name: names.get(personId) ?? '' })),
    term: termInWords(warranty.months),
    starts: dayInWords(day(warranty.validFrom)),
    lastDay: dayInWords(day(warranty.validUntil)),
    signed: `${issuer.name}, ${ROLE[issuer.role]}, ${timeInWords(row.sealed_at, row.zone)}`,
    counts: `${counted(entries, 'entry', 'entries')}, ${counted(photos, 'photo', 'photos')}`,
    logKeyId: key.id,
    sealValue: toHex(warranty.seal),
    address: address.host + address.pathname,
    qr: `${address.href}/${warranty.code}${qrFragment(warranty.seal, key.id)}`,
    stamp: 'the shop’s clock; outside time-stamp to follow',
  };
}
