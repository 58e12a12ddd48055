import { beforeAll, describe, expect, it } from 'vitest';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import { amendEntry } from '#server/record/amend-entry.ts';
import { changeVisibility } from '#server/record/change-visibility.ts';
import { sealEntry } from '#server/record/seal-entry.ts';
import { continueWarranty } from '#server/warranty/continue-warranty.ts';
import { issueWarranty } from '#server/warranty/issue-warranty.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { closedCase } from '#tests/record/closed-case.ts';
import { ownStore } from '#tests/record/own-store.ts';
import { setUpShop } from '#tests/record/shop.ts';
import { checkLog, logReport } from './check-log.ts';
import { keepLogObject, LAST_NOTE, noteKey, readLogObject } from './log-store.ts';
import { newestHead } from './newest-checkpoint.ts';
import { openLog } from './open-log.ts';
import { signHead } from './sign-head.ts';

await ownStore();
useDatabase();

const NOW = new Date('2026-04-24T15:05:00.000Z');

beforeAll(async () => {
  const shop = await setUpShop();
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
  const repair = await closedCase(shop, { now: NOW });
  const caseNumber = repair.number;
  const [first] = await select<{ id: string }>(
    'SELECT id FROM entries WHERE case_id = ? ORDER BY leaf_index LIMIT 1',
    [repair.id],
  );
  const { entryId } = await amendEntry(shop.technician, { caseNumber, entryId: first!.id });
  await sealEntry(shop.technician, { caseNumber, entryId }, { now: NOW });
  const hide = { caseNumber, entryId: first!.id, to: 'bench', photos: [1] } as const;
  await changeVisibility(shop.desk, { ...hide, photos: [1] }, { now: NOW });
  const work = [{ text: 'Bridge reglued', personId: shop.technician.personId }];
  const { warrantyId } = await issueWarranty(
    shop.desk,
    { caseNumber, months: 12, work },
    { now: NOW },
  );
  await continueWarranty(warrantyId, { now: NOW });
  await signHead({ now: NOW });
  // What a program may not do a thief with the database can.
  for (const table of ['log_leaves', 'log_nodes']) {
    for (const verb of ['update', 'delete']) await run(`DROP TRIGGER ${table}_no_${verb}`);
  }
});

const whats = async () => (await checkLog()).list.map(({ what }) => what);

/** Runs statements on one connection on which the database forgets what belongs together. */
const behindItsBack = (...statements: string[]) =>
  transaction(async (tx) => {
    await run('SET foreign_key_checks = 0', [], tx);
    const counts: number[] = [];
    for (const sql of statements) counts.push(await run(sql, [], tx));
    await run('SET foreign_key_checks = 1', [], tx);
    return counts;
  });

const copies = new Map<string, Promise<string>>();

/** A copy of a table as it was, made once. Returns its name. */
function keep(table: string): Promise<string> {
  const made =
    copies.get(table) ??
    run(`CREATE TABLE kept_${table} AS SELECT * FROM ${table}`).then(() => `kept_${table}`);
  copies.set(table, made);
  return made;
}

/** Changes one row of a table, asks what differs, and puts the table back. */
async function withChange(table: string, change: string): Promise<string[]> {
  const kept = await keep(table);
  const [changed] = await behindItsBack(`${change} LIMIT 1`);
  expect(changed, `rows changed by ${change}`).toBe(1);
  const found = await whats();
  await behindItsBack(`DELETE FROM ${table}`, `INSERT INTO ${table} SELECT * FROM ${kept}`);
  return found;
}

const bit = (column: string) =>
  `CONCAT(CHAR(ORD(LEFT(${column}, 1)) ^ 1 USING binary), SUBSTR(${column}, 2))`;
const last = (column: string) =>
  `CONCAT(LEFT(${column}, LENGTH(${column}) - 1), CHAR(ORD(RIGHT(${column}, 1)) ^ 1 USING binary))`;
const later = (column: string) => `DATE_ADD(${column}, INTERVAL 1 SECOND)`;

const COLUMNS: [table: string, column: string, where: string, change: string][] = [
  ['log_states', 'size', 'TRUE', 'size + 1'],
  ['log_states', 'last_recorded_at', 'TRUE', later('last_recorded_at')],
  ['log_states', 'origin', 'TRUE', "REPLACE(origin, '4', '5')"],
  ['log_leaves', 'entry', 'leaf_index = 6', last('entry')],
  ['log_nodes', 'hash', 'level = 0 AND node_index = 2', bit('hash')],
  ['log_nodes', 'hash', 'level = 2', bit('hash')],
  ['sealed_entries', 'header', 'leaf_index = 5', "REPLACE(header, 'shared', 'sharee')"],
  ['sealed_entries', 'header', 'leaf_index = 5', 'REPLACE(header, \'"seq":1\', \'"seq":2\')'],
  ['sealed_entries', 'header_salt', 'leaf_index = 5', bit('header_salt')],
  ['sealed_entries', 'commitment', 'leaf_index = 5', bit('commitment')],
  ['sealed_entries', 'chain', 'leaf_index = 5', bit('chain')],
  ['sealed_entries', 'seq', 'leaf_index = 5', '77'],
  ['sealed_entries', 'kind', 'leaf_index = 5', "'incident'"],
  ['sealed_entries', 'recorded_at', 'leaf_index = 5', later('recorded_at')],
  [
    'sealed_parts',
    'bytes',
    "name = 'shown' AND leaf_index = 5",
    "REPLACE(bytes, 'Bridge', 'Bridgf')",
  ],
  [
    'sealed_parts',
    'bytes',
    "name = 'bench' AND leaf_index = 5",
    "REPLACE(bytes, 'Clamp', 'Clamq')",
  ],
  ['sealed_parts', 'bytes', "name = 'staff' AND leaf_index = 5", "REPLACE(bytes, 'Bram', 'Brom')"],
  ['sealed_parts', 'bytes', "name = 'owner'", "REPLACE(bytes, 'buzzes', 'hums')"],
  ['sealed_parts', 'salt', "name = 'shown' AND leaf_index = 5", bit('salt')],
  ['sealed_parts', 'name', "name = 'bench' AND leaf_index = 5", "'money'"],
  ['photos', 'sha256', 'number = 1', bit('sha256')],
  ['photos', 'number', 'number = 2', '9'],
  ['photo_copies', 'sha256', 'edge = 2048', bit('sha256')],
  ['entry_photos', 'original_salt', 'TRUE', bit('original_salt')],
  ['entry_photos', 'published_salt', 'TRUE', bit('published_salt')],
  ['entry_photos', 'visibility', "visibility = 'bench'", "'shared'"],
  ['log_heads', 'root', 'TRUE', bit('root')],
  ['log_heads', 'note', 'note IS NOT NULL', last('note')],
  ['signing_keys', 'spki', "`use` = 'log'", last('spki')],
  ['signing_keys', 'vkey', "`use` = 'log'", "CONCAT(vkey, '=')"],
  ['signing_keys', 'use', "`use` = 'paper'", "'witness'"],
  ['signing_keys', 'alg', "`use` = 'paper'", "'Ed25519'"],
  ['signing_keys', 'certificate', "`use` = 'paper'", last('certificate')],
  ['signing_keys', 'id', "`use` = 'credential'", 'REVERSE(id)'],
  ['signing_keys', 'added_at_leaf', "`use` = 'log'", '3'],
  ['signing_keys', 'revoked_at_leaf', "`use` = 'log'", '3'],
  ['entries', 'visibility', "kind = 'entry'", "IF(visibility = 'bench', 'shared', 'bench')"],
  ['entries', 'kind', "kind = 'entry'", "'incident'"],
  ['entries', 'sealed_at', "kind = 'entry'", later('sealed_at')],
  ['entries', 'occurred_at', "kind = 'entry'", "'2020-01-01 00:00:00'"],
  ['entries', 'amends_id', "kind = 'amendment'", 'NULL'],
  ['cases', 'record', 'TRUE', bit('record')],
  ['warranties', 'jws', 'TRUE', last('jws')],
  ['warranties', 'seal', 'TRUE', bit('seal')],
  ['warranties', 'code', 'TRUE', 'REVERSE(code)'],
  ['warranties', 'valid_from', 'TRUE', later('valid_from')],
  ['warranties', 'valid_until', 'TRUE', later('valid_until')],
  ['papers', 'length', 'TRUE', 'length + 1'],
  ['papers', 'sha256', 'TRUE', bit('sha256')],
];

describe('log:check', () => {
  it('agrees with a log that nobody has touched, and says what it looked at', async () => {
    const found = await checkLog();
    expect(found.list).toEqual([]);
    expect(logReport(found)).toMatch(/^Looked at \d+ leaves, .*\nAll agrees\.$/);
    expect(found.counts).toMatchObject({ photos: 2, warranties: 1, papers: 1, keys: 3 });
    expect(found.counts.files).toBe(5);
  });

  it.each(COLUMNS)('finds a change of %s.%s where %s', async (table, column, where, change) => {
    const sql = `UPDATE ${table} SET \`${column}\` = ${change} WHERE ${where}`;
    const found = await withChange(table, sql);
    const named = found.filter((what) => what.includes(column));
    expect(named.length, `${column} among: ${found.join('; ')}`).toBeGreaterThan(0);
  });

  it.each(['log_leaves', 'log_nodes', 'sealed_entries', 'sealed_parts', 'entries', 'signing_keys'])(
    'finds a row of %s that is gone',
    async (table) => {
      const found = await withChange(table, `DELETE FROM ${table}`);
      expect(found.some((what) => what.startsWith(table))).toBe(true);
    },
  );

  it('finds a part that is gone without an entry that says so', async () => {
    const erase = "UPDATE sealed_parts SET bytes = NULL, salt = NULL WHERE name = 'owner'";
    expect(await withChange('sealed_parts', erase)).toEqual(['sealed_parts.bytes and salt']);
  });

  it('finds what differs in the store: notes, the last head, files', async () => {
    const head = await newestHead();
    for (const key of [LAST_NOTE, noteKey(head!.size)]) {
      const kept = await readLogObject(key);
      await keepLogObject(
        key,
        toUtf8(head!.note.replace(`\n${head!.size}\n`, `\n${head!.size - 1}\n`)),
        'text/plain',
      );
      expect(await whats()).toContain(`store ${key}`);
      await keepLogObject(key, kept!, 'text/plain');
    }
    const [paper] = await select<{ object_key: string }>('SELECT object_key FROM papers');
    const kept = await readLogObject(paper!.object_key);
    const other = Buffer.from(kept!);
    other[1000]! ^= 1;
    await keepLogObject(paper!.object_key, other, 'application/pdf');
    expect(await whats()).toEqual(['store paper']);
    await keepLogObject(paper!.object_key, kept!, 'application/pdf');
    expect(await whats()).toEqual([]);
  });

  it('finds that the newest leaf is gone whole, as after a restore', async () => {
    const newest = Number(
      (await select<{ n: string }>('SELECT size - 1 AS n FROM log_states'))[0]?.n,
    );
    const tables = ['log_leaves', 'sealed_entries', 'sealed_parts', 'entries', 'papers'];
    for (const table of [...tables, 'log_nodes', 'log_heads', 'log_states']) await keep(table);
    await behindItsBack(
      ...tables.map((table) => `DELETE FROM ${table} WHERE leaf_index = ${newest}`),
      `DELETE FROM log_nodes WHERE (node_index + 1) * POW(2, level) = ${newest + 1}`,
      `DELETE FROM log_heads WHERE size > ${newest}`,
      `UPDATE log_states SET size = ${newest}`,
    );
    // The database agrees with itself; only what the store keeps outside of it tells.
    expect(await whats()).toContain('the database');
    for (const table of [...tables, 'log_nodes', 'log_heads', 'log_states']) {
      await behindItsBack(
        `DELETE FROM ${table}`,
        `INSERT INTO ${table} SELECT * FROM kept_${table}`,
      );
    }
    expect(await whats()).toEqual([]);
  });
});
