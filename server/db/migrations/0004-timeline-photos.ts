import type { Migration } from '../migration.ts';

/**
 * The timeline: entries, photos, the links between them with visibility, pins, rests.
 * `entries.draft`, `entry_photos.caption` and `pins` hold words only until sealing; then their one
 * home is the sealed part.
 */
export const timelinePhotos: Migration = {
  name: '0004-timeline-photos',
  up: [
    `CREATE TABLE entries (
      id UUID NOT NULL PRIMARY KEY,
      case_id UUID NOT NULL,
      kind VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      phase ENUM('before','during','after') NOT NULL,
      visibility ENUM('shared','bench') NOT NULL,
      amends_id UUID NULL,
      draft MEDIUMTEXT NULL,
      occurred_at DATETIME(3) NULL,
      written_by UUID NULL,
      written_at DATETIME(3) NOT NULL,
      edited_at DATETIME(3) NOT NULL,
      leaf_index BIGINT UNSIGNED NULL UNIQUE,
      sealed_at DATETIME(3) NULL,
      sealed_by UUID NULL,
      CONSTRAINT entries_draft_or_sealed CHECK ((draft IS NULL) = (leaf_index IS NOT NULL)),
      CONSTRAINT entries_case FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT entries_amends FOREIGN KEY (amends_id) REFERENCES entries (id),
      CONSTRAINT entries_written_by FOREIGN KEY (written_by) REFERENCES people (id),
      CONSTRAINT entries_sealed_by FOREIGN KEY (sealed_by) REFERENCES people (id),
      CONSTRAINT entries_leaf FOREIGN KEY (leaf_index) REFERENCES sealed_entries (leaf_index),
      INDEX entries_of_case (case_id, id)
    )`,
    `CREATE TABLE photos (
      id UUID NOT NULL PRIMARY KEY,
      case_id UUID NOT NULL,
      number INT UNSIGNED NOT NULL,
      sha256 BINARY(32) NOT NULL,
      bytes BIGINT UNSIGNED NOT NULL,
      media_type VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      object_key VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NOT NULL UNIQUE,
      file_name VARCHAR(200) NULL,
      uploaded_by UUID NOT NULL,
      received_at DATETIME(3) NOT NULL,
      state ENUM('waiting','ready','failed') NOT NULL DEFAULT 'waiting',
      failed_because VARCHAR(240) NULL,
      width INT UNSIGNED NOT NULL,
      height INT UNSIGNED NOT NULL,
      taken_clock CHAR(23) CHARACTER SET ascii COLLATE ascii_bin NULL,
      taken_offset CHAR(6) CHARACTER SET ascii COLLATE ascii_bin NULL,
      taken_at DATETIME(3) NULL,
      has_position BOOLEAN NOT NULL DEFAULT FALSE,
      placeholder VARBINARY(40) NULL,
      UNIQUE photos_number (case_id, number),
      UNIQUE photos_same_file (case_id, sha256),
      CONSTRAINT photos_case FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT photos_uploaded_by FOREIGN KEY (uploaded_by) REFERENCES people (id)
    )`,
    `CREATE TABLE photo_copies (
      photo_id UUID NOT NULL,
      edge SMALLINT UNSIGNED NOT NULL,
      object_key VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NOT NULL UNIQUE,
      sha256 BINARY(32) NOT NULL,
      bytes INT UNSIGNED NOT NULL,
      width SMALLINT UNSIGNED NOT NULL,
      height SMALLINT UNSIGNED NOT NULL,
      PRIMARY KEY (photo_id, edge),
      CONSTRAINT photo_copies_photo FOREIGN KEY (photo_id) REFERENCES photos (id)
    )`,
    `CREATE TABLE entry_photos (
      id UUID NOT NULL PRIMARY KEY,
      entry_id UUID NOT NULL,
      photo_id UUID NOT NULL,
      visibility ENUM('shared','bench') NOT NULL,
      caption VARCHAR(400) NULL,
      original_salt BINARY(32) NULL,
      published_salt BINARY(32) NULL,
      UNIQUE entry_photos_once (entry_id, photo_id),
      CONSTRAINT entry_photos_entry FOREIGN KEY (entry_id) REFERENCES entries (id),
      CONSTRAINT entry_photos_photo FOREIGN KEY (photo_id) REFERENCES photos (id)
    )`,
    `CREATE TABLE pins (
      id UUID NOT NULL PRIMARY KEY,
      entry_photo_id UUID NOT NULL,
      number SMALLINT UNSIGNED NOT NULL,
      x SMALLINT UNSIGNED NOT NULL CHECK (x <= 10000),
      y SMALLINT UNSIGNED NOT NULL CHECK (y <= 10000),
      kind ENUM('damage','remark') NOT NULL,
      label VARCHAR(120) NOT NULL,
      note VARCHAR(400) NOT NULL DEFAULT '',
      UNIQUE pins_number (entry_photo_id, number),
      CONSTRAINT pins_entry_photo FOREIGN KEY (entry_photo_id) REFERENCES entry_photos (id) ON DELETE CASCADE
    )`,
    `CREATE TABLE rests (
      id UUID NOT NULL PRIMARY KEY,
      case_id UUID NOT NULL,
      entry_id UUID NOT NULL UNIQUE,
      product VARCHAR(120) NOT NULL,
      started_at DATETIME(3) NOT NULL,
      clamps_off_at DATETIME(3) NULL,
      worked_at DATETIME(3) NULL,
      strings_at DATETIME(3) NULL,
      CONSTRAINT rests_case FOREIGN KEY (case_id) REFERENCES cases (id),
      CONSTRAINT rests_entry FOREIGN KEY (entry_id) REFERENCES entries (id),
      INDEX rests_of_case (case_id, started_at)
    )`,
  ],
  down: [
    'DROP TABLE rests',
    'DROP TABLE pins',
    'DROP TABLE entry_photos',
    'DROP TABLE photo_copies',
    'DROP TABLE photos',
    'DROP TABLE entries',
  ],
};
