import { nodesNeeded } from '#evidence/merkle/nodes-needed.ts';
import type { NodeAddress, NodeReader, TreeNode } from '#evidence/merkle/node-reader.ts';
import { run, select, type Transaction } from '#server/db/sql.ts';

const key = (level: number, index: number) => `${level}/${index}`;

const PER_QUERY = 500;

async function fetchInto(
  found: Map<string, Uint8Array>,
  addresses: NodeAddress[],
  tx?: Transaction,
): Promise<void> {
  const rows = await select<{ level: number; node_index: string; hash: Buffer }>(
    // OR and not IN with row values: MariaDB reads the latter without the index.
    `SELECT level, node_index, hash FROM log_nodes
     WHERE ${addresses.map(() => '(level = ? AND node_index = ?)').join(' OR ')}`,
    addresses.flatMap(({ level, index }) => [level, index]),
    tx,
  );
  for (const row of rows) found.set(key(row.level, Number(row.node_index)), row.hash);
}

async function fetchNodes(addresses: NodeAddress[], tx?: Transaction): Promise<NodeReader> {
  const found = new Map<string, Uint8Array>();
  for (let i = 0; i < addresses.length; i += PER_QUERY) {
    await fetchInto(found, addresses.slice(i, i + PER_QUERY), tx);
  }
  return (level, index) => {
    const hash = found.get(key(level, index));
    if (!hash) {
      throw new Error(
        `The witness log lacks a node (level ${level}, ${index}). Run npm run log:check.`,
      );
    }
    return hash;
  };
}

/**
 * Runs a calculation on the tree with the nodes it asks for, fetched together: about 2·log2 n rows
 * for a proof, however large the log is.
 * @throws Error when the database lacks one of the nodes
 */
export async function withNodes<T>(
  calculate: (read: NodeReader) => T,
  tx?: Transaction,
): Promise<T> {
  return calculate(await fetchNodes(nodesNeeded(calculate), tx));
}

/** Stores nodes that an append has completed. */
export async function keepNodes(nodes: TreeNode[], tx: Transaction): Promise<void> {
  await run(
    `INSERT INTO log_nodes (level, node_index, hash) VALUES ${nodes.map(() => '(?, ?, ?)').join(', ')}`,
    nodes.flatMap(({ level, index, hash }) => [level, index, Buffer.from(hash)]),
    tx,
  );
}
