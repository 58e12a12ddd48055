import { beforeAll, describe, expect, it } from 'vitest';
import { access } from '#app/access.ts';
import { may } from '#domain/rights.ts';
import { startApp } from '#tests/setup/app.ts';
import { useAppDatabase } from './app-database.ts';
import { visits, type Visit } from './expected.ts';
import { BENCH_WORDS, COMPLAINT, setScene, SHARED_WORDS, type Scene } from './scene.ts';
import { sentTo, Visitor } from './visitor.ts';

const app = await startApp();
useAppDatabase(app);

const VIEWERS = ['proprietor', 'technician', 'desk', 'owner', 'other', 'public'] as const;
type Who = (typeof VIEWERS)[number];
const STAFF: readonly Who[] = ['proprietor', 'technician', 'desk'];

let scene: Scene;
beforeAll(async () => {
  scene = await setScene(app.url);
}, 180_000);

const patterns = Object.keys(access);
const expectedOf = (pattern: string): Visit[] => visits(scene.things)[pattern] ?? [];
const as = (who: Who) => scene.viewers[who];

/** Asks as each viewer in turn; the answers by viewer. */
async function askAll(ask: (visitor: Visitor, who: Who) => Promise<Response>) {
  const answers = await Promise.all(VIEWERS.map((who) => ask(as(who), who)));
  return answers.map((answer, at) => ({ who: VIEWERS[at] as Who, answer }));
}

const isApi = (path: string) => path.startsWith('/api/');
// What the browser's router fetches for a page.
const dataPath = (path: string) => {
  const [pathname = '', query] = path.split('?');
  const data = pathname === '/' ? '/_.data' : `${pathname}.data`;
  return query === undefined ? data : `${data}?${query}`;
};

describe('the walk', () => {
  it('visits every route', () => {
    expect(Object.keys(visits(scene.things)).sort()).toEqual([...patterns].sort());
  });

  it('expects for the shop’s people what the rights say', () => {
    const { owner, technician, desk } = scene.shop;
    for (const [pattern, list] of Object.entries(visits(scene.things))) {
      const right = access[pattern]?.read;
      if (right === undefined || right === 'anyone' || access[pattern]?.door !== 'staff') continue;
      for (const { answers } of list) {
        const allowed = [owner, technician, desk].map((viewer) => may(viewer, right));
        expect([pattern, answers.slice(0, 3).map((status) => status !== 403)]).toEqual([
          pattern,
          allowed,
        ]);
      }
    }
  });

  describe.each(patterns)('%s', (pattern) => {
    it('answers each as the rights say, by GET and by HEAD', async () => {
      const list = expectedOf(pattern);
      expect(list.length).toBeGreaterThan(0);
      for (const { path, answers } of list) {
        const got = await askAll((visitor) => visitor.send(path));
        expect([path, ...got.map(({ answer }) => answer.status)]).toEqual([path, ...answers]);
        for (const { who, answer } of got) await checkWords(path, who, answer);
        const heads = await askAll((visitor) => visitor.send(path, { method: 'HEAD' }));
        expect([path, ...heads.map(({ answer }) => answer.status)]).toEqual([path, ...answers]);
        for (const { answer } of heads) expect(await answer.text()).toBe('');
      }
    });

    it('answers the same to the router’s own fetching', async () => {
      for (const { path, answers } of expectedOf(pattern)) {
        if (isApi(path)) continue;
        const got = await askAll((visitor) => visitor.send(dataPath(path)));
        // The router is told where to go by 202, with the address in the answer.
        const expected = answers.map((status) => (status === 302 ? 202 : status));
        expect([path, ...got.map(({ answer }) => answer.status)]).toEqual([path, ...expected]);
        for (const { who, answer } of got) await checkWords(path, who, answer);
      }
    });

    it('lets nobody change anything without the right', async () => {
      const { door, write } = access[pattern]!;
      const { path } = expectedOf(pattern)[0]!;
      const [pathname = ''] = path.split('?');
      const method = pattern.includes('/photos/') ? 'PUT' : 'POST';
      const [number] = /\d{4}-\d{3}/.exec(path) ?? [];
      const change = async (at: string) =>
        askAll(async (visitor, who) => {
          // Signing out ends the session, and the others still need it.
          const sender = pattern === '/sign-out' ? new Visitor(app.url) : visitor;
          const headers = { Origin: app.url };
          const body = method === 'PUT' ? undefined : new URLSearchParams({ who, n: number ?? '' });
          return sender.send(at, { method, headers, ...(body ? { body } : {}) });
        });
      for (const at of isApi(path) ? [pathname] : [pathname, dataPath(pathname)]) {
        for (const { who, answer } of await change(at)) {
          const status = answer.status === 202 ? 302 : answer.status;
          const said = [at, who, status];
          if (door !== 'everyone' && who === 'public') {
            expect(said).toEqual([at, who, isApi(path) ? 401 : 302]);
          } else if (door === 'staff' && !STAFF.includes(who)) {
            expect(said).toEqual([at, who, 403]);
          } else if (door === 'customers' && STAFF.includes(who)) {
            expect(said).toEqual([at, who, 403]);
          } else if (write === undefined) {
            expect(said).toEqual([at, who, 405]);
          } else {
            expect([401, 403, 405, 500]).not.toContain(status);
          }
        }
      }
    });
  });

  /** No answer holds what its reader may not see; the sign-in leads back to where it was asked from. */
  async function checkWords(path: string, who: Who, answer: Response): Promise<void> {
    if (who === 'public' && answer.status === 302 && access[path]?.door !== 'everyone') {
      const guarded = /^\/(?:bench|portal)/.test(path);
      if (guarded) expect(sentTo(answer)).toBe(`/sign-in?return=${encodeURIComponent(path)}`);
    }
    const type = answer.headers.get('Content-Type') ?? '';
    if (/^(?:image|application\/pdf)/.test(type)) return;
    const text = await answer.text();
    const secrets = STAFF.includes(who) ? [] : [BENCH_WORDS];
    if (!STAFF.includes(who) && who !== 'owner') secrets.push(COMPLAINT, 'Osei');
    if (secrets.length > 1 && isPrivate(path)) secrets.push(SHARED_WORDS);
    expect([path, who, secrets.filter((words) => text.includes(words))]).toEqual([path, who, []]);
  }
  // What the owner agreed to publish may stand on the public pages.
  const isPrivate = (path: string) =>
    /^\/(?:bench|portal|api\/(?:media|papers|changes|cases))/.test(path);

  it('finds the words where they belong, so that missing them elsewhere means something', async () => {
    const { closed } = scene.things;
    const bench = await (await as('desk').send(`/bench/cases/${closed}`)).text();
    const wanted = [SHARED_WORDS, BENCH_WORDS, 'Osei'];
    expect(wanted.filter((words) => bench.includes(words))).toEqual(wanted);
    const own = await (await as('owner').send(`/portal/cases/${closed}/timeline`)).text();
    expect(own.includes(SHARED_WORDS)).toBe(true);
  });

  it('tells another owner’s case from none by nothing', async () => {
    const say = async (path: string) => {
      const answer = await as('other').send(path);
      const page = (await answer.text()).replaceAll(/nonce="[^"]*"|2026-\d{3}/g, '');
      return [answer.status, page];
    };
    for (const end of ['', '/timeline', '/warranty']) {
      const theirs = await say(`/portal/cases/${scene.things.closed}${end}`);
      expect(theirs).toEqual(await say(`/portal/cases/2026-999${end}`));
    }
  });
});

describe('the code on a printed tag', () => {
  it('leads staff to the timeline, owners to their case, and others to Verify', async () => {
    const { tag, closed } = scene.things;
    const got = await askAll((visitor) => visitor.send(`/t/${tag}`));
    const staff = `/bench/cases/${closed}/add`;
    const own = `/portal/cases/${closed}`;
    expect(got.map(({ answer }) => sentTo(answer))).toEqual([
      ...[staff, staff, staff],
      ...[own, '/verify', '/verify'],
    ]);
    const none = await askAll((visitor) => visitor.send('/t/AAAAAAAAAAAAAAAA'));
    expect(new Set(none.map(({ answer }) => sentTo(answer)))).toEqual(new Set(['/verify']));
  });
});

describe('a part of a file', () => {
  it.each([
    ['bytes=0-9', 206],
    ['bytes=999999999-', 416],
  ] as const)('%s is asked for with the same rights', async (range, part) => {
    const { photos } = scene.things;
    for (const path of [`/api/media/${photos.shared}/960`, `/api/media/${photos.bench}/320`]) {
      const expected = Object.values(visits(scene.things))
        .flat()
        .find((visit) => visit.path === path);
      const got = await askAll((visitor) => visitor.send(path, { headers: { Range: range } }));
      const statuses = got.map(({ answer }) => answer.status);
      const answers = expected?.answers.map((status) => (status === 200 ? part : status));
      expect([path, ...statuses]).toEqual([path, ...(answers ?? [])]);
      for (const { answer } of got) {
        const bytes = await answer.arrayBuffer();
        if (answer.status === 206) expect(bytes.byteLength).toBe(10);
      }
    }
  });

  it('of a paper is the whole of it, with the same rights', async () => {
    const path = `/api/papers/${scene.things.paper}`;
    const got = await askAll((visitor) => visitor.send(path, { headers: { Range: 'bytes=0-9' } }));
    expect(got.map(({ answer }) => answer.status)).toEqual([200, 200, 200, 200, 404, 401]);
  });

  it('that the reader has already is not told to those who may not see it', async () => {
    const path = `/api/media/${scene.things.photos.shared}/960`;
    const ETag = (await as('owner').send(path)).headers.get('ETag') ?? '';
    const got = await askAll((visitor) =>
      visitor.send(path, { headers: { 'If-None-Match': ETag } }),
    );
    expect(got.map(({ answer }) => answer.status)).toEqual([304, 304, 304, 304, 404, 401]);
  });
});
