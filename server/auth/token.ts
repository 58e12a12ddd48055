import { createHash, randomBytes } from 'node:crypto';

/** A random token of 256 bits that only a browser's cookie or a mail's link will hold. */
export function newToken(): string {
  return randomBytes(32).toString('base64url');
}

/** SHA-256 of a token: what the database keeps, so that its copy opens nothing. */
export function hashToken(token: string): Buffer {
  return createHash('sha256').update(token).digest();
}
