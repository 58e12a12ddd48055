import { describe, expect, it } from 'vitest';
import { EntrySchema } from './entry-draft.ts';
import type { Invalid } from './errors.ts';
import { parseInput } from './input.ts';

const draft = {
  title: 'Bridge reglued on its marks',
  text: 'Dry run first.',
  benchNote: '',
  used: ['Hot hide glue, 192 gram strength', ' '],
  temperature: '21',
  humidity: '48,5',
  minutes: '45',
  occurredClock: '',
  rest: { product: 'Hot hide glue', clampsOffHours: '24', workedHours: '24', stringsHours: '48' },
};
const entry = { phase: 'during', visibility: 'shared', draft, photos: [] };

const fields = (change: object) => {
  try {
    parseInput(EntrySchema, { ...entry, draft: { ...draft, ...change } });
  } catch (error) {
    return (error as Invalid).fields;
  }
  return {};
};

describe('an entry as typed', () => {
  it('keeps the digits as read, with a decimal point', () => {
    expect(parseInput(EntrySchema, entry).draft).toEqual({
      ...draft,
      used: ['Hot hide glue, 192 gram strength'],
      humidity: '48.5',
      minutes: 45,
      occurredClock: null,
      expected: [],
    });
  });

  it('reads what it has kept itself', () => {
    const kept = parseInput(EntrySchema, entry);
    expect(parseInput(EntrySchema, JSON.parse(JSON.stringify(kept)))).toEqual(kept);
  });

  it('needs a title and nothing else', () => {
    expect(fields({ title: ' ' })).toHaveProperty(['draft.title']);
    expect(parseInput(EntrySchema, { ...entry, draft: { title: 'Looked over' } }).draft).toEqual({
      title: 'Looked over',
      text: '',
      benchNote: '',
      used: [],
      temperature: null,
      humidity: null,
      minutes: null,
      occurredClock: null,
      rest: null,
      expected: [],
    });
  });

  it.each([
    [
      { temperature: '210' },
      'draft.temperature',
      '210\u00a0°C is outside \u22121 to 50\u00a0°C. Measure again.',
    ],
    [
      { temperature: 'warm' },
      'draft.temperature',
      '“warm” cannot be read as a temperature. Write a figure such as 21.',
    ],
    [{ humidity: '3' }, 'draft.humidity', '3\u00a0% is outside 5 to 95\u00a0%. Measure again.'],
    [
      { humidity: '1,200' },
      'draft.humidity',
      '“1.200” cannot be read as a humidity. Write a figure such as 21.',
    ],
    [{ minutes: '1.5' }, 'draft.minutes', 'The time worked cannot be read. Write whole minutes.'],
    [
      { minutes: '2000' },
      'draft.minutes',
      'More than a day in one entry. Write the minutes of this entry alone.',
    ],
    [
      { occurredClock: 'yesterday' },
      'draft.occurredClock',
      'This is no date and time. Choose both, or leave it empty for now.',
    ],
    [
      { text: 'x'.repeat(8001) },
      'draft.text',
      'The note has 8001 characters; 8000 is the most. Shorten it.',
    ],
  ])('refuses %j', (change, field, sentence) => {
    expect(fields(change)).toEqual({ [field]: sentence });
  });

  it.each([
    [{ clampsOffHours: null, workedHours: '', stringsHours: null }, 'draft.rest.workedHours'],
    [{ clampsOffHours: '24', workedHours: '2', stringsHours: null }, 'draft.rest.workedHours'],
    [{ clampsOffHours: '24', workedHours: null, stringsHours: '2' }, 'draft.rest.stringsHours'],
    [{ clampsOffHours: null, workedHours: '48', stringsHours: '24' }, 'draft.rest.stringsHours'],
    [{ clampsOffHours: '-4', workedHours: null, stringsHours: null }, 'draft.rest.clampsOffHours'],
    [
      { clampsOffHours: '99999', workedHours: null, stringsHours: null },
      'draft.rest.clampsOffHours',
    ],
    [
      { product: '', clampsOffHours: '24', workedHours: null, stringsHours: null },
      'draft.rest.product',
    ],
  ])('refuses the rest %j', (rest, field) => {
    expect(Object.keys(fields({ rest: { ...draft.rest, ...rest } }))).toEqual([field]);
  });

  it('takes as many as a hundred photos', () => {
    const photo = {
      photoId: '0199c4a2-7f00-7000-8000-000000000001',
      caption: '<script>',
      visibility: 'bench',
    };
    const photos = Array.from({ length: 100 }, () => photo);
    expect(parseInput(EntrySchema, { ...entry, photos }).photos).toHaveLength(100);
    expect(() => parseInput(EntrySchema, { ...entry, photos: [...photos, photo] })).toThrow(
      'A hundred photos',
    );
  });
});
