import { beforeAll, describe, expect, it } from 'vitest';
import { openLog } from '#server/evidence/open-log.ts';
import { addEntry } from '#server/entries/add-entry.ts';
import { sealEntry } from '#server/record/seal-entry.ts';
import { refusalOf, routeArgs } from '#tests/cases/route-args.ts';
import { anOwner, takeInForm } from '#tests/cases/take-in-form.ts';
import { setUpShop, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { takeIn } from '#server/cases/take-in.ts';
import * as casePage from './case.tsx';
import * as closePage from './close.tsx';
import * as findPage from './find.tsx';
import * as rackPage from './rack.tsx';
import * as takeInPage from './take-in.tsx';

useDatabase();

let shop: TestShop;
let number: string;
let entryId: string;

beforeAll(async () => {
  shop = await setUpShop();
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
  const form = takeInForm({ owner: anOwner('Marguerite Osei'), nextStep: 'Level the new frets' });
  ({ number, entryId } = await takeIn(shop.desk, form));
});

const caseArgs = (form?: Record<string, string>, path = '') =>
  routeArgs(shop.desk, `/bench/cases/${number}${path}`, { number }, form);
const location = (answer: unknown) => (answer as Response).headers.get('Location');

describe('the Rack', () => {
  it('hangs each case on the rail of what it waits for', async () => {
    const { sub, rails, whose } = await rackPage.loader(routeArgs(shop.desk, '/bench', {}));
    expect(sub).toMatch(/^\w+ \d+ \w+, \d\d:\d\d\. One open case\.$/);
    const [bench] = rails;
    expect(bench?.tags).toMatchObject([
      {
        href: `/bench/cases/${number}`,
        owner: 'Marguerite Osei',
        waitsFor: 'Next: level the new frets',
        promised: 'Promised not yet set',
      },
    ]);
    expect(rails.slice(1).flatMap(({ tags }) => tags)).toEqual([]);
    expect(whose.map(({ label, current }) => [label, current])).toEqual([
      ['Everyone', true],
      ['Quilla', false],
      ['Bram', false],
    ]);
  });

  it('shows one person’s, and everyone’s for a person who is none', async () => {
    const of = (who: string) => rackPage.loader(routeArgs(shop.desk, `/bench?who=${who}`, {}));
    expect((await of(shop.technician.personId)).rails.flatMap(({ tags }) => tags)).toEqual([]);
    expect((await of('nobody')).whose[0]?.current).toBe(true);
  });
});

describe('taking in', () => {
  const page = '/bench/take-in';
  const form = {
    'owner.name': 'Dana Whitlock',
    'owner.email': 'dana@whitlock.example',
    'owner.tellBy': 'email',
    'instrument.kind': 'Mandolin',
    'instrument.maker': 'Haldane',
    'instrument.serial': '88-14',
    job: 'Worn frets',
    complaint: 'It buzzes.',
    consentPhotos: 'on',
  };

  it('goes to the new case', async () => {
    const answer = await takeInPage.action(routeArgs(shop.desk, page, {}, form));
    expect(location(answer)).toMatch(/^\/bench\/cases\/\d{4}-002\?taken-in$/);
  });

  it('comes back with each sentence and what was typed', async () => {
    const serial = '8'.repeat(4000);
    const wrong = { ...form, 'owner.name': '', 'instrument.serial': serial };
    const answer = await takeInPage.action(routeArgs(shop.desk, page, {}, wrong));
    expect(answer).toMatchObject({
      data: {
        problem: 'A name is missing. Write it as it should stand on the tag.',
        fields: { 'instrument.serial': expect.stringContaining('80 is the most') as string },
        values: { job: 'Worn frets', 'instrument.serial': serial },
      },
      init: { status: 400 },
    });
  });

  it('finds an owner, their instruments and a serial', async () => {
    const at = (query: string) => takeInPage.loader(routeArgs(shop.desk, `${page}?${query}`, {}));
    const [dana] = (await at('find=whitlock')).search.found;
    const chosen = await at(`owner=${dana?.id ?? ''}&serial=88-14`);
    expect(chosen).toMatchObject({ owner: { name: 'Dana Whitlock' }, asksForProof: false });
    expect(chosen.known[0]?.cases[0]).toMatch(/^\d{4}-002, worn frets, /);
    expect(chosen.chosen).toBe(chosen.known[0]?.id);
    expect(await at('serial=88-14')).toMatchObject({ asksForProof: true, known: [], chosen: '' });
    expect((await refusalOf(at(`owner=${shop.desk.personId}`))).status).toBe(404);
  });
});

describe('the case file', () => {
  it('says what the tag, the timeline and What is next say', async () => {
    const view = await casePage.loader(caseArgs());
    expect(view).toMatchObject({
      heading: `Case file ${number}, mandolin by Tern & Lowe`,
      tag: { owner: 'Marguerite Osei', promised: 'not yet set' },
      next: { headline: { text: 'On the bench' } },
      status: 'All photos are up',
      isOpen: true,
      latest: entryId,
      viewer: null,
    });
    expect(view.next.steps).toEqual([
      'Level the new frets',
      'Seal 1\u00a0entry',
      'Close the case, issue the warranty',
    ]);
    expect(view.entryActs[entryId]).toMatchObject({
      mayEdit: true,
      maySeal: true,
      mayCorrect: false,
    });
  });

  it.each(['2026-999', '2026-1', 'x', "2026-001'"])('is a 404 for %j', async (wrong) => {
    const args = routeArgs(shop.desk, `/bench/cases/${wrong}`, { number: wrong });
    expect((await refusalOf(casePage.loader(args))).status).toBe(404);
    expect((await refusalOf(closePage.loader(args))).status).toBe(404);
  });

  it('takes a next step, an estimate and its answer', async () => {
    const next = await casePage.action(
      caseArgs({ intent: 'next', nextStep: 'New nut', place: 'Hook 4' }),
    );
    expect(location(next)).toBe(`/bench/cases/${number}`);
    expect((await casePage.loader(caseArgs())).next.steps[0]).toBe('New nut');
    const wrong = await casePage.action(
      caseArgs({ intent: 'estimate', summary: 'Nut', total: '1,200' }),
    );
    expect(wrong).toMatchObject({
      data: { values: { intent: 'estimate' } },
      init: { status: 400 },
    });
    await casePage.action(caseArgs({ intent: 'estimate', summary: 'Nut', total: '95' }));
    const waiting = await casePage.loader(caseArgs());
    expect(waiting.acts.answer).toEqual({ revision: 1, summary: 'Nut', total: '£95.00' });
    expect(waiting.next.headline).toEqual({
      text: 'Waiting for the owner: the estimate',
      tone: 'waiting',
    });
    await casePage.action(caseArgs({ intent: 'answer', revision: '1', answer: 'authorised' }));
    expect((await casePage.loader(caseArgs())).acts.answer).toBeNull();
  });

  it('refuses a button it does not know', async () => {
    const answer = await refusalOf(casePage.action(caseArgs({ intent: 'erase everything' })));
    expect(answer.status).toBe(400);
  });
});

describe('the end of a case', () => {
  it('names what is not sealed yet, closes, and hands back', async () => {
    const open = await closePage.loader(caseArgs());
    expect(open.drafts).toEqual([{ id: entryId, title: 'Taken in at the counter' }]);
    expect((await refusalOf(closePage.action(caseArgs({ intent: 'close' })))).status).toBe(409);
    await sealEntry(shop.owner, { caseNumber: number, entryId });
    const closed = await closePage.action(caseArgs({ intent: 'close' }));
    expect(location(closed)).toBe(`/bench/cases/${number}/warranty`);
    expect(await closePage.loader(caseArgs())).toMatchObject({ isClosed: true });
    await closePage.action(caseArgs({ intent: 'hand back' }));
    expect((await refusalOf(closePage.loader(caseArgs()))).status).toBe(409);
    const late = {
      caseNumber: number,
      phase: 'after',
      visibility: 'shared',
      draft: { title: 'Late' },
    };
    await expect(addEntry(shop.technician, late)).rejects.toMatchObject({ code: 'conflict' });
  });
});

describe('the search', () => {
  it('finds by owner and says when it finds nothing', async () => {
    const at = (words: string) =>
      findPage.loader(routeArgs(shop.desk, `/bench/find?q=${encodeURIComponent(words)}`, {}));
    expect((await at('osei')).cases.map((one) => one.number)).toEqual([number]);
    expect(await at('<script>')).toMatchObject({ words: '<script>', cases: [], full: false });
    expect((await at('')).cases).toEqual([]);
  });
});
