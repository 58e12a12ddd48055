import { describe, expect, it } from 'vitest';
import { addMonths, clockIn, readClock, warrantyTerm } from '#domain/calendar.ts';
import values from './check-values/calendar.json';

/** Source beside each case: several calendar libraries that agree, IANA time zones. */
type Case = (typeof values.cases)[number];
const of = (computation: string) => values.cases.filter((one) => one.computation === computation);
const text = (record: object, key: string) => String((record as Record<string, unknown>)[key]);
const instant = (record: object, key: string) => new Date(text(record, key));

describe('adding months', () => {
  const cases = of('date.add_months').filter(({ inputs }) => 'months' in inputs);
  it.each(cases)('$id', ({ inputs, expected }: Case) => {
    expect(addMonths(text(inputs, 'start'), Number(text(inputs, 'months')))).toBe(
      text(expected, 'date'),
    );
  });
  it('adds all at once; one by one gives another day', () => {
    const [one] = of('date.add_months').filter(({ inputs }) => 'months_once' in inputs);
    if (!one) return expect.unreachable();
    const start = text(one.inputs, 'start');
    expect(addMonths(start, 2)).toBe(text(one.expected, 'once'));
    expect(addMonths(addMonths(start, 1), 1)).toBe(text(one.expected, 'chained'));
  });
});

describe('an instant by the clock of a zone', () => {
  it.each(of('date.zone'))('$id', ({ inputs, expected }: Case) => {
    expect(clockIn(instant(inputs, 'instant'), text(inputs, 'zone'))).toBe(text(expected, 'local'));
  });
});

describe('a clock time that happens twice or never', () => {
  it.each(of('date.local_to_instant'))('$id', ({ inputs, expected }: Case) => {
    const meaning = readClock(text(inputs, 'local'), text(inputs, 'zone'));
    const earlier = instant(expected, 'earlier');
    // The values give no name to the two kinds; a skipped time is read back as another clock time.
    const skipped = !clockIn(earlier, text(inputs, 'zone')).startsWith(text(inputs, 'local'));
    expect(meaning).toEqual(
      skipped
        ? { kind: 'never' }
        : { kind: 'twice', first: earlier, second: instant(expected, 'later') },
    );
  });
  it('is read at once where it happens once', () => {
    expect(readClock('2026-07-01T13:00', 'Europe/London')).toEqual({
      kind: 'one',
      at: new Date('2026-07-01T12:00:00Z'),
    });
    expect(() => readClock('2026-02-30T10:00', 'Europe/London')).toThrow(RangeError);
  });
});

describe('the end of a warranty', () => {
  it.each(of('date.warranty_end'))('$id', ({ inputs, expected }: Case) => {
    const months = Number(text(inputs, 'months'));
    expect(
      warrantyTerm(instant(inputs, 'completed_instant'), text(inputs, 'zone'), months),
    ).toEqual({
      startsOn: text(expected, 'start_date_in_zone'),
      lastDay: text(expected, 'last_covered_date'),
      endsAt: instant(expected, 'end_exclusive_instant'),
    });
  });
});
