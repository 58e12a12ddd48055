import { describe, expect, it } from 'vitest';
import { waitAtTemperature } from '#domain/wait-at-temperature.ts';
import values from './check-values/waiting-times.json';

/** Source of the rule and of its values: beside each case (common practice, arithmetic only). */
describe('a wait at another temperature', () => {
  it.each(values.cases)('$id', ({ inputs, expected, tolerance }) => {
    const label = {
      hours: inputs.label_hours,
      labelTemperature: inputs.label_temp_c,
      minimum: null,
    };
    const wait = waitAtTemperature(label, inputs.actual_temp_c);
    if (wait.kind !== 'wait') return expect.unreachable();
    // The values are printed with nine digits, so their own rounding is the least difference.
    const within = (value: number) =>
      Math.max(tolerance.rel * value, 10 ** (Math.floor(Math.log10(value)) - 8));
    expect(Math.abs(wait.reckoned - expected.hours)).toBeLessThanOrEqual(within(expected.hours));
    expect(Math.abs(wait.used - expected.used_hours)).toBeLessThanOrEqual(
      within(expected.used_hours),
    );
  });

  const glue = { hours: 24, labelTemperature: 20, minimum: 10 };

  it('is refused below the minimum of the label, not reckoned', () => {
    expect(waitAtTemperature(glue, 9.9)).toEqual({
      kind: 'refused',
      sentence:
        '9.9\u00a0°C is too cold for this product: its label says 10\u00a0°C or more. Warm the parts or wait.',
    });
    expect(waitAtTemperature(glue, 10)).toEqual({ kind: 'wait', reckoned: 48, used: 48 });
  });

  it('is refused above 35 °C', () => {
    expect(waitAtTemperature(glue, 35).kind).toBe('wait');
    expect(waitAtTemperature(glue, 35.1).kind).toBe('refused');
  });
});
