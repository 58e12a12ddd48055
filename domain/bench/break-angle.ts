import type { About, Warning } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

const DEG = 180 / Math.PI;

/** Headstock seen from the side, with the plane of the fret tops level. */
export interface HeadSide {
  /** Headstock against the fingerboard plane, 0 to 25°. */
  headstockAngleDeg: number;
  /** Slot to where the string touches the post, along the face, 20 to 220 mm. */
  slotToPostMm: number;
  /** Slot bottom above the face carried on to the nut, mm. */
  slotAboveFaceMm: number;
  /** String above the face at its post, mm. */
  stringAboveFaceMm: number;
}

/**
 * Place of the string at its post seen from the slot, mm: x toward the head, z up.
 * X = x_h cos θ + (h_p − h_n) sin θ, Z = −x_h sin θ + (h_p − h_n) cos θ.
 * @throws BadReading for a size out of range
 * Source: rotation by the headstock angle, computed.
 */
export function stringAtPost(head: HeadSide): { xMm: number; zMm: number } {
  const angle = within('headstockAngle', head.headstockAngleDeg) / DEG;
  const along = within('slotToPost', head.slotToPostMm);
  const rise =
    within('aboveFace', head.stringAboveFaceMm) - within('aboveFace', head.slotAboveFaceMm);
  return {
    xMm: along * Math.cos(angle) + rise * Math.sin(angle),
    zMm: -along * Math.sin(angle) + rise * Math.cos(angle),
  };
}

/**
 * Break angle in degrees seen from the side, against the fingerboard plane: atan(−Z/X).
 * @throws BadReading for a size out of range
 */
export function sideBreakAngle(head: HeadSide): number {
  const { xMm, zMm } = stringAtPost(head);
  return Math.atan2(-zMm, xMm) * DEG;
}

export interface BreakAngle {
  /** Seen from the side. */
  elevationDeg: number;
  /** In space, with the sideways turn: what presses the string into its slot and rubs. */
  totalDeg: number;
  contactMm: { x: number; z: number };
  warnings: Warning[];
  about: About;
}

export interface BreakAngleInput extends HeadSide {
  /** Slot and place of contact at the post, across from the centre line, mm. */
  slotYMm: number;
  contactYMm: number;
  /** Saddle from the slot: x negative (behind), y across from the centre line, z above the slot bottom, mm. */
  saddleMm: { x: number; y: number; z: number };
}

const ABOUT_BREAK: About = {
  formula: 'angle between string before and after the slot',
  basis: 'computed',
  source: 'Vectors; the working band of 6 to 17° is common practice',
};

/** Total break angles that work, degrees: common practice. */
export const BREAK_ANGLE_BAND_DEG = [6, 17] as const;

/**
 * Break angle over the nut: from the side, and the whole angle between saddle → slot and
 * slot → contact at the post.
 * Warns below 5° and above 20°, and says when it is outside the working band of 6 to 17°.
 * @throws BadReading for a size out of range
 * Source: vectors, computed; band common practice. Headstock angle ±0.5°.
 */
export function breakAngle(input: BreakAngleInput): BreakAngle {
  const post = stringAtPost(input);
  const slotY = within('acrossY', input.slotYMm);
  const contactY = within('acrossY', input.contactYMm);
  within('scale', -input.saddleMm.x);
  const before = [-input.saddleMm.x, slotY - input.saddleMm.y, -input.saddleMm.z] as const;
  const after = [post.xMm, contactY - slotY, post.zMm] as const;
  const dot = before[0] * after[0] + before[1] * after[1] + before[2] * after[2];
  const totalDeg = Math.acos(dot / (Math.hypot(...before) * Math.hypot(...after))) * DEG;
  return {
    elevationDeg: Math.atan2(-post.zMm, post.xMm) * DEG,
    totalDeg,
    contactMm: { x: post.xMm, z: post.zMm },
    warnings: breakWarnings(totalDeg),
    about: ABOUT_BREAK,
  };
}

/** What a total break angle calls for; empty from 6 to 17°. Common practice. */
export function breakWarnings(totalDeg: number): Warning[] {
  const [low, high] = BREAK_ANGLE_BAND_DEG;
  if (totalDeg >= low && totalDeg <= high) return [];
  const said = `Break angle ${plainAmount(Number(totalDeg.toFixed(1)), '°')}`;
  if (totalDeg < 5) {
    return [
      {
        code: 'shallow',
        sentence: `${said}: the string may rattle in the slot. Wind lower on the post or fit a string tree.`,
      },
    ];
  }
  if (totalDeg > 20) {
    return [
      {
        code: 'steep',
        sentence: `${said}: the slot binds; watch the return to pitch. Wind higher on the post and ease the back of the slot.`,
      },
    ];
  }
  return [
    {
      code: 'outside-band',
      sentence: `${said} is outside the usual ${low} to ${high}°. Watch how the string sits and returns to pitch.`,
    },
  ];
}
