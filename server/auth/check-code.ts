import { timingSafeEqual } from 'node:crypto';
import { Invalid } from '#domain/errors.ts';
import { SignInCode } from '../db/models/sign-in-code.ts';
import { transaction } from '../db/sql.ts';
import { countTry } from './code-limits.ts';
import { codeHmac } from './code-hmac.ts';
import { hashToken } from './token.ts';

/** Tries a code allows. */
export const MOST_TRIES = 5;

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
    const asked = await SignInCode.findOne({
      where: { browserHash: hashToken(token) },
      lock: true,
      transaction: tx,
    });
    if (asked === null || asked.usedAt !== null || asked.expiresAt <= now) return over(RUN_OUT);
    if (asked.tries >= MOST_TRIES) return over(TRIED_OUT);
    const right = timingSafeEqual(asked.codeHmac, codeHmac(asked.id, code));
    // Nobody's address has a row too, and its code is never right.
    if (!right || asked.customerId === null) {
      await asked.update({ tries: asked.tries + 1 }, { transaction: tx });
      return asked.tries >= MOST_TRIES ? over(TRIED_OUT) : wrong(WRONG);
    }
    await asked.update({ usedAt: now }, { transaction: tx });
    return asked.customerId;
  });
  if (typeof outcome !== 'string') throw outcome;
  return outcome;
}
