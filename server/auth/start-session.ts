import { recordAct } from '../audit/record-act.ts';
import { Session } from '../db/models/session.ts';
import { transaction } from '../db/sql.ts';
import { sessionCookie } from './cookies.ts';
import { CUSTOMER_MS, STAFF_IDLE_MS } from './session-length.ts';
import { hashToken, newToken } from './token.ts';

/** Whom a session is for. `freshAt`: when a person of the shop last showed who they are. */
export type Holder = { personId: string; freshAt: Date } | { customerId: string };

/**
 * Starts a session under a new id and ends the one the request came with, so that an id known from
 * before the sign-in is worth nothing. Returns the Set-Cookie value.
 */
export async function startSession(
  request: Request,
  holder: Holder,
  { now = new Date() } = {},
): Promise<string> {
  const cookie = sessionCookie();
  const before: unknown = await cookie.parse(request.headers.get('Cookie'));
  const id = newToken();
  const staff = 'personId' in holder;
  await transaction(async (tx) => {
    if (typeof before === 'string') {
      await Session.destroy({ where: { idHash: hashToken(before) }, transaction: tx });
    }
    await Session.create(
      {
        idHash: hashToken(id),
        personId: staff ? holder.personId : null,
        customerId: staff ? null : holder.customerId,
        createdAt: now,
        freshAt: staff ? holder.freshAt : now,
        seenAt: now,
        expiresAt: new Date(now.getTime() + (staff ? STAFF_IDLE_MS : CUSTOMER_MS)),
      },
      { transaction: tx },
    );
    const actor = staff
      ? ({ kind: 'staff', personId: holder.personId } as const)
      : ({ kind: 'customer', customerId: holder.customerId } as const);
    await recordAct(tx, actor, { act: 'signed in' }, { now });
  });
  return cookie.serialize(id);
}
