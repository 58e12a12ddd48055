import { describe, expect, it } from 'vitest';
import { minorUnitDigits } from '#domain/money.ts';
import values from './check-values/minor-units.json';

/** Source beside each case: ISO 4217 list one. */
describe('decimals of a currency', () => {
  it.each(values.cases)('$id', ({ inputs, expected }) => {
    expect(minorUnitDigits(inputs.currency)).toBe(expected.minor_unit_digits);
  });
  it('refuses a code that is not on the list', () => {
    expect(() => minorUnitDigits('XYZ')).toThrow(RangeError);
  });
});
