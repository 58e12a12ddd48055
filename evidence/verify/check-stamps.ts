import { fromBase64 } from '#evidence/bytes/base64.ts';
import { toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { attempt, itemsOf, placeOf, type Work } from '#evidence/verify/work.ts';

/**
 * What can be said of time-stamps without reading them: each stands once, by size, and is the very
 * reply that entries name. The replies themselves are not read here yet, so a record that has any
 * is never Intact; one that has none gets a line that says so.
 */
export function checkStamps(work: Work): void {
  const { bundle, checkpoints, findings } = work;
  const stamps = new Map<string, { size: number; root: string }>();
  let last = 0;
  for (const { checkpoint, reply } of bundle.stamps) {
    const head = checkpoints.get(checkpoint);
    const hash = attempt(findings, 'stamps', {}, () => toHex(sha256(fromBase64(reply))));
    if (!head || hash === undefined) continue;
    if (head.size <= last) findings.failed('stamps', { because: 'out of order' });
    last = head.size;
    stamps.set(hash, { size: head.size, root: toHex(head.root) });
  }
  for (const item of itemsOf(work)) {
    const after = item.header?.after;
    if (!after) continue;
    const stamp = stamps.get(after.stamp);
    if (!stamp) {
      findings.notChecked('stamps', { ...placeOf(item), because: 'its time-stamp is missing' });
    } else if (stamp.size !== after.size || stamp.root !== after.root) {
      findings.failed('stamps', {
        ...placeOf(item),
        because: 'its time-stamp is over another head',
      });
    }
  }
  const count = bundle.stamps.length;
  if (count > 0) findings.notChecked('stamps', { count, because: 'not read here yet' });
  else findings.line('stamps', 'shop-word', { count });
}
