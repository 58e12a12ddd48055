import type { KeyShown, LostShown } from '#evidence/chain/log-shown.ts';
import { placeOf, shownOf, type Item, type Work } from '#evidence/verify/work.ts';

/**
 * Both chains: no gap, each header names the one before it, the log index rises, the log's own
 * chain is whole and open, all proofs are under the head, lost entries are said to be lost.
 */
export function checkChains(work: Work): void {
  const { own, chain, findings, bundle, head } = work;
  if (own[0]?.seq !== 0) findings.failed('own-chain', { because: 'its first entry is missing' });
  checkLinks(work, own, 'own-chain');
  checkLinks(work, chain, 'case-chain');
  checkFirst(work);
  for (const item of own) {
    if (item.entry && !('shown' in item.entry.parts)) {
      findings.failed('own-chain', { ...placeOf(item), because: 'it is not open' });
    }
  }
  for (const item of [...own, ...chain]) {
    if (item.entry === null) checkLost(work, item);
    const { size } = work.checkpoints.get(item.under)!;
    if (size !== head.size && !mayBeHandOver(item)) {
      findings.failed('inclusion', { ...placeOf(item), because: 'not under the head' });
    }
  }
  const whole = own.length + chain.length === bundle.entries.length;
  if (whole && !findings.anyFailed('own-chain')) {
    findings.checked('own-chain', { count: own.length });
  }
  if (whole && chain.length > 0 && !findings.anyFailed('case-chain')) {
    findings.checked('case-chain', { first: chain[0]!.seq, last: chain.at(-1)!.seq });
  }
}

function checkLinks({ findings }: Work, items: Item[], id: 'own-chain' | 'case-chain'): void {
  items.forEach((item, at) => {
    const before = items[at - 1];
    if (!before) return;
    const known = item.header !== null && before.commitment !== null;
    const links = !known || item.header?.prev === before.commitment;
    if (item.seq !== before.seq + 1 || !links) {
      findings.failed(id, { ...placeOf(item), because: 'it does not follow the one before it' });
    } else if (item.index <= before.index) {
      findings.failed(id, { ...placeOf(item), because: 'it stands before the one before it' });
    }
  });
}

/** A case begins at its first entry; a warranty's record may begin at the close it names. */
function checkFirst({ chain, findings }: Work): void {
  const first = chain[0];
  if (!first) findings.failed('case-chain', { because: 'it holds no case' });
  if (!first || first.seq === 0 || first.header === null) return;
  const named = chain.some(
    ({ header }) => header?.kind === 'warranty' && header.names[0] === first.commitment,
  );
  if (first.header.kind !== 'close' || !named) {
    findings.failed('case-chain', { ...placeOf(first), because: 'entries before it are missing' });
  }
}

function checkLost({ own, findings }: Work, item: Item): void {
  const said = own.some((leaf) => {
    const lost = shownOf<LostShown>(leaf, 'lost');
    return lost && lost.from <= item.index && item.index <= lost.to;
  });
  if (said) findings.notChecked('lost', placeOf(item));
  else findings.failed('lost', placeOf(item));
}

/** A later log key's leaf may stand under a checkpoint that the key before it signed. */
function mayBeHandOver(item: Item): boolean {
  const key = shownOf<KeyShown>(item, 'key');
  return key?.use === 'log' && key.act === 'add' && item.index > 1;
}
