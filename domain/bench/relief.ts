import type { About } from './figure.ts';
import { fretPosition } from './fret-positions.ts';
import { within } from './within.ts';

const ABOUT_RELIEF: About = {
  formula: '4r (S − x12)/S − 4r ((xj − x12)/xj)²',
  basis: 'computed',
  source:
    'Model: the neck is held at the body joint and bends in one arc. Real necks bend unevenly: measure again, never book the prediction',
};

/**
 * What a change of relief does to the action at the 12th fret, mm: the neck is held at the joint
 * fret, bends in one arc, and the nut rises four times the relief (r is the sag of the chord).
 * +0.10 mm of relief is about +0.2 mm of action.
 * @param scaleMm 200 to 1100 mm
 * @param jointFret where neck meets body, 12 or further
 * @param reliefChangeMm after less before, −1 to 3 mm; less relief is minus
 * @throws BadReading outside these ranges
 * Source: a model, computed; no published source. No band: it is for choosing a direction.
 */
export function reliefEffect(
  scaleMm: number,
  jointFret: number,
  reliefChangeMm: number,
): { actionChangeMm: number; about: About } {
  within('jointFret', jointFret);
  within('relief', reliefChangeMm);
  const twelfth = fretPosition(scaleMm, 12);
  const joint = fretPosition(scaleMm, jointFret);
  const rise = 4 * reliefChangeMm;
  const actionChangeMm =
    (rise * (scaleMm - twelfth)) / scaleMm - rise * ((joint - twelfth) / joint) ** 2;
  return { actionChangeMm, about: ABOUT_RELIEF };
}
