import { fromBase64, toBase64 } from '#evidence/bytes/base64.ts';
import { ProofError } from '#evidence/errors.ts';
import { PROOF_HASHES } from '#evidence/limits.ts';

/** Hashes as base64, one to a line. */
export function hashLines(hashes: readonly Uint8Array[]): string {
  return hashes.map((hash) => `${toBase64(hash)}\n`).join('');
}

/**
 * Reads the head of a proof text: a first line, then hashes up to an empty line, then a checkpoint.
 * @param label what the last word before the hashes is called, `index` or `old`
 * @throws ProofError when the text is not so, or has more hashes than any tree needs
 */
export function readProofText(
  text: string,
  label: 'index' | 'old',
): { number: number; hashes: Uint8Array[]; checkpoint: string } {
  const gap = text.indexOf('\n\n');
  const [first = '', ...lines] = text.slice(0, gap).split('\n');
  const match = new RegExp(`^${label} (0|[1-9]\\d{0,15})$`).exec(first);
  const number = Number(match?.[1]);
  if (gap < 0 || !match || !Number.isSafeInteger(number) || lines.length > PROOF_HASHES) {
    throw new ProofError('This is not the text of a proof.');
  }
  return { number, hashes: lines.map(readHash), checkpoint: text.slice(gap + 2) };
}

function readHash(line: string): Uint8Array {
  try {
    const hash = fromBase64(line);
    if (hash.length === 32) return hash;
  } catch {
    // Said below, in one way for all.
  }
  throw new ProofError('This proof has a line that is not a hash.');
}
