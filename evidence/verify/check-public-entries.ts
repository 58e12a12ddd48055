import { equal } from '#evidence/bytes/equal.ts';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { ENTRIES_PER_CASE } from '#evidence/limits.ts';
import { rootOfLeaves } from '#evidence/merkle/root-of-leaves.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { isKnownEntry, readLogEntry } from '#evidence/seal/log-entry.ts';
import { slotTag } from '#evidence/seal/slot-tag.ts';
import { readEntryBundle } from '#evidence/tiles/entry-bundle.ts';
import type { StandingReport } from '#evidence/verify/check-standing.ts';
import { attempt, placeOf, type Item, type Work } from '#evidence/verify/work.ts';

/**
 * Whether the record is all there is of its case. With the log's public entries in hand that is
 * checked here, slot by slot; without them it is the shop's word.
 */
export function checkLaterEntries(work: Work, standing: StandingReport): void {
  const { outside, findings, head, chain, own } = work;
  if (!outside.publicEntries) {
    findings.line('later-entries', 'shop-word', { size: head.size });
    return;
  }
  const slots = readSlots(work, outside.publicEntries);
  if (!slots) return;
  for (const items of [own, chain]) checkSlots(work, slots, items, standing);
  if (!findings.anyFailed('later-entries')) {
    findings.checked('later-entries', { size: head.size });
  }
}

/** Log indices by slot tag; `unknown` are those of entries whose form is not known here. */
type Slots = { byTag: Map<string, number[]>; unknown: Set<number> };

/** The slots of the public entries, once these have been held against the head's root. */
function readSlots(work: Work, bytes: Uint8Array): Slots | null {
  const { findings, head } = work;
  const entries = attempt(findings, 'later-entries', {}, () => readEntryBundle(bytes));
  if (!entries) return null;
  if (entries.length < head.size) {
    findings.notChecked('later-entries', { because: 'public entries are missing' });
    return null;
  }
  const logged = entries.slice(0, head.size);
  if (!equal(rootOfLeaves(logged.map(leafHash)), head.root)) {
    findings.failed('later-entries', { because: 'the public entries are not those of the head' });
    return null;
  }
  const slots: Slots = { byTag: new Map(), unknown: new Set() };
  for (const [index, entry] of logged.entries()) {
    if (isKnownEntry(entry)) {
      const tag = toHex(readLogEntry(entry).tag);
      slots.byTag.set(tag, [...(slots.byTag.get(tag) ?? []), index]);
    } else {
      slots.unknown.add(index);
      findings.notChecked('later-entries', { index, because: 'an entry of a form not known here' });
    }
  }
  return slots;
}

function checkSlots(
  { findings }: Work,
  slots: Slots,
  items: Item[],
  standing: StandingReport,
): void {
  const [first, last] = [items[0], items.at(-1)];
  if (!first || !last) return;
  const bySeq = new Map(items.map((item) => [item.seq, item]));
  const caseId = fromHex(first.case, 16);
  let later = 0;
  // A chain that hid an entry could leave numbers out after it, so every slot there is is looked up.
  for (let seq = 0; seq < last.seq + ENTRIES_PER_CASE; seq += 1) {
    const taken = slots.byTag.get(toHex(slotTag(caseId, seq))) ?? [];
    const data = { ...placeOf({ case: first.case, seq }) };
    const shown = bySeq.get(seq);
    if (taken.length > 1) {
      findings.failed('later-entries', { ...data, because: 'its slot is taken twice' });
    } else if (seq <= last.seq && taken.length === 0) {
      // It may be taken by an entry whose tag cannot be read, which was reported.
      if (slots.unknown.size > 0) continue;
      findings.failed('later-entries', { ...data, because: 'its slot is empty' });
    } else if (shown && taken[0] !== shown.index) {
      findings.failed('later-entries', { ...data, because: 'its slot is elsewhere in the log' });
    }
    if (seq > last.seq) later += taken.length;
  }
  if (later === 0) return;
  const data = { ...placeOf(first), count: later, because: 'later entries exist, not shown' };
  if (standing.size === null) findings.notChecked('later-entries', data);
  else findings.failed('later-entries', data);
}
