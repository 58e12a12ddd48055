import type { Migration } from '../migration.ts';

/** The shop's own row, its people, their sessions, customers' sign-in codes, and the audit record. */
export const shopPeopleSessions: Migration = {
  name: '0001-shop-people-sessions',
  up: [
    `CREATE TABLE shops (
      id TINYINT UNSIGNED NOT NULL PRIMARY KEY CHECK (id = 1),
      name VARCHAR(120) NOT NULL,
      place VARCHAR(120) NOT NULL,
      address VARCHAR(400) NOT NULL,
      telephone VARCHAR(40) NOT NULL,
      email VARCHAR(254) NOT NULL,
      currency CHAR(3) NOT NULL,
      time_zone VARCHAR(64) NOT NULL,
      length_unit ENUM('mm','in') NOT NULL DEFAULT 'mm',
      force_unit ENUM('N','lbf') NOT NULL DEFAULT 'N',
      warranty_terms TEXT NOT NULL,
      created_at DATETIME(3) NOT NULL
    )`,
    `CREATE TABLE people (
      id UUID NOT NULL PRIMARY KEY,
      subject VARCHAR(255) CHARACTER SET ascii COLLATE ascii_bin NOT NULL UNIQUE,
      name VARCHAR(120) NOT NULL,
      role ENUM('proprietor','technician','desk') NOT NULL,
      number INT UNSIGNED NOT NULL UNIQUE,
      created_at DATETIME(3) NOT NULL,
      removed_at DATETIME(3) NULL
    )`,
    `CREATE TABLE customers (
      id UUID NOT NULL PRIMARY KEY,
      name VARCHAR(160) NOT NULL,
      email VARCHAR(254) NULL,
      telephone VARCHAR(40) NULL,
      address VARCHAR(400) NULL,
      tell_by ENUM('email','telephone') NOT NULL DEFAULT 'email',
      created_at DATETIME(3) NOT NULL,
      erased_at DATETIME(3) NULL,
      INDEX customers_email (email),
      INDEX customers_name (name)
    )`,
    `CREATE TABLE sessions (
      id_hash BINARY(32) NOT NULL PRIMARY KEY,
      person_id UUID NULL,
      customer_id UUID NULL,
      created_at DATETIME(3) NOT NULL,
      fresh_at DATETIME(3) NOT NULL,
      seen_at DATETIME(3) NOT NULL,
      expires_at DATETIME(3) NOT NULL,
      CONSTRAINT sessions_one_holder CHECK ((person_id IS NULL) <> (customer_id IS NULL)),
      CONSTRAINT sessions_person FOREIGN KEY (person_id) REFERENCES people (id),
      CONSTRAINT sessions_customer FOREIGN KEY (customer_id) REFERENCES customers (id),
      INDEX sessions_expiry (expires_at)
    )`,
    `CREATE TABLE sign_in_codes (
      id UUID NOT NULL PRIMARY KEY,
      customer_id UUID NULL,
      browser_hash BINARY(32) NOT NULL UNIQUE,
      code_hmac BINARY(32) NOT NULL,
      tries TINYINT UNSIGNED NOT NULL DEFAULT 0,
      created_at DATETIME(3) NOT NULL,
      expires_at DATETIME(3) NOT NULL,
      used_at DATETIME(3) NULL,
      CONSTRAINT sign_in_codes_customer FOREIGN KEY (customer_id) REFERENCES customers (id)
    )`,
    `CREATE TABLE audit_records (
      id UUID NOT NULL PRIMARY KEY,
      at DATETIME(3) NOT NULL,
      person_id UUID NULL,
      customer_id UUID NULL,
      act VARCHAR(60) NOT NULL,
      case_id UUID NULL,
      subject_id UUID NULL,
      detail TEXT NULL,
      INDEX audit_records_at (at),
      INDEX audit_records_case (case_id, at)
    )`,
  ],
  down: [
    'DROP TABLE audit_records',
    'DROP TABLE sign_in_codes',
    'DROP TABLE sessions',
    'DROP TABLE customers',
    'DROP TABLE people',
    'DROP TABLE shops',
  ],
};
