import { randomBytes } from 'node:crypto';

/** What is kept in the object store, by the first part of its key. */
export type Shelf = 'originals' | 'copies' | 'papers' | 'notes';

/**
 * A new random key, `originals/3f/3f9c…` (160 random bits, hex). It says nothing of what it holds
 * and is never used twice, so that an object is written once and never changes.
 */
export function newKey(shelf: Shelf): string {
  const name = randomBytes(20).toString('hex');
  return `${shelf}/${name.slice(0, 2)}/${name}`;
}
