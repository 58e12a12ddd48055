import { ALPHABET, CHECK_ONLY, checkSign, DATA_SIGNS } from '#evidence/code/crockford.ts';
import { EncodingError } from '#evidence/errors.ts';

/**
 * The code of 50 bits, or null when its check sign would be one of *~$=U: nobody reads those aloud
 * or finds them on a phone, so another code is drawn.
 * @param random 7 bytes, of which the first 50 bits count
 * @throws EncodingError for another length
 */
export function codeOfBits(random: Uint8Array): string | null {
  if (random.length !== 7) throw new EncodingError('A code is made of 7 random bytes.');
  let bits = random.reduce((sum, byte) => sum * 256n + BigInt(byte), 0n) >> 6n;
  let data = '';
  for (let sign = 0; sign < DATA_SIGNS; sign += 1) {
    data = ALPHABET[Number(bits % 32n)]! + data;
    bits /= 32n;
  }
  const check = checkSign(data);
  return CHECK_ONLY.includes(check) ? null : data + check;
}

/**
 * Draws a warranty code of 50 random bits: eleven signs without a hyphen.
 * @param random gives that many random bytes each time it is asked
 */
export function drawCode(random: (bytes: number) => Uint8Array): string {
  for (;;) {
    const code = codeOfBits(random(7));
    if (code !== null) return code;
  }
}
