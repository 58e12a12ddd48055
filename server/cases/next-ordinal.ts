import { run, select, type Transaction } from '#server/db/sql.ts';

/**
 * Makes the row from which a year's numbers are drawn. Outside the transaction that draws: two first
 * cases of a year would otherwise wait for each other.
 */
export async function openYear(year: number): Promise<void> {
  await run('INSERT IGNORE INTO case_years (year, last_ordinal) VALUES (?, 0)', [year]);
}

/**
 * The next number of a year, under lock until the transaction ends: rolled back, it is drawn again, so
 * that the numbers have no gaps.
 */
export async function nextOrdinal(tx: Transaction, year: number): Promise<number> {
  const [row] = await select<{ last: number }>(
    'SELECT last_ordinal AS last FROM case_years WHERE year = ? FOR UPDATE',
    [year],
    tx,
  );
  if (!row) throw new Error(`The numbers of ${year} were not opened.`);
  await run('UPDATE case_years SET last_ordinal = last_ordinal + 1 WHERE year = ?', [year], tx);
  return row.last + 1;
}
