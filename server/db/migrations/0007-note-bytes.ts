import type { Migration } from '../migration.ts';

/** A signed note is kept as the bytes that were signed: its signature lines begin with a dash that is not ASCII. */
export const noteBytes: Migration = {
  name: '0007-note-bytes',
  up: ['ALTER TABLE log_heads MODIFY note BLOB NULL'],
  down: ['ALTER TABLE log_heads MODIFY note TEXT CHARACTER SET ascii COLLATE ascii_bin NULL'],
};
