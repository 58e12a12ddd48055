/** A photo that may stand on the paper. */
export interface Candidate {
  n: number;
  caption: string;
  /** Whether a damage is marked on it. */
  damage: boolean;
}

const wordsOf = (text: string) => new Set(text.toLowerCase().match(/\p{L}{4,}/gu) ?? []);

function likeness(a: Candidate, b: Candidate): number {
  const other = wordsOf(b.caption);
  return [...wordsOf(a.caption)].filter((word) => other.has(word)).length;
}

/**
 * Picks the two photos that show the same thing before and after: the pair whose captions share most
 * words; of equals the one with a damage marked before, then the latest after. Null without one on
 * each side. What is picked is only an illustration, so a rough rule is enough.
 */
export function pickPair<Photo extends Candidate>(
  before: Photo[],
  after: Photo[],
): { before: Photo; after: Photo } | null {
  const pairs = before.flatMap((first) =>
    after.map((second) => ({ before: first, after: second, like: likeness(first, second) })),
  );
  const [best] = pairs.sort(
    (a, b) =>
      b.like - a.like ||
      Number(b.before.damage) - Number(a.before.damage) ||
      b.after.n - a.after.n ||
      a.before.n - b.before.n,
  );
  return best ? { before: best.before, after: best.after } : null;
}
