import { fromUtf8 } from '#evidence/bytes/utf8.ts';
import { select } from '#server/db/sql.ts';

/** A published head of the log. */
export interface PublishedHead {
  size: number;
  /** 32 bytes. */
  root: Buffer;
  /** The signed note, exactly as it was signed. */
  note: string;
  madeAt: Date;
}

/** The newest head that was signed, stored and published; null before the first. */
export async function newestHead(): Promise<PublishedHead | null> {
  const [row] = await select<{ size: string; root: Buffer; note: Buffer; made_at: Date }>(
    `SELECT size, root, note, made_at FROM log_heads
     WHERE published_at IS NOT NULL ORDER BY size DESC LIMIT 1`,
  );
  return row
    ? { size: Number(row.size), root: row.root, note: fromUtf8(row.note), madeAt: row.made_at }
    : null;
}

/** The newest checkpoint as its signed note, for mails and pages; null before the first. */
export async function newestCheckpoint(): Promise<string | null> {
  return (await newestHead())?.note ?? null;
}
