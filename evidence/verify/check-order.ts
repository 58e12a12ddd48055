import type { ClockShown } from '#evidence/chain/log-shown.ts';
import { itemsOf, placeOf, shownOf, type Work } from '#evidence/verify/work.ts';

/**
 * Along the log time never goes back, except at an open `clock` leaf; and the last stamped
 * checkpoint an entry names never goes back and is older than the entry itself.
 */
export function checkOrder(work: Work): void {
  const { findings } = work;
  const items = itemsOf(work).sort((a, b) => a.index - b.index);
  let [time, size] = ['', 0];
  for (const [at, item] of items.entries()) {
    if (item.index === items[at - 1]?.index) {
      findings.failed('order', { ...placeOf(item), because: 'two entries in one place' });
    }
    if (!item.header) continue;
    const { recordedAt, after } = item.header;
    // Instants of one form compare as text.
    if (recordedAt < time && !shownOf<ClockShown>(item, 'clock')) {
      findings.failed('order', { ...placeOf(item), because: 'its time is before the one before' });
    }
    time = recordedAt;
    if ((after?.size ?? 0) < size || (after?.size ?? 0) > item.index) {
      findings.failed('order', { ...placeOf(item), because: 'its time-stamp is out of order' });
    }
    size = after?.size ?? size;
  }
  if (!findings.anyFailed('order')) findings.checked('order', { count: items.length });
}

/** Counts entries that nothing from outside shows to be no older than they say. */
export function countUnbracketed({ chain, findings }: Work): void {
  const count = chain.filter(({ header }) => header !== null && header.after === null).length;
  if (count > 0) findings.line('bracket', 'shop-word', { count });
}
