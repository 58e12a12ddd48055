import type { About } from './figure.ts';
import { within } from './within.ts';

const ABOUT_FRICTION: About = {
  formula: 'T2/T1 = e^(μ φ)',
  basis: 'from memory',
  source: 'Capstan friction, from memory; μ of 0.1 to 0.3 is assumed',
};

export interface NutFriction {
  /** Largest pull on one side of the slot over the other before it slips. */
  tensionRatio: number;
  /** The most cents a string may hang before it slips. */
  hangCents: number;
  about: About;
}

/**
 * How far a string can hang in its slot: T2/T1 = e^(μφ), up to 600 log2 of that in cents. μ 0.2 and
 * 15° give 45 cents. An upper bound, not a forecast.
 * @param friction μ, 0 to 1; assumed 0.1 to 0.3  @param angleDeg total break angle, 0 to 45°
 * @throws BadReading outside these ranges
 * Source: capstan equation, from memory.
 */
export function nutFriction(friction: number, angleDeg: number): NutFriction {
  within('friction', friction);
  within('breakAngle', angleDeg);
  const exponent = (friction * angleDeg * Math.PI) / 180;
  return {
    tensionRatio: Math.exp(exponent),
    hangCents: (600 * exponent) / Math.LN2,
    about: ABOUT_FRICTION,
  };
}
