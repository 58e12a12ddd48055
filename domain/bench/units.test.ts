import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convert, quantityOf, type Unit } from './units.ts';

const PAIRS: [Unit, Unit][] = [
  ['mm', 'in'],
  ['mm', 'cm'],
  ['N', 'lbf'],
  ['MPa', 'lbf/in²'],
  ['MPa', 'kPa'],
  ['°C', '°F'],
];

describe('units', () => {
  it('come back unchanged from there and back', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...PAIRS),
        fc.double({ min: -1e5, max: 1e5, noNaN: true }),
        ([one, other], value) => {
          const back = convert(convert(value, one, other), other, one);
          expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(value)));
          expect(convert(value, one, one)).toBe(value);
          expect(quantityOf(one)).toBe(quantityOf(other));
        },
      ),
    );
  });

  it('are the defined ones', () => {
    expect(convert(1, 'in', 'mm')).toBe(25.4);
    expect(convert(1, 'lbf', 'N')).toBe(4.4482216152605);
    expect(convert(1, 'lbf/in²', 'kPa')).toBeCloseTo(6.894757293, 8);
    expect(convert(212, '°F', '°C')).toBeCloseTo(100, 9);
    expect(convert(-40, '°C', '°F')).toBeCloseTo(-40, 9);
  });

  it('do not mix', () => {
    expect(() => convert(1, 'mm', 'N')).toThrow(expect.objectContaining({ code: 'wrong-unit' }));
  });
});
