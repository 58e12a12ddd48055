import { randomBytes, randomInt } from 'node:crypto';

/** The 16 random bytes by which the witness log knows a case. Zeros stand for the log's own chain. */
export function drawRecord(random: (size: number) => Buffer = randomBytes): Buffer {
  const record = random(16);
  return record.some((byte) => byte !== 0) ? record : drawRecord(random);
}

// Crockford's base 32: no letters that look like figures when they are typed from a tag.
const SIGNS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';

/** The code on a printed tag: 16 signs, 80 random bits. It says nothing about the case. */
export function drawTagCode(): string {
  return Array.from({ length: 16 }, () => SIGNS[randomInt(32)]).join('');
}
