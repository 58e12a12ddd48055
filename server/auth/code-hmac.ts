import { createHmac } from 'node:crypto';
import { env } from '../env.ts';

/**
 * HMAC-SHA-256 of a six-digit code under CODE_PEPPER. A million codes are soon hashed by whoever
 * holds the table alone; without the pepper that gains nothing. `id` keeps equal codes apart.
 */
export function codeHmac(id: string, code: string): Buffer {
  return createHmac('sha256', env().CODE_PEPPER).update(`${id}:${code}`).digest();
}
