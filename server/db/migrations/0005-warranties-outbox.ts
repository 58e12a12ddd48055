import type { Migration } from '../migration.ts';

/** Warranties with their papers, and the outbox of everything slow or outside. */
export const warrantiesOutbox: Migration = {
  name: '0005-warranties-outbox',
  up: [
    `CREATE TABLE warranties (
      id UUID NOT NULL PRIMARY KEY,
      case_id UUID NOT NULL,
      code CHAR(11) CHARACTER SET ascii COLLATE ascii_bin NOT NULL UNIQUE,
      step ENUM('drawn','credential','sealed','paper','issued') NOT NULL,
      work TEXT NOT NULL,
      months SMALLINT UNSIGNED NOT NULL,
      valid_from DATETIME(3) NOT NULL,
      valid_until DATETIME(3) NOT NULL,
      jws TEXT CHARACTER SET ascii COLLATE ascii_bin NULL,
      seal BINARY(32) NULL UNIQUE,
      leaf_index BIGINT UNSIGNED NULL UNIQUE,
      issued_by UUID NOT NULL,
      drawn_at DATETIME(3) NOT NULL,
      issued_at DATETIME(3) NULL,
      CONSTRAINT warranties_case FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT warranties_issued_by FOREIGN KEY (issued_by) REFERENCES people (id),
      CONSTRAINT warranties_leaf FOREIGN KEY (leaf_index) REFERENCES sealed_entries (leaf_index),
      INDEX warranties_of_case (case_id)
    )`,
    `CREATE TABLE papers (
      id UUID NOT NULL PRIMARY KEY,
      warranty_id UUID NOT NULL,
      object_key VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NOT NULL UNIQUE,
      length INT UNSIGNED NOT NULL,
      sha256 BINARY(32) NOT NULL,
      leaf_index BIGINT UNSIGNED NULL UNIQUE,
      made_at DATETIME(3) NOT NULL,
      CONSTRAINT papers_warranty FOREIGN KEY (warranty_id) REFERENCES warranties (id),
      CONSTRAINT papers_leaf FOREIGN KEY (leaf_index) REFERENCES sealed_entries (leaf_index)
    )`,
    `CREATE TABLE outbox (
      id UUID NOT NULL PRIMARY KEY,
      kind VARCHAR(30) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      once_key VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NULL UNIQUE,
      case_id UUID NULL,
      payload MEDIUMTEXT NOT NULL,
      created_at DATETIME(3) NOT NULL,
      due_at DATETIME(3) NOT NULL,
      claimed_until DATETIME(3) NULL,
      attempts SMALLINT UNSIGNED NOT NULL DEFAULT 0,
      done_at DATETIME(3) NULL,
      failed_at DATETIME(3) NULL,
      last_error VARCHAR(240) NULL,
      CONSTRAINT outbox_case FOREIGN KEY (case_id) REFERENCES cases (id),
      INDEX outbox_due (done_at, failed_at, due_at),
      INDEX outbox_of_case (case_id, created_at)
    )`,
  ],
  down: ['DROP TABLE outbox', 'DROP TABLE papers', 'DROP TABLE warranties'],
};
