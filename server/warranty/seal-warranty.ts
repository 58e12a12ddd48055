import { toHex } from '#evidence/bytes/hex.ts';
import { credentialHash } from '#evidence/credential/credential-hash.ts';
import { run, transaction } from '#server/db/sql.ts';
import { chainOf } from '#server/record/chain-of.ts';
import { lockCaseById } from '#server/record/lock-case.ts';
import { staffPart } from '#server/record/person-in-record.ts';
import { sealEvent } from '#server/record/seal-event.ts';
import { issuerOf } from './issuer-of.ts';
import type { Warranty } from './warranty.ts';

/** Second step: the leaf that holds the credential's hash. Its leaf hash is the seal value. */
export async function sealWarranty(
  { id, caseId, jws, issuedBy }: Warranty,
  now: Date,
): Promise<void> {
  if (jws === null) throw new Error('A warranty is signed before it is sealed.');
  await transaction(async (tx) => {
    const repair = await lockCaseById(tx, caseId);
    const close = (await chainOf(tx, repair.record)).findLast(
      ({ header }) => header.kind === 'close',
    );
    if (!close) throw new Error('A warranty is drawn from a closed case.');
    const by = await issuerOf(issuedBy, tx);
    const { leafIndex, leafHash } = await sealEvent(tx, {
      caseId,
      record: repair.record,
      kind: 'warranty',
      phase: 'after',
      shown: { v: 1, jws: toHex(credentialHash(jws)) },
      parts: staffPart(by),
      names: [close.commitment],
      by,
      now,
    });
    await run(
      "UPDATE warranties SET seal = ?, leaf_index = ?, step = 'sealed' WHERE id = ? AND step = 'credential'",
      [leafHash, leafIndex, id],
      tx,
    );
  });
}
