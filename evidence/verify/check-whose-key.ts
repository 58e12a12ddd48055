import { equal } from '#evidence/bytes/equal.ts';
import { toHex } from '#evidence/bytes/hex.ts';
import { countingSigners } from '#evidence/verify/check-signers.ts';
import type { Warranty } from '#evidence/verify/check-warranty.ts';
import type { LogKey } from '#evidence/verify/key-table.ts';
import type { Work } from '#evidence/verify/work.ts';

/**
 * By whose key: a log key id from outside the record must be, or lead on to, the key that signed
 * the head. Without one everything may agree and still be anybody's.
 */
export function checkWhoseKey(work: Work): void {
  const { findings, keys, head, outside } = work;
  const signer = countingSigners(work, head)[0]?.key.id ?? null;
  const { logKeyId, logKeyFrom = null, address = null } = outside;
  if (logKeyId === undefined) {
    findings.notChecked('whose-key', { key: signer, because: 'no key from outside' });
    return;
  }
  const known = keys.find('log', logKeyId);
  if (!known) {
    findings.failed('whose-key', { key: logKeyId, because: 'no log key of this record' });
    return;
  }
  const trusted = leadOn(work, known);
  if (countingSigners(work, head).some(({ key }) => trusted.has(key))) {
    findings.checked('whose-key', { key: logKeyId, from: logKeyFrom, address });
  } else {
    findings.notChecked('whose-key', { key: signer, because: 'nothing leads to it' });
  }
}

/** The keys a key vouches for: those added under a checkpoint that it, or one of them, signed. */
function leadOn(work: Work, first: LogKey): Set<LogKey> {
  const trusted = new Set([first]);
  for (const key of work.keys.keys) {
    const under = work.checkpoints.get(key.leaf.under);
    if (key.use !== 'log' || !under) continue;
    if (countingSigners(work, under).some((signer) => trusted.has(signer.key))) trusted.add(key);
  }
  return trusted;
}

/** What else was read from a paper: the first half of its seal value, and its code. */
export function checkPaper({ findings, outside }: Work, warranty: Warranty | null): void {
  if (outside.seal16) {
    const seal = warranty?.leaf.leafHash;
    if (!seal) findings.notChecked('paper-seal');
    else if (equal(seal.subarray(0, 16), outside.seal16)) findings.checked('paper-seal');
    else findings.failed('paper-seal', { seal: toHex(seal) });
  }
  if (outside.code !== undefined) {
    const code = warranty?.credential.credentialSubject.code;
    if (code === undefined) findings.notChecked('code');
    else if (code === outside.code) findings.checked('code', { code });
    else findings.failed('code', { code });
  }
}
