/** Something that is not as the log says. */
export interface Difference {
  /** The table or object and what of it: "sealed_parts.bytes", "store log/checkpoint". */
  what: string;
  /** Which one: "leaf 12, shown", "case 2026-031, photo 3". */
  which: string;
  /** How it differs, as the end of a sentence. */
  how: string;
}

/** What was looked at and what was found to differ. */
export class Differences {
  readonly list: Difference[] = [];
  readonly counts: Record<string, number> = {};

  /** Counts things looked at. */
  seen(things: string, count = 1): void {
    this.counts[things] = (this.counts[things] ?? 0) + count;
  }

  add(what: string, which: string, how: string): void {
    this.list.push({ what, which, how });
  }

  /** Notes a difference unless `same`. Returns `same`. */
  expect(same: boolean, what: string, which: string, how: string): boolean {
    if (!same) this.add(what, which, how);
    return same;
  }
}

/** Whether two byte strings are the same; a missing one is like nothing. */
export function sameBytes(
  a: Uint8Array | null | undefined,
  b: Uint8Array | null | undefined,
): boolean {
  return Boolean(a && b && Buffer.compare(a, b) === 0);
}
