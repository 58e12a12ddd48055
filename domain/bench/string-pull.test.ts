import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { noteFrequency } from './pitch.ts';
import { plainStringPull } from './plain-string.ts';
import { type SetString, stringSetPull } from './string-set.ts';
import { tensionAtPitchChange } from './string-tension.ts';
import { ASSUMED_CORE_SHARE, helixMassPerLength, woundStringPull } from './wound-string.ts';

const gauge = fc.double({ min: 0.15, max: 1, noNaN: true });
const woundGauge = fc.double({ min: 0.4, max: 3.6, noNaN: true });
const scale = fc.double({ min: 200, max: 1050, noNaN: true });
const note = fc.integer({ min: 24, max: 70 });

const d3 = { scaleMm: 647.7, frequencyHz: noteFrequency(50) };

describe('pull of a plain string', () => {
  it('grows with gauge, scale and pitch, each by its square', () => {
    fc.assert(
      fc.property(gauge, scale, note, (diameterMm, scaleMm, midi) => {
        fc.pre(diameterMm * 1.2 <= 1);
        const string = { diameterMm, scaleMm, frequencyHz: noteFrequency(midi) };
        const { tensionN } = plainStringPull(string);
        const thicker = plainStringPull({ ...string, diameterMm: diameterMm * 1.2 });
        const longer = plainStringPull({ ...string, scaleMm: scaleMm * 1.04 });
        const octave = plainStringPull({ ...string, frequencyHz: string.frequencyHz * 2 });
        expect(thicker.tensionN / tensionN).toBeCloseTo(1.44, 9);
        expect(longer.tensionN / tensionN).toBeCloseTo(1.0816, 9);
        expect(octave.tensionN / tensionN).toBeCloseTo(4, 9);
        expect(tensionAtPitchChange(tensionN, 1200) / octave.tensionN).toBeCloseTo(1, 9);
      }),
    );
  });

  it('carries ±2 % and twice the share of the micrometer', () => {
    const { tensionN, band } = plainStringPull({ ...d3, diameterMm: 0.2794 });
    expect(band.high / tensionN - 1).toBeCloseTo(0.02 + 0.0358, 4);
    expect(band.low).toBeLessThan(tensionN);
  });

  it('warns near the breaking pitch of steel, and of gut never by that figure', () => {
    const high = { diameterMm: 0.33, scaleMm: 647.7, frequencyHz: noteFrequency(69) };
    const codes = (string: Parameters<typeof plainStringPull>[0]) =>
      plainStringPull(string).warnings.map((warning) => warning.code);
    expect(codes(high)).toContain('near-breaking');
    expect(codes({ ...high, frequencyHz: noteFrequency(64) })).toEqual([]);
    expect(codes({ ...high, material: 'gut' })).toEqual([]);
  });

  it('falls by 10.9 % with one semitone down', () => {
    expect(tensionAtPitchChange(100, -100)).toBeCloseTo(89.09, 2);
  });

  it('refuses what is no plain string', () => {
    expect(() => plainStringPull({ ...d3, diameterMm: 1.2 })).toThrow('is it wound?');
    expect(() => plainStringPull({ ...d3, scaleMm: 0, diameterMm: 0.3 })).toThrow('mm or inches');
  });
});

describe('pull of a wound string', () => {
  it('lies between the plain wire of its core and a solid rod of its gauge', () => {
    fc.assert(
      fc.property(woundGauge, fc.double({ min: 0.38, max: 0.9, noNaN: true }), (outerMm, share) => {
        const coreMm = Math.min(1.8, share * outerMm);
        const { massPerLengthKgM } = woundStringPull({ ...d3, coreMm, layers: [{ outerMm }] });
        const rod = (diameter: number) => 7850e-6 * (Math.PI / 4) * diameter ** 2;
        expect(massPerLengthKgM).toBeGreaterThan(rod(coreMm));
        expect(massPerLengthKgM).toBeLessThan(rod(outerMm));
      }),
    );
  });

  it('is 0 to 1.5 % lighter than the true helix for cores as strings have them', () => {
    fc.assert(
      fc.property(woundGauge, fc.double({ min: 0.38, max: 0.5, noNaN: true }), (outerMm, share) => {
        const coreMm = share * outerMm;
        const { massPerLengthKgM } = woundStringPull({ ...d3, coreMm, layers: [{ outerMm }] });
        const helix = helixMassPerLength(coreMm, outerMm, 7850, 7900);
        expect(helix).toBeGreaterThan(massPerLengthKgM);
        expect(helix / massPerLengthKgM - 1).toBeLessThan(0.015);
      }),
    );
  });

  it('of two layers is that of one when both are of one metal', () => {
    const one = woundStringPull({ ...d3, coreMm: 0.4, layers: [{ outerMm: 1.2 }] });
    const two = woundStringPull({
      ...d3,
      coreMm: 0.4,
      layers: [{ outerMm: 0.8 }, { outerMm: 1.2 }],
    });
    expect(two.tensionN).toBeCloseTo(one.tensionN, 9);
    expect(two.band.high / two.tensionN).toBeCloseTo(1.12, 9);
    expect(one.band.high / one.tensionN).toBeCloseTo(1.05, 9);
  });

  it('says when the core was assumed, and prints the wider band', () => {
    const assumed = woundStringPull({ ...d3, coreMm: null, layers: [{ outerMm: 1 }] });
    expect(assumed).toMatchObject({ coreAssumed: true, coreMm: ASSUMED_CORE_SHARE });
    expect(assumed.about.basis).toBe('common practice');
    expect(assumed.band.low / assumed.tensionN).toBeCloseTo(0.92, 9);
  });

  it('counts a hexagon of the core by its flats', () => {
    // 0.4 mm across flats: 0.8660 × 0.16 mm² of steel, corners on a circle of 0.4619 mm.
    const hex = woundStringPull({ ...d3, coreMm: 0.4, hexCore: true, layers: [{ outerMm: 1 }] });
    const ring = (Math.PI / 4) ** 2 * (1 - (0.8 / Math.sqrt(3)) ** 2) * 7900e-6;
    expect(hex.massPerLengthKgM).toBeCloseTo((Math.sqrt(3) / 2) * 0.16 * 7850e-6 + ring, 9);
  });

  it('refuses a core as thick as the string and a gauge too thin to be wound', () => {
    const layers = [{ outerMm: 0.7 }] as const;
    expect(() => woundStringPull({ ...d3, coreMm: 0.7, layers })).toThrow('cannot be thicker');
    expect(() => woundStringPull({ ...d3, coreMm: null, layers: [{ outerMm: 0.35 }] })).toThrow(
      'Too thin to be wound, is it plain?',
    );
  });
});

describe('pull of a set', () => {
  const plain: SetString = { wound: false, ...d3, diameterMm: 0.3 };
  const wound: SetString = { wound: true, ...d3, coreMm: 0.4, layers: [{ outerMm: 1 }] };

  it('is the sum, in any order, and grows with scale', () => {
    fc.assert(
      fc.property(fc.array(gauge, { minLength: 1, maxLength: 12 }), (gauges) => {
        const set = gauges.map((diameterMm): SetString => ({ ...plain, diameterMm }));
        const { totalN, each } = stringSetPull(set);
        expect(each).toHaveLength(gauges.length);
        expect(stringSetPull([...set].reverse()).totalN).toBeCloseTo(totalN, 6);
        const longer = set.map((string): SetString => ({ ...string, scaleMm: 660 }));
        expect(stringSetPull(longer).totalN).toBeGreaterThan(totalN);
      }),
    );
  });

  it('has ±5 % with cores known, ±8 % with one assumed, ±12 % with a flat wrap', () => {
    const share = (set: SetString[]) => {
      const { band, totalN } = stringSetPull(set);
      return band.high / totalN - 1;
    };
    expect(share([plain, wound])).toBeCloseTo(0.05, 9);
    expect(share([plain, { ...wound, coreMm: null }])).toBeCloseTo(0.08, 9);
    expect(share([plain, { ...wound, layers: [{ outerMm: 1, flat: true }] }])).toBeCloseTo(0.12, 9);
  });

  it('names the string it refuses', () => {
    expect(() => stringSetPull([plain, { ...plain, diameterMm: 11 }])).toThrow(
      expect.objectContaining({ field: 'strings.1.plainGauge', code: 'out-of-range' }),
    );
  });
});
