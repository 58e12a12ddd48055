import { inPlace } from './bad-reading.ts';
import { type About, type Band, bandByShare } from './figure.ts';
import { type PlainString, plainStringPull, type StringPull } from './plain-string.ts';
import { WOUND_BANDS, type WoundPull, type WoundString, woundStringPull } from './wound-string.ts';

export type SetString = ({ wound: false } & PlainString) | ({ wound: true } & WoundString);

export interface SetPull {
  /** In the order given. */
  each: (StringPull | WoundPull)[];
  totalN: number;
  /** ± 5 % cores known, ± 8 % any core assumed, ± 12 % any flat or layered wrap. */
  band: Band;
  coresAssumed: boolean;
  about: About;
}

/**
 * Pull of a set of strings, each and together, in N, at the pitches given; a capo or another tuning
 * changes it (see tensionAtPitchChange). Strings of a course each count.
 * @throws BadReading as for one string, with its place in front ("String 3. …")
 * Source: sum of the single pulls, computed; the band of the total is common practice.
 */
export function stringSetPull(strings: readonly SetString[]): SetPull {
  const each = strings.map((string, index) =>
    inPlace('strings', index, `String ${index + 1}`, () =>
      string.wound ? woundStringPull(string) : plainStringPull(string),
    ),
  );
  const totalN = each.reduce((sum, pull) => sum + pull.tensionN, 0);
  const coresAssumed = each.some((pull) => 'coreAssumed' in pull && pull.coreAssumed);
  return {
    each,
    totalN,
    band: bandByShare(totalN, totalShare(strings, coresAssumed)),
    coresAssumed,
    about: {
      formula: 'sum of T = μ (2 L f)² over the strings',
      basis: coresAssumed ? 'common practice' : 'computed',
      source: coresAssumed
        ? 'Ideal flexible strings; cores assumed at 0.42 of the gauge, common practice'
        : 'Ideal flexible strings; densities from memory',
    },
  };
}

function totalShare(strings: readonly SetString[], coresAssumed: boolean): number {
  const layered = strings.some(
    (string) => string.wound && (string.layers.length > 1 || string.layers.some((one) => one.flat)),
  );
  if (layered) return WOUND_BANDS.flatOrLayered;
  return coresAssumed ? WOUND_BANDS.coreAssumed : WOUND_BANDS.coreKnown;
}
