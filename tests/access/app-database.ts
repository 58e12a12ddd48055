import { afterAll } from 'vitest';
import { closeDatabase } from '#server/db/connection.ts';
import { env, parseEnv } from '#server/env.ts';
import type { App } from '#tests/setup/app.ts';

/** From here on the test file's own operations work on the running program's database, store and secrets. */
export function useAppDatabase(app: App): void {
  Object.assign(env(), parseEnv(app.env));
  afterAll(closeDatabase);
}
