import { beforeAll, describe, expect, it } from 'vitest';
import { run } from '#server/db/sql.ts';
import { startSession } from '#server/auth/start-session.ts';
import { startApp } from '#tests/setup/app.ts';
import { setUpShop, type TestShop } from '#tests/record/shop.ts';
import { useAppDatabase } from './app-database.ts';
import { sentTo, Visitor } from './visitor.ts';

const app = await startApp();
useAppDatabase(app);

let shop: TestShop;
beforeAll(async () => {
  shop = await setUpShop();
});

const stranger = () => new Visitor(app.url);
async function technician(): Promise<Visitor> {
  const visitor = new Visitor(app.url);
  const holder = { personId: shop.technician.personId, freshAt: new Date() };
  visitor.take(await startSession(new Request(app.url), holder));
  return visitor;
}

describe('a page', () => {
  it('carries the nonce of its policy on every inline script, and no other inline code', async () => {
    const answer = await stranger().send('/sign-in');
    const nonce = /'nonce-([^']+)'/.exec(answer.headers.get('Content-Security-Policy') ?? '')?.[1];
    const page = await answer.text();
    const scripts = page.match(/<script\b[^>]*>/g) ?? [];
    expect(scripts.length).toBeGreaterThan(2);
    expect(scripts.filter((tag) => !tag.includes(`nonce="${nonce}"`))).toEqual([]);
    expect(page).not.toMatch(/<style\b|\son\w+=|javascript:/i);
  });

  it('is compressed, and its scripts were compressed once and are kept', async () => {
    const answer = await stranger().send('/sign-in', { headers: { 'Accept-Encoding': 'br' } });
    expect(answer.headers.get('Content-Encoding')).toBe('br');
    const script = /\/assets\/[\w.-]+\.js/.exec(await answer.text())?.[0] ?? '';
    const file = await stranger().send(script, { headers: { 'Accept-Encoding': 'br' } });
    expect(file.status).toBe(200);
    expect(file.headers.get('Content-Encoding')).toBe('br');
    expect(file.headers.get('Cache-Control')).toBe('public, max-age=31536000, immutable');
    const policy = file.headers.get('Content-Security-Policy');
    expect(policy).toContain("default-src 'none'");
  });

  it('is asked for again each time, unless it says otherwise', async () => {
    for (const path of ['/sign-in', '/no-such-page', '/bench']) {
      const { headers } = await stranger().send(path);
      expect([path, headers.get('Cache-Control')]).toEqual([path, 'private, no-cache']);
    }
  });

  it('that does not exist says so, and what to do', async () => {
    for (const path of ['/no-such-page', '/bench/no-such-page', '/portal/cases']) {
      const answer = await stranger().send(path);
      expect(answer.status).toBe(404);
      const page = await answer.text();
      expect(page).toContain('There is nothing here under this address. Check the number.');
      expect(page).not.toMatch(/\bat .*\.js:\d+/);
    }
    expect((await stranger().send('/assets/no-such-file.js')).status).toBe(404);
  });

  it('for others says whose it is', async () => {
    const page = await (await technician()).send('/portal');
    expect(page.status).toBe(403);
    expect(await page.text()).toContain('This page is the owner’s own.');
  });
});

describe('what is sent', () => {
  it('in a form of more than a mebibyte is refused in words', async () => {
    const answer = await stranger().post('/sign-in', { email: 'a'.repeat(1024 * 1024) });
    expect(answer.status).toBe(413);
    expect(await answer.json()).toMatchObject({ code: 'too-large' });
  });

  it('with a method nobody knows changes nothing', async () => {
    const headers = { Origin: app.url };
    for (const method of ['PUT', 'DELETE', 'PATCH']) {
      const answer = await stranger().send('/verify', { method, headers });
      expect(answer.status).toBe(405);
    }
  });
});

describe('the health of the shop', () => {
  it('is told without secrets, and says when the mail server is gone', async () => {
    const well = await stranger().send('/api/health');
    expect(well.headers.get('Cache-Control')).toBe('no-store');
    const text = await well.text();
    expect(JSON.parse(text)).toMatchObject({ ready: true, mail: 'answers' });
    expect(text).not.toMatch(/mariadb|127\.0\.0\.1|smtp/);
    await app.mail.fault({ kind: 'gone' });
    const ill = await stranger().send('/api/health');
    await app.mail.fault({ kind: 'none' });
    expect([ill.status, await ill.json()]).toMatchObject([
      200,
      { ready: true, mail: 'does not answer' },
    ]);
  });
});

describe('a session', () => {
  it('outlives the server, for the web tier keeps nothing', async () => {
    const staff = await technician();
    expect(sentTo(await staff.send('/'))).toBe('/bench');
    await app.crashAndRestart();
    expect(sentTo(await staff.send('/'))).toBe('/bench');
  });

  it('ends the moment it is revoked', async () => {
    const staff = await technician();
    await run('DELETE FROM sessions');
    const page = await staff.send('/bench/find?q=a');
    expect(sentTo(page)).toBe('/sign-in?return=%2Fbench%2Ffind%3Fq%3Da');
    const program = await staff.send('/api/changes');
    expect([program.status, await program.json()]).toEqual([
      401,
      { code: 'signed-out', sentence: 'You are signed out. Sign in and try again.' },
    ]);
  });
});
