import { mkdtemp } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { startMail, type Mail as Catcher } from '#local/mail.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { mailsTo } from '#tests/setup/mail.ts';
import { run, select, transaction } from '../db/sql.ts';
import { env } from '../env.ts';
import { GiveUp } from '../jobs/job.ts';
import { jobSentence } from '../jobs/job-sentence.ts';
import { runDueJobs } from '../jobs/run-due-jobs.ts';
import { queueMail, type NewMail } from './queue-mail.ts';
import { sendMail } from './send-mail.ts';

useDatabase();

const AT = new Date('2026-04-16T09:40:00.000Z');
const later = (minutes: number) => new Date(AT.getTime() + minutes * 60_000);
let catcher: Catcher;

beforeAll(async () => {
  const directory = await mkdtemp(join(tmpdir(), 'mail-'));
  catcher = await startMail({ directory, smtpPort: 0, pagePort: 0 });
  env().SMTP_URL = catcher.smtpUrl;
  await run(
    `INSERT INTO shops (id, name, place, address, telephone, email, currency, time_zone, warranty_terms, created_at)
     VALUES (1, 'Lund & Rell', 'Halden', '4 Quay Row, Halden', '01632 960 118', 'bench@lund.example', 'GBP', 'Europe/London', '', ?)`,
    [AT],
  );
});
afterAll(() => catcher.stop());
afterEach(async () => {
  await catcher.fault({ kind: 'none' });
  await run('DELETE FROM outbox');
});

const about = { name: 'Marguerite Osei', caseNumber: '2026-031', instrument: 'Parlour guitar' };
const ready = (to: string | null): NewMail => ({ template: 'ready-to-go-home', data: about, to });
const queue = (mail: NewMail) => transaction((tx) => queueMail(tx, mail, { now: AT }));
const arrived = (to: string) => mailsTo(to, { mailUrl: catcher.pageUrl });

interface Row {
  payload: string;
  attempts: number;
  due_at: Date;
  done_at: Date | null;
  failed_at: Date | null;
  last_error: string | null;
}
const only = async () => (await select<Row>('SELECT * FROM outbox'))[0] as Row;
const messageId = async () =>
  (JSON.parse((await only()).payload) as { messageId: string }).messageId;

describe('a mail', () => {
  it('arrives in the shop’s name, as text and as HTML', async () => {
    await queue(ready('one@osei.example'));
    const id = await messageId();
    expect(await runDueJobs({ now: AT })).toEqual({ done: 1, failed: 0 });
    const [mail] = await arrived('one@osei.example');
    expect(mail).toMatchObject({ subject: 'Parlour guitar: ready to go home', messageId: id });
    expect(mail?.text).toContain('Marguerite Osei,');
    expect(mail?.text).toContain(`See the case: ${env().PUBLIC_URL}/portal/cases/2026-031`);
    expect(mail?.text).toContain('Lund & Rell\n4 Quay Row, Halden\n01632 960 118');
    expect(mail?.html).toContain('Lund &amp; Rell<br>');
    expect(mail?.attachments).toEqual([]);
  });

  it('waits while the mail server is gone and arrives once when it is back', async () => {
    await queue(ready('waits@osei.example'));
    const id = await messageId();
    await catcher.fault({ kind: 'gone' });
    expect(await runDueJobs({ now: AT })).toEqual({ done: 0, failed: 1 });
    const row = await only();
    expect(row).toMatchObject({ attempts: 1, done_at: null, failed_at: null });
    expect(row.due_at).toEqual(new Date(AT.getTime() + 5_000));
    expect(await arrived('waits@osei.example')).toEqual([]);

    await catcher.fault({ kind: 'none' });
    expect(await runDueJobs({ now: later(1) })).toEqual({ done: 1, failed: 0 });
    expect(await runDueJobs({ now: later(120) })).toEqual({ done: 0, failed: 0 });
    const mails = await arrived('waits@osei.example');
    expect(mails.map((mail) => mail.messageId)).toEqual([id]);
  });

  it('waits when the mail server asks to come later', async () => {
    await queue(ready('later@osei.example'));
    await catcher.fault({ kind: 'defer' });
    expect(await runDueJobs({ now: AT })).toEqual({ done: 0, failed: 1 });
    const { failed_at: failedAt, last_error: code } = await only();
    expect(failedAt).toBeNull();
    expect(jobSentence('mail', code ?? '', false)).toContain('It is tried again by itself.');
    await catcher.fault({ kind: 'none' });
    expect(await runDueJobs({ now: later(1) })).toEqual({ done: 1, failed: 0 });
    expect(await arrived('later@osei.example')).toHaveLength(1);
  });

  it('is given up, and said so, when the address is refused', async () => {
    await queue(ready('refused@osei.example'));
    await catcher.fault({ kind: 'refuse' });
    await runDueJobs({ now: AT });
    const row = await only();
    expect(row).toMatchObject({ last_error: 'address-refused', failed_at: AT });
    expect(row.last_error).not.toContain('osei');
    expect(jobSentence('mail', 'address-refused', true)).toBe(
      'A mail has not gone out: the other side refuses the address. Check it with the owner and send it again.',
    );
    expect(await runDueJobs({ now: later(600) })).toEqual({ done: 0, failed: 0 });
  });

  it('sent twice, because a worker died in between, is one mail by its Message-ID', async () => {
    await queue(ready('twice@osei.example'));
    const payload = JSON.parse((await only()).payload) as unknown;
    await sendMail(payload);
    await runDueJobs({ now: AT });
    const ids = (await arrived('twice@osei.example')).map((mail) => mail.messageId);
    expect(ids).toHaveLength(2);
    expect(new Set(ids).size).toBe(1);
  });

  it('is queued once per reason', async () => {
    for (const to of ['once@osei.example', 'once@osei.example']) {
      await queue({ ...ready(to), onceKey: 'ready:2026-031' });
    }
    expect(await runDueJobs({ now: AT })).toEqual({ done: 1, failed: 0 });
  });

  it('to nobody, and a code that has run out, go nowhere', async () => {
    await queue(ready(null));
    const notAfter = new Date('2026-04-16T09:50:00.000Z');
    await queue({
      template: 'sign-in-code',
      data: { code: '402917' },
      to: 'late@osei.example',
      notAfter,
    });
    const payload = (await select<Row>("SELECT * FROM outbox WHERE payload LIKE '%402917%'"))[0];
    await sendMail(JSON.parse(payload?.payload ?? ''), { now: later(11) });
    expect(await arrived('late@osei.example')).toEqual([]);
  });

  it('leaves no address and no words behind once it has gone', async () => {
    await queue(ready('forgotten@osei.example'));
    await runDueJobs({ now: AT });
    expect((await only()).payload).toBe('{}');
  });
});

describe('what people write', () => {
  it('is text in the HTML, and one line in the subject', async () => {
    const title = '<script>alert(1)</script>\r\nBcc: evil@b.test';
    await queue({ template: 'entry-shared', data: { ...about, title }, to: 'plain@osei.example' });
    await runDueJobs({ now: AT });
    const [mail] = await arrived('plain@osei.example');
    expect(mail?.html).toContain('&lt;script&gt;alert(1)&lt;/script&gt;');
    expect(mail?.html).not.toContain('<script');
    expect(mail?.to).not.toContain('evil');
    expect(await arrived('evil@b.test')).toEqual([]);
  });

  it.each(['ok@b.test\r\nBcc: evil@b.test', 'ok@b.test, evil@b.test', 'Evil <evil@b.test>'])(
    'is not taken for an address: %j',
    async (to) => {
      await expect(queue(ready(to))).rejects.toThrow('This is not an e-mail address.');
      expect(await select('SELECT id FROM outbox')).toEqual([]);
    },
  );

  it('is not taken for an address even when it stands in the outbox', async () => {
    const payload = { ...ready('x@b.test'), messageId: '<a@b.test>', notAfter: null };
    const tampered = { ...payload, to: 'ok@b.test\r\nBcc: evil@b.test' };
    await expect(sendMail(tampered)).rejects.toThrow(GiveUp);
    expect(await arrived('evil@b.test')).toEqual([]);
  });
});

describe('the newest checkpoint', () => {
  it('goes along as a file, byte for byte, and not as text', async () => {
    const note = 'witnessmark.example/log\n7\nq80=\n\n— witnessmark.example/log abc+/=\n';
    await run(
      'INSERT INTO log_heads (size, root, note, made_at, published_at) VALUES (7, ?, ?, ?, ?)',
      [Buffer.alloc(32, 1), Buffer.from(note), AT, AT],
    );
    await queue(ready('file@osei.example'));
    await runDueJobs({ now: AT });
    const [mail] = await arrived('file@osei.example');
    expect(mail?.attachments.map(({ filename }) => filename)).toEqual(['checkpoint.txt']);
    const answer = await fetch(new URL(mail?.attachments[0]?.url ?? '', catcher.pageUrl));
    expect(await answer.text()).toBe(note);
    expect(mail?.text).not.toContain('q80=');
    expect(mail?.html).not.toContain('q80=');
  });
});
