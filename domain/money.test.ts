import { describe, expect, it } from 'vitest';
import { decimalAmount, readAmount } from './money.ts';

describe('money', () => {
  it('is written from minor units without a float', () => {
    expect(decimalAmount({ minor: 61680n, currency: 'GBP' })).toBe('616.80');
    expect(decimalAmount({ minor: 5n, currency: 'GBP' })).toBe('0.05');
    expect(decimalAmount({ minor: -5n, currency: 'GBP' })).toBe('-0.05');
    expect(decimalAmount({ minor: 500n, currency: 'JPY' })).toBe('500');
    expect(decimalAmount({ minor: 9007199254740993n, currency: 'KWD' })).toBe('9007199254740.993');
  });

  it.each([
    ['616.80', 'GBP', 61680n],
    ['616,8', 'GBP', 61680n],
    ['1 200', 'GBP', 120000n],
    ['0', 'GBP', 0n],
    ['500', 'JPY', 500n],
    ['1,234', 'KWD', 1234n],
  ])('reads %s %s', (typed, currency, minor) => {
    expect(readAmount(typed, currency)).toEqual({ minor });
  });

  it.each([
    ['1,200', 'GBP', 'may be thousands or decimals'],
    ['1.234', 'GBP', 'has 2 decimals'],
    ['5.00', 'JPY', 'has no decimals'],
    ['-5', 'GBP', 'is no amount'],
    ['1e9', 'GBP', 'is no amount'],
    ['NaN', 'GBP', 'is no amount'],
    ['', 'GBP', 'is no amount'],
    ['99999999999999', 'GBP', 'is more than can be billed here'],
  ])('refuses %j %s', (typed, currency, words) => {
    const read = readAmount(typed, currency);
    expect('sentence' in read && read.sentence).toContain(words);
  });
});
