import { mkdtemp } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { startMail, type Mail } from '#local/mail.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { closeDatabase } from '../db/connection.ts';
import { env } from '../env.ts';
import { readHealth } from './read-health.ts';

useDatabase();

let mail: Mail;
const { DATABASE_URL, S3_ENDPOINT } = env();
beforeAll(async () => {
  const directory = await mkdtemp(join(tmpdir(), 'mail-'));
  mail = await startMail({ directory, smtpPort: 0, pagePort: 0 });
  env().SMTP_URL = mail.smtpUrl;
});
afterAll(() => mail.stop());
afterEach(async () => {
  await mail.fault({ kind: 'none' });
  Object.assign(env(), { DATABASE_URL, S3_ENDPOINT });
  await closeDatabase();
});

const NOWHERE = '127.0.0.1:1';

describe('the health of what the shop relies on', () => {
  it('is well when all three answer', async () => {
    expect(await readHealth()).toEqual({
      ready: true,
      database: 'answers',
      store: 'answers',
      mail: 'answers',
    });
  });

  it('says which one does not answer, and serves pages without mail and store', async () => {
    await mail.fault({ kind: 'gone' });
    env().S3_ENDPOINT = `http://${NOWHERE}`;
    expect(await readHealth()).toEqual({
      ready: true,
      database: 'answers',
      store: 'does not answer',
      mail: 'does not answer',
    });
  });

  it('is not ready without the database', async () => {
    await closeDatabase();
    env().DATABASE_URL = `mariadb://app:secret@${NOWHERE}/none`;
    const health = await readHealth();
    expect(health).toMatchObject({ ready: false, database: 'does not answer' });
    expect(JSON.stringify(health)).not.toContain('secret');
  });
});
