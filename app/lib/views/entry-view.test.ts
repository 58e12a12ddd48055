import { describe, expect, it } from 'vitest';
import type { TimelineEntry, TimelinePhoto } from '#domain/timeline.ts';
import { entryView } from './entry-view.ts';
import { phasesView } from './phases-view.ts';
import { photoView } from './photo-view.ts';
import { viewerPhotos } from './viewer-photos.ts';

const photo: TimelinePhoto = {
  id: 'p1',
  n: 3,
  visibility: 'shared',
  caption: 'Bridge from behind',
  state: 'ready',
  failedBecause: null,
  width: 4000,
  height: 3000,
  placeholder: null,
  pins: [{ n: 1, kind: 'damage', x: 5000, y: 250, label: 'Lifted.', note: 'To the wing.' }],
};
const entry: TimelineEntry = {
  id: 'e1',
  kind: 'entry',
  phase: 'during',
  visibility: 'shared',
  title: 'Bridge reglued',
  text: 'Dry run first.',
  benchNote: '',
  used: ['Hot hide glue', 'Cork'],
  temperature: '-0.5',
  humidity: '48',
  minutes: 95,
  occurredAt: null,
  writtenAt: new Date('2026-04-15T08:40:00Z'),
  writtenBy: 'Tomasz Rell',
  writtenById: 't',
  corrects: null,
  rest: {
    product: 'Hot hide glue',
    startedAt: new Date('2026-04-15T08:40:00Z'),
    clampsOffAt: new Date('2026-04-16T08:40:00Z'),
    workedAt: null,
    stringsAt: new Date('2026-04-17T08:40:00Z'),
  },
  photos: [photo],
  expected: [],
  seal: null,
};
const sight = { now: new Date('2026-04-15T13:05:00Z'), zone: 'Europe/London' };

describe('an entry in words', () => {
  it('rests on a clock while a time is ahead, and says what it was once all are past', () => {
    const resting = entryView(entry, sight);
    expect(resting.rest?.sentence).toBe('Resting. Clamps off Thu 16 April, 09:40');
    expect(resting.used.map(({ kind }) => kind)).toEqual(['used', 'bench', 'hours']);
    const later = entryView(entry, { ...sight, now: new Date('2026-04-18T00:00:00Z') });
    expect(later.rest).toBeUndefined();
    expect(later.used[2]).toEqual({
      kind: 'rested',
      text: 'Hot hide glue. Clamps off Thu 16 April, 09:40; may carry strings Fri 17 April, 09:40',
    });
  });

  it('has the climate as a line of the work, and as figures of how it came in', () => {
    expect(entryView(entry, sight).used[1]).toEqual({
      kind: 'bench',
      text: '\u22120.5\u00a0°C, 48\u00a0%',
    });
    const before = entryView({ ...entry, phase: 'before' }, sight);
    expect(before.facts.map(({ label, value }) => [label, value])).toEqual([
      ['Humidity', '48'],
      ['Temperature', '\u22120.5'],
    ]);
    expect(before.used.map(({ kind }) => kind)).not.toContain('bench');
  });

  it('says who sealed it and when, and what an open one waits for', () => {
    const seal = {
      at: new Date('2026-04-15T09:00:00Z'),
      by: 'Ines Lund',
      leafHash: '40ade8a3'.padEnd(64, '0'),
    };
    expect(entryView({ ...entry, seal }, sight).seal).toEqual({
      state: 'sealed',
      when: '10:00',
      by: 'Ines Lund',
      shortHash: '40ad\u00a0e8a3',
    });
    const nextDay = { ...seal, at: new Date('2026-04-16T09:00:00Z') };
    expect(entryView({ ...entry, seal: nextDay }, sight).seal).toMatchObject({
      when: 'Thu 16 April, 10:00,',
    });
    const expected = [{ id: 'p9', caption: '' }];
    expect(entryView({ ...entry, expected }, sight).seal).toEqual({
      state: 'open',
      sentence: 'Not yet sealed. 1 of 2\u00a0photos still going up from Tomasz’s phone.',
    });
  });
});

describe('the phases', () => {
  it('count their entries and photos, and say what fills an empty one', () => {
    const [before, during] = phasesView([entry], sight);
    expect(before).toMatchObject({ sub: 'Nothing here yet.', entries: [] });
    expect(during?.sub).toBe('On the bench since 15 April. 1\u00a0entry, 1\u00a0photo.');
  });
});

describe('a photo', () => {
  it('is never larger than its copies, with pins in percent', () => {
    expect(photoView(photo, '?photo=3')).toMatchObject({
      state: 'ready',
      src960: '/api/media/p1/960',
      width: 2048,
      height: 1536,
      pins: [{ x: 50, y: 2.5, title: 'Lifted.', text: 'To the wing.' }],
      href: '?photo=3',
    });
    expect(photoView({ ...photo, width: 300, height: 200 })).toMatchObject({
      width: 300,
      height: 200,
    });
  });

  it('that is not ready or failed has no link, and says why', () => {
    expect(photoView({ ...photo, state: 'waiting' }, '?photo=3')).toMatchObject({
      state: 'preparing',
      href: undefined,
    });
    const failed = photoView({
      ...photo,
      state: 'failed',
      failedBecause: 'It is cut off.',
      caption: '',
    });
    expect(failed).toMatchObject({
      state: 'missing',
      note: 'It is cut off.',
      alt: 'Photo 3, not yet described',
    });
  });

  it('says of its time only what its camera said', () => {
    const facts = {
      id: 'p1',
      sha256: null,
      addedBy: null,
      receivedAt: new Date('2026-04-15T09:00:00Z'),
    };
    const when = (more: object) =>
      viewerPhotos([entry], [{ ...facts, takenAt: null, takenClock: null, ...more }], sight)[0]
        ?.when;
    expect(when({ takenAt: new Date('2026-04-15T08:44:00Z') })).toBe('Wed 15 April, 09:44');
    expect(when({ takenClock: '2026-04-15T09:44:10' })).toBe(
      '2026-04-15 09:44 by the camera’s clock, time zone unknown',
    );
    expect(when({})).toBe('added Wed 15 April, 10:00');
  });
});
