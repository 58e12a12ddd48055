import { treeRoot } from '#evidence/merkle/tree-root.ts';
import { nodesOfAppend } from '#evidence/merkle/nodes-of-append.ts';
import type { NodeReader, TreeNode } from '#evidence/merkle/node-reader.ts';
import { select } from '#server/db/sql.ts';
import { sameBytes, type Differences } from './differences.ts';

const keyOf = (level: number, index: number) => `${level}/${index}`;

/** Rebuilds the tree from leaf hashes, and holds every stored node against it. */
export class Tree {
  /** Roots by size, for the sizes that were asked for. */
  readonly roots = new Map<number, Uint8Array>();
  size = 0;
  private nodes = 0;
  private readonly edge = new Map<string, Uint8Array>();
  private pending: TreeNode[] = [];

  constructor(
    private readonly found: Differences,
    private readonly wanted: Set<number>,
  ) {}

  private readonly read: NodeReader = (level, index) => {
    const hash = this.edge.get(keyOf(level, index));
    if (!hash) throw new Error(`The tree has no node (level ${level}, ${index}).`);
    return hash;
  };

  /** Adds the next leaf. */
  add(leafHash: Uint8Array): void {
    const made = nodesOfAppend(this.size, leafHash, this.read);
    for (const { level, index, hash } of made) {
      this.edge.set(keyOf(level, index), hash);
      // Below a complete node nothing is read again.
      if (level > 0) {
        this.edge.delete(keyOf(level - 1, 2 * index));
        this.edge.delete(keyOf(level - 1, 2 * index + 1));
      }
    }
    this.pending.push(...made);
    this.nodes += made.length;
    this.size += 1;
    if (this.wanted.has(this.size)) this.roots.set(this.size, treeRoot(this.size, this.read));
  }

  /** Holds the nodes made since the last call against the database. */
  async compare(): Promise<void> {
    const ranges = new Map<number, [number, number]>();
    for (const { level, index } of this.pending) {
      const [least, most] = ranges.get(level) ?? [index, index];
      ranges.set(level, [Math.min(least, index), Math.max(most, index)]);
    }
    if (ranges.size === 0) return;
    const rows = await select<{ level: number; node_index: string; hash: Buffer }>(
      `SELECT level, node_index, hash FROM log_nodes
       WHERE ${[...ranges].map(() => '(level = ? AND node_index BETWEEN ? AND ?)').join(' OR ')}`,
      [...ranges].flatMap(([level, [least, most]]) => [level, least, most]),
    );
    const stored = new Map(rows.map((row) => [keyOf(row.level, Number(row.node_index)), row.hash]));
    for (const { level, index, hash } of this.pending) {
      const same = sameBytes(hash, stored.get(keyOf(level, index)));
      this.found.expect(same, 'log_nodes.hash', `level ${level}, ${index}`, 'is not the tree’s');
      this.found.seen('nodes');
    }
    this.pending = [];
  }

  /** After the last leaf: whether the database has nodes that no leaf makes. */
  async end(): Promise<void> {
    const [row] = await select<{ n: string }>('SELECT COUNT(*) AS n FROM log_nodes');
    const more = Number(row?.n) - this.nodes;
    this.found.expect(more <= 0, 'log_nodes', `${more} nodes`, 'belong to no leaf');
  }
}
