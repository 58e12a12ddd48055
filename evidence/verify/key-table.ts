import { fromBase64 } from '#evidence/bytes/base64.ts';
import type { KeyShown, KeyUse, LogStartShown } from '#evidence/chain/log-shown.ts';
import { KeyError } from '#evidence/errors.ts';
import { checkKeyLeaf } from '#evidence/key/check-key-leaf.ts';
import { ed25519FromSpki } from '#evidence/key/ed25519-spki.ts';
import type { Findings } from '#evidence/verify/finding.ts';
import { attempt, placeOf, shownOf, type Item } from '#evidence/verify/work.ts';

/** A key of the log and the span of log indices in which its signatures count. */
export type LogKey = {
  id: string;
  use: KeyUse;
  vkey: string | null;
  spki: Uint8Array;
  /** The item of its `add` leaf. */
  leaf: Item;
  retired: number | null;
  revoked: number | null;
};

/** Whether a signature at an index counts; `stamp` when only an older time-stamp could say so. */
export type Counts = 'yes' | 'no' | 'stamp';

/** The keys of a log, in the order they were added. */
export class KeyTable {
  constructor(readonly keys: readonly LogKey[]) {}

  /** The key of that id and use, or undefined. */
  find(use: KeyUse, id: string): LogKey | undefined {
    return this.keys.find((key) => key.use === use && key.id === id);
  }

  /** The log key a note names by its vkey, or undefined. */
  byVkey(vkey: string): LogKey | undefined {
    return this.keys.find((key) => key.use === 'log' && key.vkey === vkey);
  }

  /** For reading a JWS: the public key of a credential key. */
  readonly credentialKey = (id: string): Uint8Array | null => {
    const key = this.find('credential', id);
    return key ? ed25519FromSpki(key.spki) : null;
  };
}

/**
 * Whether a signature that stands at a log index counts: from the key's add to its retire. After
 * a revoke it counts only if a time-stamp covers a size above the index and up to the revoke.
 * @param stamped sizes that have a time-stamp
 */
export function counts(key: LogKey, index: number, stamped: readonly number[]): Counts {
  if (index < key.leaf.index || (key.retired !== null && index >= key.retired)) return 'no';
  const { revoked } = key;
  if (revoked === null) return 'yes';
  return stamped.some((size) => index < size && size <= revoked) ? 'stamp' : 'no';
}

/**
 * Reads the key leaves of the log's own chain, each held against itself and against what went
 * before, and the first leaves against the bundle's vkeys.
 */
export function readKeys(
  own: Item[],
  log: { origin: string; vkeys: string[] },
  findings: Findings,
): KeyTable {
  const keys: LogKey[] = [];
  for (const leaf of own) {
    const shown = shownOf<KeyShown>(leaf, 'key');
    if (shown) attempt(findings, 'keys', placeOf(leaf), () => apply(keys, leaf, shown, log.origin));
  }
  attempt(findings, 'keys', {}, () => checkStart(own, keys, log));
  if (!findings.anyFailed('keys')) findings.checked('keys', { count: keys.length });
  return new KeyTable(keys);
}

function apply(keys: LogKey[], leaf: Item, shown: KeyShown, origin: string): void {
  checkKeyLeaf(shown, origin);
  const { id, use, act, vkey } = shown;
  const known = keys.find((key) => key.id === id);
  if (act === 'add') {
    if (known) throw new KeyError('A key is added twice.');
    const spki = fromBase64(shown.spki);
    keys.push({ id, use, vkey, spki, leaf, retired: null, revoked: null });
    return;
  }
  const added = known && shownOf<KeyShown>(known.leaf, 'key');
  const same = (['use', 'alg', 'spki', 'vkey', 'cert'] as const).every(
    (member) => added?.[member] === shown[member],
  );
  if (!known || !same) throw new KeyError('A key is ended in other words than it was added.');
  if (act === 'retire') known.retired ??= leaf.index;
  else known.revoked ??= leaf.index;
}

function checkStart(
  own: Item[],
  keys: LogKey[],
  { origin, vkeys }: { origin: string; vkeys: string[] },
): void {
  const [start, first] = own;
  const shown = start && shownOf<LogStartShown>(start, 'log-start');
  const logKeys = keys.filter(({ use }) => use === 'log').map(({ vkey }) => vkey);
  if (start?.index !== 0) throw new KeyError('The log’s first entry is missing.');
  // A start that is lost or of a form not known here was reported; nothing follows from it.
  if (!shown) return;
  if (shown.origin !== origin) throw new KeyError('The log started under another name.');
  if (first?.index !== 1 || keys[0]?.leaf !== first || keys[0].vkey !== shown.vkey) {
    throw new KeyError('The log’s second entry is not the key it started with.');
  }
  if (logKeys.join('\n') !== vkeys.join('\n')) {
    throw new KeyError('The record lists other keys than its log does.');
  }
}
