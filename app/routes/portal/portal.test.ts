import { beforeAll, describe, expect, it } from 'vitest';
import type { CustomerViewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';
import { addEntry } from '#server/entries/add-entry.ts';
import { openLog } from '#server/evidence/open-log.ts';
import { sealEntry } from '#server/record/seal-entry.ts';
import { refusalOf, routeArgs } from '#tests/cases/route-args.ts';
import { addPhoto } from '#tests/record/entries.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import * as casePage from './case.tsx';
import * as homePage from './home.tsx';
import * as timelinePage from './timeline.tsx';

useDatabase();

let shop: TestShop;
let own: TestCase;
let foreign: TestCase;
let owner: CustomerViewer;

const SECRET = 'The owner must not read this';
const rest = { product: 'Glue', clampsOffHours: '24', workedHours: '24', stringsHours: '48' };

beforeAll(async () => {
  shop = await setUpShop();
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
  own = await takeInCase(shop);
  foreign = await takeInCase(shop);
  owner = { kind: 'customer', customerId: own.ownerId, name: 'Leopoldine Carrow' };
  for (const [phase, caption] of [
    ['before', 'Whole front'],
    ['after', 'Strung to pitch'],
  ] as const) {
    const entry = { caseNumber: own.number, phase, visibility: 'shared' };
    const { entryId } = await addEntry(shop.technician, {
      ...entry,
      draft: { title: `${phase} the work`, benchNote: SECRET },
    });
    await addPhoto(own, entryId, shop.technician, { caption });
    await addPhoto(own, entryId, shop.technician, { caption: SECRET, visibility: 'bench' });
    await sealEntry(shop.technician, { caseNumber: own.number, entryId });
  }
  await addEntry(shop.technician, {
    ...{ caseNumber: own.number, phase: 'during', visibility: 'shared' },
    draft: { title: SECRET, text: SECRET, rest },
  });
});

const args = (path: string, number = own.number) =>
  routeArgs(owner, `/portal/cases/${number}${path}`, { number });

describe('the portal', () => {
  it('has no action on any page', () => {
    for (const page of [casePage, homePage, timelinePage])
      expect(page).not.toHaveProperty('action');
  });

  it('says where each instrument is in one sentence', async () => {
    const { items } = await homePage.loader(routeArgs(owner, '/portal', {}));
    expect(items).toMatchObject([
      { number: own.number, instrument: 'Parlour guitar', state: 'Resting', tone: 'waiting' },
    ]);
    expect(items[0]?.sentence).toMatch(
      /^It rests under clamps\. They come off on \w+day at \d\d:\d\d\.$/,
    );
  });

  it('tells the state before sealing, and not a word of the draft', async () => {
    const view = await casePage.loader(args(''));
    expect(view.now).toMatchObject({ state: 'Resting', rest: { over: false } });
    expect(view.now.sentence).toContain(view.now.stress ?? 'nothing');
    expect(view.latest).toMatchObject({
      photo: { caption: expect.stringContaining('Strung to pitch') as string },
      seal: { state: 'sealed', by: 'Bram Ottway' },
    });
    expect(view.stations.map(({ label, state }) => [label, state])).toEqual([
      ['Taken in', 'done'],
      ['Resting now', 'here'],
      ['Ready to go home', 'to-come'],
    ]);
    expect(JSON.stringify(view)).not.toContain(SECRET);
  });

  it('shows the sealed shared timeline with a before and an after, and nothing else', async () => {
    const view = await timelinePage.loader(args('/timeline?photo=1'));
    expect(view.phases.map(({ phase, entries }) => [phase, entries.length])).toEqual([
      ['before', 1],
      ['after', 1],
    ]);
    expect(view.compare).toMatchObject({ before: { n: 1 }, after: { n: 3 } });
    expect(view.photos?.map(({ n, sha256 }) => [n, sha256])).toEqual([
      [1, undefined],
      [3, undefined],
    ]);
    expect(JSON.stringify(view)).not.toContain(SECRET);
  });

  it.each(['2026-999', 'x', "2026-001'--"])('is a 404 for %j', async (number) => {
    expect((await refusalOf(casePage.loader(args('', number)))).status).toBe(404);
    expect((await refusalOf(timelinePage.loader(args('/timeline', number)))).status).toBe(404);
  });

  it('answers another customer’s case as it answers none', async () => {
    const theirs = await refusalOf(casePage.loader(args('', foreign.number)));
    expect(theirs).toEqual(await refusalOf(casePage.loader(args('', '2026-998'))));
    expect(theirs.status).toBe(404);
    expect((await refusalOf(timelinePage.loader(args('/timeline', foreign.number)))).status).toBe(
      404,
    );
  });

  it('writes nothing when it is read', async () => {
    const counts = () =>
      select(`SELECT (SELECT SUM(version) FROM cases) AS versions,
                     (SELECT COUNT(*) FROM audit_records) AS acts,
                     (SELECT COUNT(*) FROM outbox) AS jobs`);
    const before = await counts();
    await homePage.loader(routeArgs(owner, '/portal', {}));
    await casePage.loader(args(''));
    await timelinePage.loader(args('/timeline'));
    expect(await counts()).toEqual(before);
  });
});
