import { GetObjectCommand, PutObjectCommand } from '@aws-sdk/client-s3';
import { createTransport } from 'nodemailer';
import { expect, it } from 'vitest';
import { select } from '#server/db/sql.ts';
import { env } from '#server/env.ts';
import { useDatabase } from './database.ts';
import { mailsTo, waitForMail } from './mail.ts';
import { storeClient, useStore } from './store.ts';

useDatabase();
useStore();

it('gives a test file its own migrated database', async () => {
  const [row] = await select<{ name: string }>('SELECT DATABASE() AS name');
  expect(row?.name).toMatch(/^test_[0-9a-f]{12}$/);
  expect(await select('SELECT name FROM migrations')).not.toHaveLength(0);
});

it('gives a test file its own bucket', async () => {
  const client = storeClient();
  const place = { Bucket: env().S3_BUCKET, Key: 'a/b' };
  await client.send(new PutObjectCommand({ ...place, Body: 'bytes' }));
  const { Body } = await client.send(new GetObjectCommand(place));
  expect(await Body?.transformToString()).toBe('bytes');
});

it('gives a test file mail of its own address, and waits for it', async () => {
  const to = `${env().S3_BUCKET}@owner.example`;
  expect(await mailsTo(to)).toEqual([]);
  const coming = waitForMail(to);
  await createTransport(env().SMTP_URL).sendMail({ from: 'a@shop.example', to, text: 'come' });
  expect((await coming).text.trim()).toBe('come');
});
