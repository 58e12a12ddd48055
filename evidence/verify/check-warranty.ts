import { toHex } from '#evidence/bytes/hex.ts';
import type { WarrantyShown } from '#evidence/chain/case-shown.ts';
import { credentialHash } from '#evidence/credential/credential-hash.ts';
import type { Credential } from '#evidence/credential/credential-shape.ts';
import { readCredential } from '#evidence/credential/read-credential.ts';
import { ShapeError, SignatureError } from '#evidence/errors.ts';
import { uuidOfOrigin } from '#evidence/log/origin.ts';
import { counts } from '#evidence/verify/key-table.ts';
import { stampedSizes } from '#evidence/verify/check-signers.ts';
import { attempt, shownOf, type Item, type Work } from '#evidence/verify/work.ts';

/** A warranty that was checked: its leaf and what its credential says. */
export type Warranty = { leaf: Item; credential: Credential };

/**
 * The credential against the log: its leaf holds its hash, its key counts where that leaf stands,
 * its issuer is this log.
 * @returns null when the bundle has no credential, or it could not be placed
 */
export function checkWarranty(work: Work): Warranty | null {
  const { bundle, findings, chain } = work;
  const jws = bundle.credential;
  if (jws === null) {
    const needed = chain[0] !== undefined && chain[0].seq > 0;
    if (needed) findings.notChecked('warranty', { because: 'the credential is missing' });
    return null;
  }
  return (
    attempt(findings, 'warranty', {}, () => {
      const hash = toHex(credentialHash(jws));
      const leaf = chain.find((item) => shownOf<WarrantyShown>(item, 'warranty')?.jws === hash);
      const closed = chain.some((item) => mayBeWarranty(item));
      if (!leaf && closed) {
        findings.notChecked('warranty', { because: 'the entry that holds it is not open' });
        return null;
      }
      if (!leaf) throw new ShapeError('No entry of the record holds this credential.');
      const [first] = chain;
      if (first!.seq > 0 && first!.commitment !== leaf.header!.names[0]) {
        throw new ShapeError('The record does not begin at the close its warranty names.');
      }
      return { leaf, credential: checkCredential(work, jws, leaf) };
    }) ?? null
  );
}

/** Whether an item could hold a credential without showing it. */
function mayBeWarranty({ header, parts }: Item): boolean {
  return header === null || (header.kind === 'warranty' && !parts.has('shown'));
}

function checkCredential(work: Work, jws: string, leaf: Item): Credential {
  const { findings, keys, bundle } = work;
  const { payload, kid, unknownMembers } = readCredential(jws, keys.credentialKey);
  const answer = counts(keys.find('credential', kid)!, leaf.index, stampedSizes(work));
  if (answer === 'no') throw new SignatureError('Its key does not count where its entry stands.');
  if (answer === 'stamp') {
    findings.notChecked('warranty', { because: 'its key was revoked later' });
  }
  if (payload.issuer.id !== `urn:uuid:${uuidOfOrigin(bundle.origin)}`) {
    throw new ShapeError('Its issuer is not this log.', 'issuer.id');
  }
  for (const member of unknownMembers) findings.notChecked('unknown-member', { member });
  findings.checked('warranty', {
    seal: toHex(leaf.leafHash),
    code: payload.credentialSubject.code,
  });
  return payload;
}
