import { timingSafeEqual } from 'node:crypto';
import { Invalid } from '#domain/errors.ts';
import { run, select, transaction } from '../db/sql.ts';
import { countTry } from './code-limits.ts';
import { codeHmac } from './code-hmac.ts';
import { hashToken } from './token.ts';

/** Tries a code allows. */
export const MOST_TRIES = 5;

interface Row {
  id: string;
  customer_id: string | null;
  code_hmac: Buffer;
  tries: number;
  expires_at: Date;
  used_at: Date | null;
}

const RUN_OUT = 'This code has run out. Send a new one.';
const TRIED_OUT = 'This code was typed wrong five times and works no more. Send a new one.';
const NOT_SIX = 'The code has six digits. Type all six, as they stand in the mail.';
const WRONG = 'This code is not right. Check the digits in the newest mail.';

const wrong = (sentence: string) => new Invalid({ code: sentence });
const over = (sentence: string) => new Invalid({ code: sentence }, sentence, 'code-over');

/**
 * Checks a typed code for the browser that holds `token`; a code works once. Returns the customer's
 * id. Throws TooMany, and Invalid with field `code`: its code is `code-over` when only a new one helps.
 */
export async function checkCode(
  { token, code: typed, ip }: { token: string; code: string; ip: string },
  { now = new Date() } = {},
): Promise<string> {
  const code = typed.replace(/\s/g, '');
  if (!/^\d{6}$/.test(code)) throw wrong(NOT_SIX);
  await countTry(ip);
  // The outcome is returned, not thrown, so that the try is counted whatever it was.
  const outcome = await transaction(async (tx) => {
    const [row] = await select<Row>(
      `SELECT id, customer_id, code_hmac, tries, expires_at, used_at
       FROM sign_in_codes WHERE browser_hash = ? FOR UPDATE`,
      [hashToken(token)],
      tx,
    );
    if (row === undefined || row.used_at !== null || row.expires_at <= now) return over(RUN_OUT);
    if (row.tries >= MOST_TRIES) return over(TRIED_OUT);
    const right = timingSafeEqual(row.code_hmac, codeHmac(row.id, code));
    // Nobody's address has a row too, and its code is never right.
    if (!right || row.customer_id === null) {
      await run('UPDATE sign_in_codes SET tries = tries + 1 WHERE id = ?', [row.id], tx);
      return row.tries + 1 >= MOST_TRIES ? over(TRIED_OUT) : wrong(WRONG);
    }
    await run('UPDATE sign_in_codes SET used_at = ? WHERE id = ?', [now, row.id], tx);
    return row.customer_id;
  });
  if (typeof outcome !== 'string') throw outcome;
  return outcome;
}
