import type { Migration } from '../migration.ts';

const APPEND_ONLY = ['log_leaves', 'log_nodes'] as const;

const refuse = (table: string, verb: 'UPDATE' | 'DELETE') =>
  `CREATE TRIGGER ${table}_no_${verb.toLowerCase()} BEFORE ${verb} ON ${table} FOR EACH ROW
   SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'the witness log is append-only'`;

/**
 * The witness log: sealed entries with their parts and photo salts, leaves, tree nodes, heads, keys.
 * Bytes that are hashed or signed are stored as exactly those bytes, never as JSON columns.
 */
export const witnessLog: Migration = {
  name: '0003-witness-log',
  up: [
    `CREATE TABLE log_states (
      id TINYINT UNSIGNED NOT NULL PRIMARY KEY CHECK (id = 1),
      origin VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      size BIGINT UNSIGNED NOT NULL,
      last_recorded_at DATETIME(3) NULL
    )`,
    `CREATE TABLE log_leaves (
      leaf_index BIGINT UNSIGNED NOT NULL PRIMARY KEY,
      entry BINARY(65) NOT NULL UNIQUE
    )`,
    `CREATE TABLE log_nodes (
      level TINYINT UNSIGNED NOT NULL,
      node_index BIGINT UNSIGNED NOT NULL,
      hash BINARY(32) NOT NULL,
      PRIMARY KEY (level, node_index)
    )`,
    `CREATE TABLE log_heads (
      size BIGINT UNSIGNED NOT NULL PRIMARY KEY,
      root BINARY(32) NOT NULL,
      note TEXT CHARACTER SET ascii COLLATE ascii_bin NULL,
      made_at DATETIME(3) NOT NULL,
      published_at DATETIME(3) NULL
    )`,
    `CREATE TABLE sealed_entries (
      leaf_index BIGINT UNSIGNED NOT NULL PRIMARY KEY,
      chain BINARY(16) NOT NULL,
      seq INT UNSIGNED NOT NULL,
      kind VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      header MEDIUMBLOB NOT NULL,
      header_salt BINARY(32) NOT NULL,
      commitment BINARY(32) NOT NULL UNIQUE,
      recorded_at DATETIME(3) NOT NULL,
      UNIQUE sealed_entries_slot (chain, seq),
      CONSTRAINT sealed_entries_leaf FOREIGN KEY (leaf_index) REFERENCES log_leaves (leaf_index)
    )`,
    `CREATE TABLE sealed_parts (
      leaf_index BIGINT UNSIGNED NOT NULL,
      name ENUM('shown','owner','bringer','payer','staff','money','bench') NOT NULL,
      bytes MEDIUMBLOB NULL,
      salt BINARY(32) NULL,
      PRIMARY KEY (leaf_index, name),
      CONSTRAINT sealed_parts_both CHECK ((bytes IS NULL) = (salt IS NULL)),
      CONSTRAINT sealed_parts_entry FOREIGN KEY (leaf_index) REFERENCES sealed_entries (leaf_index)
    )`,
    `CREATE TABLE signing_keys (
      id CHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`use\` ENUM('log','credential','paper','witness') NOT NULL,
      alg ENUM('Ed25519','RSA-3072') NOT NULL,
      spki BLOB NOT NULL,
      vkey VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NULL,
      certificate BLOB NULL,
      added_at_leaf BIGINT UNSIGNED NOT NULL,
      retired_at_leaf BIGINT UNSIGNED NULL,
      revoked_at_leaf BIGINT UNSIGNED NULL
    )`,
    ...APPEND_ONLY.flatMap((table) => [refuse(table, 'UPDATE'), refuse(table, 'DELETE')]),
  ],
  down: [
    'DROP TABLE signing_keys',
    'DROP TABLE sealed_parts',
    'DROP TABLE sealed_entries',
    'DROP TABLE log_heads',
    'DROP TABLE log_nodes',
    'DROP TABLE log_leaves',
    'DROP TABLE log_states',
  ],
};
