import type { Migration } from '../migration.ts';

/** How often something was asked for, by a hash of who asked: no address is kept. */
export const rateCounts: Migration = {
  name: '0006-rate-counts',
  up: [
    `CREATE TABLE rate_counts (
      id_hash BINARY(32) NOT NULL PRIMARY KEY,
      points INT NOT NULL,
      expires_at DATETIME(3) NOT NULL,
      INDEX rate_counts_expiry (expires_at)
    )`,
  ],
  down: ['DROP TABLE rate_counts'],
};
