import type { Readable } from 'node:stream';
import { NotFound, Unavailable } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { formatCode } from '#evidence/code/format-code.ts';
import { select } from '#server/db/sql.ts';
import { getStream } from '#server/storage/objects.ts';
import { ownerScope } from './owner-scope.ts';

/** A paper that was handed out. */
export interface Paper {
  length: number;
  /** 64 hex. */
  sha256: string;
  fileName: string;
  /** Opens the file, whole. @throws Unavailable while the store is silent */
  open(): Promise<Readable>;
}

interface Row {
  object_key: string;
  length: number;
  sha256: Buffer;
  code: string;
}

/**
 * Finds a paper by id for the shop's people and the instrument's owner. One that is not handed out yet
 * does not exist for anybody.
 * @throws NotFound for an unknown paper and for one of another's
 */
export async function readPaper(viewer: Viewer, { paperId }: { paperId: string }): Promise<Paper> {
  demand(viewer, 'see cases', { own: true });
  const scope = ownerScope(viewer);
  const [row] = await select<Row>(
    `SELECT p.object_key, p.length, p.sha256, w.code
     FROM papers p JOIN warranties w ON w.id = p.warranty_id
     WHERE p.id = :paperId AND p.leaf_index IS NOT NULL AND w.step = 'issued' AND ${scope.sql}`,
    { ...scope.params, paperId },
  );
  if (!row) throw new NotFound();
  return {
    length: row.length,
    sha256: row.sha256.toString('hex'),
    fileName: `${formatCode(row.code)}.pdf`,
    open: async () => {
      const stream = await getStream(row.object_key);
      if (!stream) throw new Unavailable('store');
      return stream;
    },
  };
}
