import type { ErasedShown } from '#evidence/chain/case-shown.ts';
import type { CheckedLeaf } from './check-leaf.ts';
import type { Differences } from './differences.ts';

/** Follows every chain and the log's clock along the leaves, in their order. */
export class Chains {
  private readonly commitments = new Map<string, Set<string>>();
  private readonly ends = new Map<string, string>();
  private readonly gone = new Map<string, number>();
  private last = '';

  constructor(private readonly found: Differences) {}

  /** Takes the next leaf of the log. */
  next(leafIndex: number, { header, commitment, goneParts, shown }: CheckedLeaf): void {
    const which = `leaf ${leafIndex}`;
    const earlier = this.commitments.get(header.case) ?? new Set<string>();
    const { found } = this;
    found.expect(
      header.seq === earlier.size,
      'sealed_entries',
      which,
      `an entry of its chain is missing or twice: seq ${header.seq} where ${earlier.size} was to come`,
    );
    found.expect(
      header.prev === (this.ends.get(header.case) ?? null),
      'sealed_entries',
      which,
      'does not name the entry before it',
    );
    found.expect(
      header.names.every((name) => earlier.has(name)),
      'sealed_entries',
      which,
      'names an entry that is not of its chain',
    );
    found.expect(
      header.recordedAt >= this.last || header.kind === 'clock',
      'sealed_entries',
      which,
      'was recorded before the leaf before it',
    );
    this.last = header.recordedAt;
    for (const part of goneParts) this.gone.set(`${commitment}/${part}`, leafIndex);
    if (header.kind === 'erased') this.erase(header.names, shown as ErasedShown | undefined);
    this.commitments.set(header.case, earlier.add(commitment));
    this.ends.set(header.case, commitment);
  }

  private erase(names: string[], shown: ErasedShown | undefined): void {
    for (const name of names) {
      for (const part of shown?.parts ?? []) this.gone.delete(`${name}/${part}`);
    }
  }

  /** After the last leaf: parts that are gone without an entry that says so; the last instant. */
  end(): { lastRecordedAt: string } {
    for (const [key, leaf] of this.gone) {
      const part = key.slice(key.indexOf('/') + 1);
      this.found.add(
        'sealed_parts.bytes and salt',
        `leaf ${leaf}, ${part}`,
        'are gone, and nothing says so',
      );
    }
    return { lastRecordedAt: this.last };
  }
}
