import type { VisibilityShown } from '#evidence/chain/case-shown.ts';
import type { Header, Visibility } from '#evidence/seal/header.ts';

interface Seen {
  entry: Visibility;
  photos: Map<number, Visibility>;
}

/** Who may see what, as the sealed headers and the events after them say. */
export class SeenVisibility {
  private readonly byCommitment = new Map<string, Seen>();
  /** By leaf index. */
  readonly byLeaf = new Map<number, Seen>();

  next(leafIndex: number, commitment: string, header: Header, shown: unknown): void {
    const photos = new Map(header.photos.map(({ n, visibility }) => [n, visibility]));
    const seen = { entry: header.visibility, photos };
    this.byCommitment.set(commitment, seen);
    this.byLeaf.set(leafIndex, seen);
    if (header.kind !== 'visibility' || !shown) return;
    const { to, n } = shown as VisibilityShown;
    for (const name of header.names) {
      const changed = this.byCommitment.get(name);
      if (!changed) continue;
      if (n === null) changed.entry = to;
      else for (const number of n) if (changed.photos.has(number)) changed.photos.set(number, to);
    }
  }
}
