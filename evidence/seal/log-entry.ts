import { concat } from '#evidence/bytes/concat.ts';
import { EncodingError } from '#evidence/errors.ts';
import { unknownForm } from '#evidence/shape/read-shape.ts';

/** First byte, slot tag, the header's commitment. */
const ENTRY_BYTES = 65;
const FIRST_BYTE = 2;

/**
 * The log entry itself, 02 ‖ T ‖ C: all the log ever holds, and safe to publish.
 * @param tag T, 32 bytes
 * @param commitment C, 32 bytes
 * @throws EncodingError when either is not 32 bytes
 */
export function logEntry(tag: Uint8Array, commitment: Uint8Array): Uint8Array {
  if (tag.length !== 32 || commitment.length !== 32) {
    throw new EncodingError('A log entry joins two values of 32 bytes.');
  }
  return concat(Uint8Array.of(FIRST_BYTE), tag, commitment);
}

/** Whether an entry has the length and first byte this program knows. */
export function isKnownEntry(entry: Uint8Array): boolean {
  return entry.length === ENTRY_BYTES && entry[0] === FIRST_BYTE;
}

/**
 * Takes a log entry apart.
 * @throws UnknownFormError for another length or first byte
 */
export function readLogEntry(entry: Uint8Array): { tag: Uint8Array; commitment: Uint8Array } {
  if (!isKnownEntry(entry)) throw unknownForm('A log entry of this length or first byte');
  return { tag: entry.slice(1, 33), commitment: entry.slice(33) };
}
