import { toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import type { PaperShown } from '#evidence/chain/case-shown.ts';
import type { RecordShown } from '#evidence/verify/read-record.ts';

/**
 * What a paper's file is to a record: the very file that was handed out; that file with something
 * added behind it; another file; or not to be told, because the record names no paper.
 */
export type PaperMatch = 'this-file' | 'added-to' | 'other-file' | 'no-paper-named';

/**
 * Holds a paper's file against the `paper` entries of a checked record. Nothing that stands on its
 * pages is looked at, nor what a PDF reader would say of it.
 * @param file the exact bytes
 */
export function comparePaper(file: Uint8Array, record: RecordShown): PaperMatch {
  const papers = record.entries.flatMap(({ header, parts }) =>
    header?.kind === 'paper' && parts.shown ? [parts.shown as PaperShown] : [],
  );
  if (papers.length === 0) return 'no-paper-named';
  const is = (bytes: Uint8Array, paper: PaperShown) =>
    bytes.length === paper.length && toHex(sha256(bytes)) === paper.sha256;
  if (papers.some((paper) => is(file, paper))) return 'this-file';
  const added = papers.some((paper) => is(file.subarray(0, paper.length), paper));
  return added ? 'added-to' : 'other-file';
}
