import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { connect } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import type { SendMailOptions } from 'nodemailer';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { CaughtMail } from './mail-page.ts';
import { startMail } from './mail.ts';
import type { Mail } from './mail.ts';

let directory = '';
let mail: Mail;

beforeAll(async () => {
  directory = await mkdtemp(join(tmpdir(), 'witnessmark-mail-'));
  mail = await startMail({ directory, smtpPort: 0, pagePort: 0 });
});

beforeEach(() => fetch(`${mail.pageUrl}/mails.json`, { method: 'DELETE' }));

afterAll(async () => {
  await mail.stop();
  await rm(directory, { recursive: true, force: true });
});

const send = (options: SendMailOptions) =>
  createTransport(mail.smtpUrl, { from: 'bench@shop.example' }).sendMail(options);

const mails = async (query = '') =>
  (await (await fetch(`${mail.pageUrl}/mails.json${query}`)).json()) as CaughtMail[];

async function only(): Promise<CaughtMail> {
  const [first, ...others] = await mails();
  expect(others).toEqual([]);
  if (!first) throw new Error('No mail was caught.');
  return first;
}

/** Speaks SMTP as no mail library would, each piece after the answer to the one before; gives all the answers. */
async function speak(...pieces: string[]): Promise<string> {
  const socket = connect(Number(new URL(mail.smtpUrl).port), '127.0.0.1');
  const closed = once(socket, 'close');
  let answers = '';
  socket.on('data', (chunk) => {
    answers += chunk.toString();
    // An answer of several lines ends with the one whose number is followed by a blank (RFC 5321, 4.2.1).
    const piece = /(?:^|\n)\d{3} [^\n]*\n$/.test(answers) ? pieces.shift() : undefined;
    if (piece !== undefined) socket.write(`${piece}\r\n`);
  });
  await closed;
  return answers;
}

describe('catching', () => {
  it('keeps a mail with its text, HTML and attachment byte for byte', async () => {
    const content = randomBytes(40_000);
    await send({
      to: 'Ada Fenn <ada@owner.example>',
      subject: 'Ready to go home ü',
      text: 'Come and fetch it.',
      html: '<p>Come and fetch it.</p>',
      attachments: [{ filename: 'warranty ü.pdf', content, contentType: 'application/pdf' }],
    });
    const caught = await only();
    expect(caught).toMatchObject({
      from: 'bench@shop.example',
      to: ['ada@owner.example'],
      subject: 'Ready to go home ü',
      html: '<p>Come and fetch it.</p>',
      attachments: [{ filename: 'warranty ü.pdf', contentType: 'application/pdf', size: 40_000 }],
    });
    expect(caught.text.trim()).toBe('Come and fetch it.');
    const file = await fetch(new URL(caught.attachments[0]?.url ?? '', mail.pageUrl));
    expect(file.headers.get('content-disposition')).toBe(
      "attachment; filename*=UTF-8''warranty%20%C3%BC.pdf",
    );
    expect(Buffer.from(await file.arrayBuffer()).equals(content)).toBe(true);
  });

  it('lists by the address a mail was delivered to, blind copies too, whatever the case', async () => {
    await send({ to: 'a@owner.example', bcc: 'b@owner.example', subject: 'one' });
    await send({ to: 'c@owner.example', subject: 'two' });
    expect((await mails('?to=B@owner.example')).map(({ subject }) => subject)).toEqual(['one']);
    expect((await mails('?to=d@owner.example')).length).toBe(0);
    expect((await mails()).map(({ subject }) => subject)).toEqual(['one', 'two']);
  });

  it('shows a break in an address or a subject for what it is: no second mail, no further header', async () => {
    await send({ to: 'a@owner.example', subject: 'one\r\nBcc: evil@other.example' });
    const { to, subject } = await only();
    expect(to).toEqual(['a@owner.example']);
    expect(subject).not.toContain('\n');
    const answers = await speak(
      'EHLO x',
      'MAIL FROM:<a@shop.example>',
      'RCPT TO:<a@owner.example\nRCPT TO:<evil@other.example>>',
      'QUIT',
    );
    expect(answers).toMatch(/^5\d\d /m);
    expect(await mails('?to=evil@other.example')).toEqual([]);
  });

  it('ends a message only at its last dot, and keeps lines that begin with one', async () => {
    const answers = await speak(
      'EHLO x',
      'MAIL FROM:<a@shop.example>',
      'RCPT TO:<a@owner.example>',
      'DATA',
      'Subject: dots\r\n\r\n..a line of one dot and words\r\nand a bare\n.\nin the middle\r\n.',
      'QUIT',
    );
    expect(answers).toContain('250 ');
    const { text } = await only();
    expect(text).toContain('.a line of one dot');
    expect(text).toContain('in the middle');
  });

  it('accepts a mail only once it is whole on the disk', async () => {
    await send({ to: 'a@owner.example', subject: 'kept' });
    const names = await readdir(directory);
    expect(names).toHaveLength(1);
    expect(names[0]).toMatch(/\.json$/);
    await writeFile(join(directory, '000000000000001-half.making'), '{"id":');
    const second = await startMail({ directory, smtpPort: 0, pagePort: 0 });
    const seen = await (await fetch(`${second.pageUrl}/mails.json`)).json();
    await second.stop();
    expect(seen).toMatchObject([{ subject: 'kept' }]);
  });

  it('waits for a mail that is still to come', async () => {
    const waiting = mails('?to=late@owner.example&count=1&wait=20000');
    await send({ to: 'other@owner.example', subject: 'not this' });
    await send({ to: 'late@owner.example', subject: 'this' });
    expect((await waiting).map(({ subject }) => subject)).toEqual(['this']);
  });
});

describe('showing', () => {
  const hostile = '"><script>alert(1)</script>';

  it('shows a mail as text, with its links, and never as markup of its own page', async () => {
    await send({
      to: 'a@owner.example',
      subject: hostile,
      text: `${hostile} Open http://127.0.0.1:3000/t/1?a=1&b=2 now`,
      html: `<p>${hostile}</p>`,
    });
    const { id } = await only();
    const list = await (await fetch(mail.pageUrl)).text();
    const one = await fetch(`${mail.pageUrl}/mails/${id}`);
    const page = await one.text();
    expect(list + page).not.toContain('<script');
    expect(page).toContain('href="http://127.0.0.1:3000/t/1?a=1&#38;b=2"');
    expect(page).toContain('<iframe sandbox ');
    expect(one.headers.get('content-security-policy')).toContain("default-src 'none'");
    const html = await fetch(`${mail.pageUrl}/mails/${id}/html`);
    expect(html.headers.get('content-security-policy')).toMatch(/^sandbox; default-src 'none'/);
  });

  it.each(['/mails/none', '/mails/..%2f..%2fetc%2fpasswd', '/mails/', '/other'])(
    'answers 404 for %s',
    async (path) => {
      expect((await fetch(mail.pageUrl + path)).status).toBe(404);
    },
  );
});

describe('misbehaving on request', () => {
  afterEach(() => mail.fault({ kind: 'none' }));
  const attempt = () => send({ to: 'a@owner.example' });

  it.each([
    ['refuse', 550],
    ['defer', 451],
  ] as const)('answers a recipient %s with %i, and keeps nothing', async (kind, responseCode) => {
    await mail.fault({ kind });
    await expect(attempt()).rejects.toMatchObject({ code: 'EENVELOPE', responseCode });
    expect(await mails()).toEqual([]);
  });

  it('is gone, and there again on the same port', async () => {
    await mail.fault({ kind: 'gone' });
    await expect(attempt()).rejects.toMatchObject({ code: 'ESOCKET' });
    await mail.fault({ kind: 'none' });
    await attempt();
    expect(await mails()).toHaveLength(1);
  });

  it('is slow to accept', async () => {
    await mail.fault({ kind: 'slow', ms: 300 });
    const began = performance.now();
    await attempt();
    expect(performance.now() - began).toBeGreaterThan(290);
  });
});

it('turns away a request that came by another host name', async () => {
  const socket = connect(Number(new URL(mail.pageUrl).port), '127.0.0.1');
  socket.end('GET /mails.json HTTP/1.1\r\nHost: evil.example\r\nConnection: close\r\n\r\n');
  const [answer] = (await once(socket, 'data')) as [Buffer];
  expect(answer.toString()).toMatch(/^HTTP\/1\.1 421 /);
});
