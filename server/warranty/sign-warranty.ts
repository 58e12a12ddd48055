import { randomUUID } from 'node:crypto';
import { toInstant } from '#evidence/bytes/instant.ts';
import { credentialPayload } from '#evidence/credential/credential-payload.ts';
import { signCredential } from '#evidence/credential/sign-credential.ts';
import { run } from '#server/db/sql.ts';
import { readLogState } from '#server/evidence/log-state.ts';
import { signingKey } from '#server/evidence/signing-key.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { subjectOf } from './subject.ts';
import type { Warranty } from './warranty.ts';

/** First step: the credential, signed and kept. */
export async function signWarranty(warranty: Warranty): Promise<void> {
  const payload = credentialPayload({
    id: randomUUID(),
    origin: (await readLogState()).origin,
    issuerName: (await readShop()).name,
    validFrom: toInstant(warranty.validFrom),
    validUntil: toInstant(warranty.validUntil),
    ...(await subjectOf(warranty)),
    code: warranty.code,
  });
  const jws = signCredential(payload, await signingKey('credential'));
  await run("UPDATE warranties SET jws = ?, step = 'credential' WHERE id = ? AND step = 'drawn'", [
    jws,
    warranty.id,
  ]);
}
