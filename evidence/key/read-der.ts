import { KeyError } from '#evidence/errors.ts';

/** One DER element: its tag, its content, and the bytes of the whole. */
export type DerElement = { tag: number; content: Uint8Array; whole: Uint8Array };

/**
 * Takes DER bytes (X.690 §10) apart into the elements that follow one another.
 * @throws KeyError where a length is not in its shortest form or runs past the end
 */
export function readDer(bytes: Uint8Array): DerElement[] {
  const elements: DerElement[] = [];
  let at = 0;
  while (at < bytes.length) {
    const { length, start } = readLength(bytes, at + 1);
    const end = start + length;
    if (end > bytes.length) throw new KeyError('This DER ends in the middle of an element.');
    elements.push({
      tag: bytes[at]!,
      content: bytes.slice(start, end),
      whole: bytes.slice(at, end),
    });
    at = end;
  }
  return elements;
}

function readLength(bytes: Uint8Array, at: number): { length: number; start: number } {
  const first = bytes[at] ?? 0xff;
  if (first < 0x80) return { length: first, start: at + 1 };
  const start = at + 1 + (first & 0x7f);
  const digits = bytes.subarray(at + 1, start);
  const length = digits.reduce((number, digit) => number * 256 + digit, 0);
  const shortest = digits.length > 0 && digits[0] !== 0 && length >= 0x80;
  if (!shortest || digits.length > 4 || start > bytes.length) {
    throw new KeyError('This DER has a length that is not in its shortest form.');
  }
  return { length, start };
}
