import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BadReading } from './bad-reading.ts';
import { comparisonWarnings, inchWarning } from './compare-readings.ts';
import { readGauge } from './gauge-reading.ts';
import { readReading, type ReadAs } from './reading.ts';
import { fieldOf, type FieldId, within } from './within.ts';

const MM: ReadAs = { unit: 'mm', decimal: '.' };
const INCH: ReadAs = { unit: 'in', decimal: '.' };
const COMMA: ReadAs = { unit: 'mm', decimal: ',' };
const PERCENT: ReadAs = { unit: '%', decimal: '.' };

function refusal(text: string, id: FieldId, as: ReadAs): BadReading {
  try {
    readReading(text, id, as);
  } catch (error) {
    if (error instanceof BadReading) return error;
    throw error;
  }
  throw new Error(`${text} was accepted`);
}

describe('what is read', () => {
  it.each([
    ['647.7', 'scale', MM, 647.7],
    ['25.5', 'scale', INCH, 647.7],
    ['25.5 in', 'scale', MM, 647.7],
    ['25½"', 'scale', MM, 647.7],
    ['25 1/2 in', 'scale', MM, 647.7],
    ['64,77 cm', 'scale', COMMA, 647.7],
    ['647,7', 'scale', MM, 647.7],
    ['5/64', 'action', INCH, 1.984375],
    ['−0,15', 'relief', COMMA, -0.15],
    ['.011', 'plainGauge', INCH, 0.2794],
    [',28', 'plainGauge', COMMA, 0.28],
    ['0,279', 'plainGauge', MM, 0.279],
    ['45%', 'humidity', PERCENT, 45],
    ['45\u00a0%', 'humidity', PERCENT, 45],
    ['68 °F', 'temperature', { unit: '°C', decimal: '.' }, 20],
    ['20 lbf', 'stringPull', { unit: 'N', decimal: '.' }, 88.96443],
    ['+3', 'centsError', { unit: 'cents', decimal: '.' }, 3],
  ] as [string, FieldId, ReadAs, number][])('%s as %s', (text, id, as, value) => {
    expect(readReading(text, id, as).value).toBeCloseTo(value, 5);
  });

  it('keeps what was typed and the error of the tool', () => {
    expect(readReading(' 647.7 ', 'scale', MM)).toEqual({
      value: 647.7,
      typed: '647.7',
      error: 0.3,
    });
  });

  it('is the same number with a comma or a point', () => {
    fc.assert(
      fc.property(fc.integer({ min: 2000, max: 11000 }), (tenths) => {
        const text = (tenths / 10).toFixed(1);
        const point = readReading(text, 'scale', MM).value;
        expect(readReading(text.replace('.', ','), 'scale', COMMA).value).toBe(point);
        expect(point).toBe(tenths / 10);
      }),
    );
  });
});

describe('what is refused, and what was meant', () => {
  it.each([
    // An 11 is .011 in; a gauge in mm typed where inches stand; a point in the wrong place.
    ['11', 'plainGauge', INCH, 0.2794, '.011 in, which is 0.2794 mm'],
    ['11', 'plainGauge', MM, 0.2794, '.011 in, which is 0.2794 mm'],
    ['0.11', 'plainGauge', INCH, 0.2794, '0.011 in, which is 0.2794 mm'],
    ['46', 'woundGauge', INCH, 1.1684, '.046 in, which is 1.1684 mm'],
    ['25.5', 'scale', MM, 647.7, '25.5 in, which is 647.7 mm'],
    ['647.7', 'scale', INCH, 647.7, '647.7 mm'],
    ['6477', 'scale', MM, 647.7, '647.7 mm'],
    ['64.77', 'scale', MM, 647.7, '64.77 cm, which is 647.7 mm'],
    ['12', 'radius', MM, 304.8, '12 in, which is 304.8 mm'],
    ['5', 'action', INCH, 1.984375, '5/64 in, which is 1.9844 mm'],
    ['80', 'action', INCH, 2.032, '.08 in, which is 2.032 mm'],
    ['10', 'relief', MM, 0.254, '.01 in, which is 0.254 mm'],
    ['130', 'humidity', PERCENT, 30, '30 %'],
    ['0.45', 'humidity', PERCENT, 45, '45 %'],
    ['455', 'humidity', PERCENT, 45.5, '45.5 %'],
    ['68', 'temperature', { unit: '°C', decimal: '.' }, 20, '68 °F, which is 20 °C'],
    ['4400', 'a4', { unit: 'Hz', decimal: '.' }, 440, '440 Hz'],
  ] as [string, FieldId, ReadAs, number, string][])('%s as %s', (text, id, as, value, words) => {
    const bad = refusal(text, id, as);
    expect(bad.code).toBe('out-of-range');
    expect(bad.field).toBe(id);
    expect(bad.meant?.value).toBeCloseTo(value, 5);
    expect(bad.meant?.words).toBe(words);
    expect(bad.sentence).toContain(`Probably meant: ${words}.`);
  });

  it.each([
    ['', 'empty', 'Scale length: nothing was typed.'],
    ['  ', 'empty', 'nothing was typed'],
    ['long', 'not-a-number', 'long is not a number'],
    ['NaN', 'not-a-number', 'NaN is not a number'],
    ['Infinity', 'not-a-number', 'Infinity is not a number'],
    ['1e3', 'not-a-number', '1e3 is not a number'],
    ['6 4 7', 'not-a-number', '6 4 7 is not a number'],
    ['1/0', 'not-a-number', '1/0 is not a number'],
    ['647.7 N', 'wrong-unit', 'has N behind the number'],
    ['647.7 hands', 'wrong-unit', 'has hands behind the number'],
    ['25 1/2', 'wrong-unit', 'is a fraction, and millimetres are written with decimals'],
    ['0', 'out-of-range', '0 mm is outside 200 to 1100 mm'],
    ['-647.7', 'out-of-range', 'outside 200 to 1100 mm'],
  ])('%s with its reason', (text, code, words) => {
    const bad = refusal(text, 'scale', MM);
    expect(bad.code).toBe(code);
    expect(bad.sentence).toContain(words);
    expect(bad.sentence).toMatch(/^Scale length: .*\.$/);
    expect(bad.fields).toEqual({ scale: bad.sentence });
  });

  it('says what to measure again', () => {
    expect(refusal('0', 'scale', MM).sentence).toBe(
      'Scale length: 0 mm is outside 200 to 1100 mm. Check units: mm or inches? Measure from the front edge of the nut to the 12th fret and double it.',
    );
    expect(refusal('0', 'scale', MM).range).toEqual({ min: 200, max: 1100, unit: 'mm' });
    expect(refusal('-0.5', 'action', MM).sentence).toContain('it touches there');
  });

  it('leaves thousands and decimals to the person when both can be meant', () => {
    const open = refusal('1,234', 'wholeString', MM);
    expect(open.code).toBe('which-decimal');
    expect(open.meant).toEqual({ value: 1234, words: '1234 mm' });
    expect(refusal('1.234,5', 'wholeString', COMMA).meant?.value).toBe(1234.5);
    expect(readReading('1.234', 'action', MM).value).toBe(1.234);
    const unclear = refusal('3,125', 'woodWidth', MM);
    expect(unclear.meant?.value).toBe(3.125);
    expect(refusal('1,000', 'jointForce', { unit: 'N', decimal: '.' }).meant).toBeUndefined();
  });

  it('takes a fraction without a unit for inches and asks', () => {
    expect(refusal('5/64', 'action', MM).meant).toEqual({
      value: 1.984375,
      words: '5/64 in, which is 1.9844 mm',
    });
    expect(refusal('1/2', 'scale', MM).meant).toBeUndefined();
  });

  it('offers nothing when nothing fits', () => {
    expect(refusal('99999', 'plainGauge', MM).meant).toBeUndefined();
  });
});

describe('string gauges', () => {
  it('read the letter behind them', () => {
    expect(readGauge('.024w', INCH)).toMatchObject({ wound: true, typed: '.024w' });
    expect(readGauge('.016p', INCH).wound).toBe(false);
    expect(readGauge('.024 wound', INCH).value).toBeCloseTo(0.6096, 9);
    expect(readGauge('.024', INCH).wound).toBeNull();
    expect(readGauge('.024', INCH, true).wound).toBe(true);
  });

  it('ask whether it is plain or wound', () => {
    expect(() => readGauge('.012w', INCH)).toThrow('Too thin to be wound, is it plain?');
    expect(() => readGauge('.052p', INCH)).toThrow('is it wound?');
  });
});

describe('fields', () => {
  const ids: FieldId[] = ['scale', 'gauge', 'relief', 'humidity', 'temperature', 'acrossY', 'fret'];

  it('accept both ends and refuse a little beyond, in words that name them', () => {
    for (const id of ids) {
      const { min, max, label } = fieldOf(id);
      const beyond = (max - min) * 1e-6;
      expect(within(id, min)).toBe(min);
      expect(within(id, max)).toBe(max);
      expect(() => within(id, min - beyond)).toThrow(label);
      expect(() => within(id, max + beyond)).toThrow(label);
      for (const value of [NaN, Infinity, -Infinity]) {
        expect(() => within(id, value)).toThrow(expect.objectContaining({ code: 'not-a-number' }));
      }
    }
  });

  it('never offer a meaning they would refuse', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...ids),
        fc.double({ min: -1e5, max: 1e5, noNaN: true }),
        (id, value) => {
          try {
            expect(within(id, value)).toBe(value);
          } catch (error) {
            if (!(error instanceof BadReading)) throw error;
            if (error.meant) expect(within(id, error.meant.value)).toBe(error.meant.value);
          }
        },
      ),
    );
  });
});

describe('readings side by side', () => {
  const before = { tuning: 'E A D G B E', a4Hz: 440, humidityPct: 45 };

  it('warn of another tuning, another reference and other air', () => {
    const codes = (after: Partial<typeof before>) =>
      comparisonWarnings(before, { ...before, ...after }).map((warning) => warning.code);
    expect(codes({})).toEqual([]);
    expect(codes({ tuning: 'D A D G B E' })).toEqual(['other-tuning']);
    expect(codes({ a4Hz: 415 })).toEqual(['other-tuning']);
    expect(codes({ humidityPct: 56 })).toEqual(['other-humidity']);
    expect(codes({ humidityPct: 55 })).toEqual([]);
    expect(comparisonWarnings({ ...before, humidityPct: null }, before)).toEqual([]);
  });

  it('ask when one of them looks like inches', () => {
    expect(inchWarning('Action', 2, 0.0787)?.sentence).toContain('25.4 to one');
    expect(inchWarning('Action', 0.08, 2.03)?.code).toBe('inches');
    expect(inchWarning('Action', 2, 1.6)).toBeNull();
  });
});
