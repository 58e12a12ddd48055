import { ProofError } from '#evidence/errors.ts';

/**
 * Log entries one after another, each behind its length as two bytes, big end first (C2SP
 * tlog-tiles, "Log entries").
 * @throws ProofError for an entry longer than two bytes can say
 */
export function writeEntryBundle(entries: readonly Uint8Array[]): Uint8Array {
  const bundle = new Uint8Array(entries.reduce((length, entry) => length + 2 + entry.length, 0));
  const view = new DataView(bundle.buffer);
  let at = 0;
  for (const entry of entries) {
    if (entry.length > 0xffff) throw new ProofError('A log entry is at most 65,535 bytes long.');
    view.setUint16(at, entry.length);
    bundle.set(entry, at + 2);
    at += 2 + entry.length;
  }
  return bundle;
}

/**
 * Takes an entry bundle, or several joined, apart.
 * @throws ProofError when it ends in the middle of an entry
 */
export function readEntryBundle(bytes: Uint8Array): Uint8Array[] {
  const entries: Uint8Array[] = [];
  let at = 0;
  while (at < bytes.length) {
    const end = at + 2 + bytes[at]! * 256 + (bytes[at + 1] ?? 0);
    if (at + 2 > bytes.length || end > bytes.length) {
      throw new ProofError('These public entries end in the middle of one.');
    }
    entries.push(bytes.slice(at + 2, end));
    at = end;
  }
  return entries;
}
