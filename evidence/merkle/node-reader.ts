/**
 * Where a node of the tree stands: the root of the complete subtree over the leaves
 * [index · 2^level, (index + 1) · 2^level). Level 0 holds the leaf hashes. Such a node never
 * changes once its leaves are there, so it is stored once and nothing else of the tree is.
 */
export type NodeAddress = { level: number; index: number };

/** A node with its hash, 32 bytes. */
export type TreeNode = NodeAddress & { hash: Uint8Array };

/** Gives the hash of a stored node; it throws when there is none. */
export type NodeReader = (level: number, index: number) => Uint8Array;
