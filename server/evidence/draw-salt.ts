import { randomBytes } from 'node:crypto';

/** A salt: 32 random bytes, used for one thing only and never derived. */
export function drawSalt(): Buffer {
  return randomBytes(32);
}
