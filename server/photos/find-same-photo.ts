import { Conflict } from '#domain/errors.ts';
import { select, type Transaction } from '#server/db/sql.ts';

/** A photo as its sender gets to know it. */
export interface KnownPhoto {
  id: string;
  /** Within the case, from 1. */
  number: number;
  /** Of the original, in hex. */
  sha256: string;
}

interface Row {
  id: string;
  caseId: string;
  number: number;
  sha256: Buffer;
}

/**
 * The photo of this case that is the same file, under the same id or another.
 * Throws Conflict when the id is another file's.
 */
export async function findSamePhoto(
  { caseId, photoId, sha256 }: { caseId: string; photoId: string; sha256: string },
  tx?: Transaction,
): Promise<KnownPhoto | null> {
  const rows = await select<Row>(
    `SELECT id, case_id AS caseId, number, sha256 FROM photos
     WHERE id = :photoId OR (case_id = :caseId AND sha256 = :hash)`,
    { caseId, photoId, hash: Buffer.from(sha256, 'hex') },
    tx,
  );
  const same = rows.find((row) => row.caseId === caseId && row.sha256.toString('hex') === sha256);
  if (same !== undefined) return { id: same.id, number: same.number, sha256 };
  if (rows.length > 0) {
    throw new Conflict('Another photo was sent under this address. Choose the photo again.');
  }
  return null;
}
