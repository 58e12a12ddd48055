import { v7 } from 'uuid';
import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { demoStaff } from '#local/demo-staff.ts';
import { run } from '#server/db/sql.ts';
import { runDueJobs } from '#server/jobs/run-due-jobs.ts';
import { startApp } from '#tests/setup/app.ts';
import { mailsTo, waitForMail } from '#tests/setup/mail.ts';
import { useAppDatabase } from './app-database.ts';
import { sentTo, Visitor } from './visitor.ts';

const app = await startApp();
useAppDatabase(app);

const EMAIL = 'marguerite@osei.example';
const person = demoStaff[0]!;
const mailUrl = app.mail.pageUrl;
const visitor = () => new Visitor(app.url);

beforeAll(async () => {
  const now = new Date();
  await run(
    `INSERT INTO shops (id, name, place, address, telephone, email, currency, time_zone, warranty_terms, created_at)
     VALUES (1, 'Lund & Rell', 'Halden', '4 Quay Row', '01632 960 118', 'bench@lund.example', 'GBP', 'Europe/London', '', ?)`,
    [now],
  );
  await run(
    "INSERT INTO people (id, subject, name, role, number, created_at) VALUES (?, ?, ?, 'proprietor', 1, ?)",
    [v7(), person.sub, person.name, now],
  );
  await run('INSERT INTO customers (id, name, email, created_at) VALUES (?, ?, ?, ?)', [
    v7(),
    'Marguerite Osei',
    EMAIL,
    now,
  ]);
});
afterEach(async () => {
  await app.identity.fault({ kind: 'none' });
  await run('DELETE FROM rate_counts');
});

// The program's own worker sends them too, but last of all on a busy machine.
async function nextMail(before: number) {
  await runDueJobs({ kinds: ['mail'] });
  return waitForMail(EMAIL, { mailUrl, count: before + 1 });
}

async function codeFor(owner: Visitor, query = ''): Promise<string> {
  const before = (await mailsTo(EMAIL, { mailUrl })).length;
  const asked = await owner.post(`/sign-in${query}`, { email: EMAIL });
  expect([asked.status, sentTo(asked)]).toEqual([302, '/sign-in/code']);
  const mail = await nextMail(before);
  return /\d{6}/.exec(mail.subject)?.[0] ?? '';
}

describe('an owner signs in without a script', () => {
  it('by a code from the mail, and out again', async () => {
    const owner = visitor();
    const code = await codeFor(owner);
    const page = await (await owner.send('/sign-in/code')).text();
    expect(page).toContain(EMAIL);
    const entered = await owner.post('/sign-in/code', { code, intent: 'sign in' });
    expect([entered.status, sentTo(entered)]).toEqual([302, '/portal']);
    expect(sentTo(await owner.send('/'))).toBe('/portal');
    expect(owner.cookie('witnessmark-code')).toBeUndefined();

    const out = await owner.post('/sign-out', {});
    expect([out.status, sentTo(out)]).toEqual([302, '/sign-in']);
    expect(out.headers.get('Clear-Site-Data')).toBe('"cache"');
    expect(sentTo(await owner.send('/'))).toBe('/sign-in');
  });

  it('and comes to the page they wanted', async () => {
    const owner = visitor();
    const wanted = '/portal/cases/2026-031/timeline';
    const code = await codeFor(owner, `?return=${encodeURIComponent(wanted)}`);
    const entered = await owner.post('/sign-in/code', { code, intent: 'sign in' });
    expect(sentTo(entered)).toBe(wanted);
  });

  it('and is not sent to another site', async () => {
    for (const evil of ['//evil.example', 'https://evil.example/', '/\\evil.example']) {
      const owner = visitor();
      const code = await codeFor(owner, `?return=${encodeURIComponent(evil)}`);
      const entered = await owner.post('/sign-in/code', { code, intent: 'sign in' });
      expect(sentTo(entered)).toBe('/portal');
    }
  });

  it('with the session of before ended', async () => {
    const owner = visitor();
    await owner.post('/sign-in/code', { code: await codeFor(owner), intent: 'sign in' });
    const before = owner.cookie('witnessmark-session') ?? '';
    const thief = visitor();
    thief.take(`witnessmark-session=${before}`);
    expect(sentTo(await thief.send('/'))).toBe('/portal');
    await owner.post('/sign-out', {});
    expect(sentTo(await thief.send('/'))).toBe('/sign-in');
  });

  it('gets a wrong code said beside the field, and the form again', async () => {
    const owner = visitor();
    const code = await codeFor(owner);
    const wrong = String((Number(code) + 1) % 1_000_000).padStart(6, '0');
    const answer = await owner.post('/sign-in/code', { code: wrong, intent: 'sign in' });
    const page = await answer.text();
    expect(answer.status).toBe(400);
    expect(page).toContain('This code is not right.');
    expect(page).toContain('aria-invalid="true"');
  });

  it('gets a new code, and the first one is worth nothing in this browser', async () => {
    const owner = visitor();
    const first = await codeFor(owner);
    const before = (await mailsTo(EMAIL, { mailUrl })).length;
    expect(sentTo(await owner.post('/sign-in/code', { intent: 'send again' }))).toBe(
      '/sign-in/code',
    );
    const mail = await nextMail(before);
    const second = /\d{6}/.exec(mail.subject)?.[0] ?? '';
    if (first !== second) {
      expect((await owner.post('/sign-in/code', { code: first, intent: 'sign in' })).status).toBe(
        400,
      );
    }
    expect((await owner.post('/sign-in/code', { code: second, intent: 'sign in' })).status).toBe(
      302,
    );
  });

  it('sees the same answer for an address nobody knows', async () => {
    const [known, unknown] = [visitor(), visitor()];
    const answers = [
      await known.post('/sign-in', { email: EMAIL }),
      await unknown.post('/sign-in', { email: 'nobody@else.example' }),
    ];
    const seen = answers.map((answer) => ({
      status: answer.status,
      to: sentTo(answer),
      headers: [...answer.headers.keys()].sort(),
    }));
    expect(seen[1]).toEqual(seen[0]);
    const pages = await Promise.all(
      [known, unknown].map(async (one) => (await one.send('/sign-in/code')).text()),
    );
    const alike = pages.map((page) =>
      page.replaceAll(/nonce="[^"]*"/g, '').replaceAll(/marguerite@osei|nobody@else/g, 'someone'),
    );
    expect(alike[1]).toBe(alike[0]);
  });

  it('is told of an address that is none', async () => {
    const answer = await visitor().post('/sign-in', { email: 'ok@b.test\r\nBcc: evil@b.test' });
    expect(answer.status).toBe(400);
    const page = await answer.text();
    expect(page).toContain('This is not an e-mail address.');
    expect(page).toContain('value="ok@b.test');
    expect(await mailsTo('evil@b.test', { mailUrl })).toEqual([]);
  });
});

/** Goes to the identity provider, chooses who, and comes back with its answer. */
async function throughProvider(staff: Visitor, sub: string, path = '/sign-in/staff') {
  const provider = new Visitor(app.identity.issuer);
  let answer = await provider.send(sentTo(await staff.send(path)));
  const who = sentTo(answer);
  answer = await provider.send(who, {
    method: 'POST',
    body: new URLSearchParams({ person: sub }),
  });
  while (!sentTo(answer).startsWith(app.url)) answer = await provider.send(sentTo(answer));
  return sentTo(answer);
}

describe('a person of the shop signs in', () => {
  it('through the identity provider, and comes to the Rack', async () => {
    const staff = visitor();
    const entered = await staff.send(await throughProvider(staff, person.sub));
    expect([entered.status, sentTo(entered)]).toEqual([302, '/bench']);
    expect(sentTo(await staff.send('/'))).toBe('/bench');
  });

  it('and comes to the page they wanted', async () => {
    const staff = visitor();
    const wanted = '/sign-in/staff?return=%2Fbench%2Ffind%3Fq%3Dpike';
    const entered = await staff.send(await throughProvider(staff, person.sub, wanted));
    expect(sentTo(entered)).toBe('/bench/find?q=pike');
  });

  it('but not with an answer that was used before, or another browser’s', async () => {
    const staff = visitor();
    const back = await throughProvider(staff, person.sub);
    const stranger = await visitor().send(back);
    expect(stranger.status).toBe(400);
    expect(await stranger.text()).toContain('begun in another browser');
    expect((await staff.send(back)).status).toBe(302);
    const replayed = await staff.send(back);
    expect(replayed.status).toBe(400);
    expect(await replayed.text()).toContain('This sign-in has been used already.');
  });

  it('but not one who is on nobody’s list', async () => {
    const staff = visitor();
    const refused = await staff.send(await throughProvider(staff, demoStaff[1]!.sub));
    expect(refused.status).toBe(403);
    expect(await refused.text()).toContain('you are not on this shop’s list of people');
    expect(staff.cookie('witnessmark-session')).toBeUndefined();
  });

  it('but not one who turned back', async () => {
    const staff = visitor();
    const refused = await staff.send(await throughProvider(staff, ''));
    expect(refused.status).toBe(400);
    expect(await refused.text()).toContain('You turned back');
  });

  it.each(['refuse', 'gone'] as const)(
    'and is told when the provider is in trouble: %s',
    async (kind) => {
      const staff = visitor();
      const back = await throughProvider(staff, person.sub);
      await app.identity.fault({ kind });
      const answer = await staff.send(back);
      expect(answer.status).toBe(503);
      expect(await answer.text()).toContain(
        'The shop’s sign-in service does not answer. Wait a minute and try again.',
      );
      await app.identity.fault({ kind: 'none' });
      expect((await visitor().send('/sign-in/staff')).status).toBe(302);
    },
  );
});

describe('a change asked for from elsewhere', () => {
  const PATHS = ['/sign-in', '/sign-out', '/api/cases/2026-031/photos/x', '/bench/take-in', '/x'];

  it.each(PATHS)('is refused on %s, resource routes too', async (path) => {
    for (const headers of [{ Origin: 'https://evil.example' }, { Origin: 'null' }, {}]) {
      const method = path.startsWith('/api') ? 'PUT' : 'POST';
      const answer = await visitor().send(path, {
        method,
        headers: headers as HeadersInit,
        body: 'a=b',
      });
      expect(answer.status).toBe(403);
      expect(await answer.json()).toMatchObject({ code: 'other-origin' });
    }
  });
});
