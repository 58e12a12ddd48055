import { LimitError } from '#evidence/errors.ts';

/** How many hashes, or entries, a full tile holds. */
const TILE_WIDTH = 256;

/**
 * Path of a tile of the Merkle tree below the log's address (C2SP tlog-tiles).
 * @param level 0 for leaf hashes, then every eighth level of the tree
 * @param index the tile's place within its level
 * @param width how many hashes it has; 256 is a full tile
 * @throws LimitError outside what the format can name
 */
export function tilePath(level: number, index: number, width = TILE_WIDTH): string {
  if (!Number.isInteger(level) || level < 0 || level > 63) {
    throw new LimitError('A tile has a level from 0 to 63.');
  }
  return `tile/${level}/${numberPath(index)}${partial(width)}`;
}

/**
 * Path of a bundle of log entries below the log's address (C2SP tlog-tiles).
 * @throws LimitError outside what the format can name
 */
export function entriesPath(index: number, width = TILE_WIDTH): string {
  return `tile/entries/${numberPath(index)}${partial(width)}`;
}

/** How many hashes or entries the tile at `index` of a level has in a tree of that size; 0: none. */
export function tileWidth(level: number, index: number, size: number): number {
  const hashes = Math.floor(size / TILE_WIDTH ** level);
  return Math.max(0, Math.min(TILE_WIDTH, hashes - index * TILE_WIDTH));
}

function numberPath(index: number): string {
  if (!Number.isSafeInteger(index) || index < 0) throw new LimitError('A tile counts from 0.');
  const digits = String(index);
  const groups = digits.padStart(Math.ceil(digits.length / 3) * 3, '0').match(/\d{3}/g)!;
  return groups.map((group, at) => (at < groups.length - 1 ? `x${group}` : group)).join('/');
}

function partial(width: number): string {
  if (!Number.isInteger(width) || width < 1 || width > TILE_WIDTH) {
    throw new LimitError(`A tile has from 1 to ${TILE_WIDTH} hashes.`);
  }
  return width === TILE_WIDTH ? '' : `.p/${width}`;
}
