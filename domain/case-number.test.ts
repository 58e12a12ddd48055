import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatCaseNumber, formatOrdinal, parseCaseNumber } from './case-number.ts';

describe('case number', () => {
  it('is written with three digits at least', () => {
    expect(formatCaseNumber({ year: 2026, ordinal: 31 })).toBe('2026-031');
    expect(formatCaseNumber({ year: 2026, ordinal: 1204 })).toBe('2026-1204');
    expect(formatOrdinal(7)).toBe('007');
  });

  it('reads back what it wrote', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1000, max: 9999 }),
        fc.integer({ min: 1, max: 999_999 }),
        (year, ordinal) => {
          expect(parseCaseNumber(formatCaseNumber({ year, ordinal }))).toEqual({ year, ordinal });
        },
      ),
    );
  });

  it.each([
    '',
    '2026',
    '2026-31',
    '2026-0031',
    '2026-000',
    '26-031',
    '2026-031 ',
    '2026-03x',
    '02026-031',
    '2026-031/1',
    '2026-９01',
  ])('refuses %j', (text) => {
    expect(parseCaseNumber(text)).toBeNull();
  });
});
