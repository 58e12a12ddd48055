import { toHex } from '#evidence/bytes/hex.ts';
import { toInstant } from '#evidence/bytes/instant.ts';
import type { PaperShown, WarrantyShown } from '#evidence/chain/case-shown.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { credentialHash } from '#evidence/credential/credential-hash.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { select } from '#server/db/sql.ts';
import { sameBytes, type Differences } from './differences.ts';

interface WarrantyRow {
  leaf_index: string;
  entry: Buffer;
  shown: Buffer | null;
  id: string | null;
  code: string;
  jws: string | null;
  seal: Buffer | null;
  valid_from: Date;
  valid_until: Date;
}

interface PaperRow {
  leaf_index: string;
  shown: Buffer | null;
  id: string | null;
  length: number;
  sha256: Buffer;
}

const WARRANTIES = `
  SELECT s.leaf_index, l.entry, p.bytes AS shown, w.id, w.code, w.jws, w.seal, w.valid_from, w.valid_until
  FROM sealed_entries s
  JOIN log_leaves l ON l.leaf_index = s.leaf_index
  LEFT JOIN sealed_parts p ON p.leaf_index = s.leaf_index AND p.name = 'shown'
  LEFT JOIN warranties w ON w.leaf_index = s.leaf_index
  WHERE s.kind = 'warranty' ORDER BY s.leaf_index`;
const PAPERS = `
  SELECT s.leaf_index, p.bytes AS shown, a.id, a.length, a.sha256
  FROM sealed_entries s
  LEFT JOIN sealed_parts p ON p.leaf_index = s.leaf_index AND p.name = 'shown'
  LEFT JOIN papers a ON a.leaf_index = s.leaf_index
  WHERE s.kind = 'paper' ORDER BY s.leaf_index`;

/** What the credential says; it was signed, so the table is held against it. */
function payloadOf(jws: string) {
  const [, payload = ''] = jws.split('.');
  return JSON.parse(Buffer.from(payload, 'base64url').toString('utf8')) as {
    validFrom: string;
    validUntil: string;
    credentialSubject: { code: string };
  };
}

function shownOf<T>(kind: 'warranty' | 'paper', bytes: Buffer | null): T | null {
  try {
    return bytes && (readPart(kind, 'shown', bytes) as T);
  } catch {
    // That the part cannot be read is said where the leaf is checked.
    return null;
  }
}

function checkWarranty(row: WarrantyRow, found: Differences): void {
  const which = `leaf ${row.leaf_index}`;
  found.seen('warranties');
  if (row.id === null)
    return found.add('warranties.leaf_index', which, 'no warranty has this leaf');
  const seal = leafHash(row.entry);
  found.expect(sameBytes(seal, row.seal), 'warranties.seal', which, 'is not the leaf’s hash');
  const { jws } = row;
  const shown = shownOf<WarrantyShown>('warranty', row.shown);
  const same = jws !== null && toHex(credentialHash(jws)) === shown?.jws;
  if (!found.expect(same, 'warranties.jws', which, 'is not what was sealed') || jws === null)
    return;
  const { validFrom, validUntil, credentialSubject } = payloadOf(jws);
  const columns: [string, boolean][] = [
    ['code', row.code === credentialSubject.code],
    ['valid_from', toInstant(row.valid_from) === validFrom],
    ['valid_until', toInstant(row.valid_until) === validUntil],
  ];
  for (const [column, agrees] of columns) {
    found.expect(agrees, `warranties.${column}`, which, 'is not what the credential says');
  }
}

function checkPaper(row: PaperRow, found: Differences): void {
  const which = `leaf ${row.leaf_index}`;
  found.seen('papers');
  if (row.id === null) return found.add('papers.leaf_index', which, 'no paper has this leaf');
  const shown = shownOf<PaperShown>('paper', row.shown);
  const same = shown?.length === row.length && shown.sha256 === toHex(row.sha256);
  found.expect(same, 'papers.length or sha256', which, 'is not what was sealed');
}

/** Holds warranties and papers against their leaves. */
export async function checkWarranties(found: Differences): Promise<void> {
  for (const row of await select<WarrantyRow>(WARRANTIES)) checkWarranty(row, found);
  for (const row of await select<PaperRow>(PAPERS)) checkPaper(row, found);
}
