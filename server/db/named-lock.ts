import { select, transaction } from './sql.ts';

/**
 * Runs `work` while holding a lock of this name in this database, so that one process at a time does
 * it. The lock dies with the connection: a killed process holds nothing. `work` uses connections of
 * its own and may talk to outside services.
 * Returns undefined, without running `work`, when another process holds the lock for longer than
 * `waitSeconds`.
 */
export function withNamedLock<T>(
  name: string,
  waitSeconds: number,
  work: () => Promise<T>,
): Promise<T | undefined> {
  // A transaction only to keep one connection: the lock belongs to the connection.
  return transaction(async (tx) => {
    // Lock names are the server's, not the database's, and at most 64 characters long.
    const key = [name];
    const [taken] = await select<{ got: number | string | null }>(
      "SELECT GET_LOCK(SHA1(CONCAT(DATABASE(), '/', ?)), ?) AS got",
      [...key, waitSeconds],
      tx,
    );
    if (Number(taken?.got) !== 1) return undefined;
    try {
      return await work();
    } finally {
      await select("SELECT RELEASE_LOCK(SHA1(CONCAT(DATABASE(), '/', ?))) AS freed", key, tx);
    }
  });
}
