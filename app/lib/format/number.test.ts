import { expect, it } from 'vitest';
import { shortDigest, groupedDigest } from './digest.ts';
import { money } from './money.ts';
import { counted, countedInWords, decimal, percent, signed, withUnit } from './number.ts';
import { span, toGo } from './span.ts';

it('writes a true minus, and no sign on zero', () => {
  expect(decimal(-2)).toBe('\u22122');
  expect(decimal(-0.04, 1)).toBe('0.0');
  expect(signed(3)).toBe('+3');
  expect(signed(-1.25, 2)).toBe('\u22121.25');
  expect(signed(0)).toBe('0');
  expect(signed(-0.001, 1)).toBe('0.0');
});

it('binds a figure to its unit with a no-break space', () => {
  expect(withUnit(0.6, 'mm', 1)).toBe('0.6\u00a0mm');
  expect(withUnit('12\u201353', 'mm')).toBe('12\u201353\u00a0mm');
  expect(percent(41)).toBe('41\u00a0%');
});

it('counts in figures and in words', () => {
  expect(counted(1, 'entry', 'entries')).toBe('1\u00a0entry');
  expect(counted(4, 'entry', 'entries')).toBe('4\u00a0entries');
  expect(countedInWords(11, 'open case', 'open cases')).toBe('Eleven open cases');
  expect(countedInWords(13, 'open case', 'open cases')).toBe('13 open cases');
  expect(countedInWords(0, 'open case', 'open cases')).toBe('No open cases');
});

it('writes spans in the two units that matter, and rounds up', () => {
  const minute = 60_000;
  expect(span(35 * minute)).toBe('35\u00a0min');
  expect(span((19 * 60 + 35) * minute)).toBe('19\u00a0h 35\u00a0min');
  expect(span((2 * 60 + 5) * minute)).toBe('2\u00a0h 05\u00a0min');
  expect(span(24 * 60 * minute)).toBe('24\u00a0h');
  expect(span(66 * 60 * minute)).toBe('2\u00a0d 18\u00a0h');
  expect(span(1)).toBe('1\u00a0min');
  expect(span(60 * minute - 1)).toBe('1\u00a0h');
  expect(toGo(35 * minute)).toBe('35\u00a0min to go');
});

it('writes money from minor units, exactly', () => {
  // Minor units: ISO 4217 (GBP 2, JPY 0, KWD 3, HUF 2).
  expect(money({ minor: 34600n, currency: 'GBP' })).toBe('£346.00');
  expect(money({ minor: 5n, currency: 'GBP' })).toBe('£0.05');
  expect(money({ minor: 500n, currency: 'JPY' })).toBe('¥500');
  expect(money({ minor: 1234567890123456789n, currency: 'GBP' })).toBe(
    '£12,345,678,901,234,567.89',
  );
  expect(money({ minor: -15000n, currency: 'GBP' })).toBe('\u2212£150.00');
  expect(money({ minor: 1005n, currency: 'KWD' })).toContain('1.005');
  expect(money({ minor: 150n, currency: 'HUF' })).toContain('1.50');
});

it('shortens and groups digests', () => {
  const hex = '7cf2e2142f070ea199c592230bfe672a95d794e904cf2003342c29fccc86fe4e';
  expect(shortDigest(hex)).toBe('7cf2\u00a0e214');
  expect(groupedDigest(hex).split(' ')).toHaveLength(8);
  expect(groupedDigest(hex).replaceAll(' ', '')).toBe(hex);
});
