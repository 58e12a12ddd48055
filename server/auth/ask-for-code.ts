import { randomInt } from 'node:crypto';
import { v7 } from 'uuid';
import { Invalid } from '#domain/errors.ts';
import { SignInCode } from '../db/models/sign-in-code.ts';
import { select, transaction } from '../db/sql.ts';
import { MailAddressSchema } from '../mail/address.ts';
import { queueMail } from '../mail/queue-mail.ts';
import { countAsking } from './code-limits.ts';
import { codeHmac } from './code-hmac.ts';
import { hashToken, newToken } from './token.ts';

/** A code works this long. */
export const CODE_MS = 10 * 60 * 1000;

interface Known {
  id: string;
  email: string;
}

// The collation takes é for e and A for a; only the very address counts, in any case of letters.
async function findCustomer(email: string): Promise<Known | undefined> {
  const rows = await select<Known>(
    'SELECT id, email FROM customers WHERE email = ? AND erased_at IS NULL ORDER BY created_at, id',
    [email],
  );
  return rows.find((row) => row.email.toLowerCase() === email);
}

/**
 * Mails a six-digit code to a customer's address. An address that is nobody's gets the same rows,
 * the same statements and the same answer, and no mail.
 * Returns the token that binds the code to the browser that asked. Throws Invalid and TooMany.
 */
export async function askForCode(
  { email: typed, ip }: { email: string; ip: string },
  { now = new Date() } = {},
): Promise<{ token: string; email: string }> {
  const parsed = MailAddressSchema.safeParse(typed);
  if (!parsed.success) throw new Invalid({ email: parsed.error.issues[0]?.message ?? '' });
  const email = parsed.data.toLowerCase();
  await countAsking(email, ip);

  const id = v7();
  const token = newToken();
  const code = String(randomInt(1_000_000)).padStart(6, '0');
  const expiresAt = new Date(now.getTime() + CODE_MS);
  const customer = await findCustomer(email);
  await transaction(async (tx) => {
    await SignInCode.create(
      {
        id,
        customerId: customer?.id ?? null,
        browserHash: hashToken(token),
        codeHmac: codeHmac(id, code),
        createdAt: now,
        expiresAt,
      },
      { transaction: tx },
    );
    const mail = { template: 'sign-in-code', data: { code } } as const;
    await queueMail(tx, { ...mail, to: customer?.email ?? null, notAfter: expiresAt }, { now });
  });
  return { token, email };
}
