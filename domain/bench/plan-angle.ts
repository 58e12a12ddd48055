import { BadReading } from './bad-reading.ts';
import { type About, type Band, bandByAmount } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

/** Seen from above: x along the neck toward the head, y across, origin on the centre line at the slot's front edge. */
export interface Post {
  /** Post centre, mm. */
  xMm: number;
  yMm: number;
  /** Where the string winds, mm. */
  radiusMm: number;
}

/** Side of the post the string touches: toward lower or toward higher y. */
export type TouchingSide = 'low' | 'high';

export type HeadForm =
  /** Posts on both sides (3+3, 2+2, 4+4). */
  | { kind: 'two-sided' }
  /** All posts in line; the keys stand out on this side. */
  | { kind: 'one-sided'; keys: TouchingSide };

/**
 * Side of its post that a string touches: on two-sided heads the inner one, facing the centre line;
 * on one-sided heads the one away from the keys, whichever side of the centre line the post stands
 * on. Slotted heads have rollers across: use `slottedAngle`.
 * @throws BadReading `impossible` for a post of a two-sided head on the centre line itself
 * Source: common practice.
 */
export function touchingSide(head: HeadForm, postYMm: number): TouchingSide {
  if (head.kind === 'one-sided') return head.keys === 'high' ? 'low' : 'high';
  if (postYMm === 0) {
    throw new BadReading({
      code: 'impossible',
      field: 'acrossY',
      sentence:
        'Post: on a two-sided head no post stands on the centre line. Measure across from the centre line again.',
    });
  }
  return postYMm > 0 ? 'low' : 'high';
}

/** Away from the centre line, toward it, or along the neck. */
export type PlanDirection = 'outward' | 'inward' | 'straight';

export interface PlanAngle {
  /** To the neck, in the direction of y: positive turns toward higher y. */
  angleDeg: number;
  direction: PlanDirection;
  /** ± of rule and coordinates (±0.5 mm), degrees. */
  band: Band;
  /** Slot to where the string first touches, mm. */
  freeLengthMm: number;
  touchesAtMm: { x: number; y: number };
  about: About;
}

const ABOUT_PLAN: About = {
  formula: 'angle = atan2(sideways, along) ∓ asin(r / distance)',
  basis: 'computed',
  source:
    'Tangent from the slot to the post; that the slot aims there and not at the post’s middle is common practice, to ±2°',
};

/** Below this an angle is called straight: one decimal is shown. */
const STRAIGHT_DEG = 0.05;
const DEG = 180 / Math.PI;

/**
 * Plan angle of a nut slot: from the slot to the side of the post the string touches. D = distance to
 * the post's centre, ψ = atan2(y_p − y_s, x_p), δ = asin(r/D); low side ψ − δ, high side ψ + δ; free
 * length √(D² − r²).
 * The wrong side costs 2 asin(r/D): 8.6° at 40 mm, 4.6° at 75 mm.
 * @param slotYMm slot from the centre line, ±60 mm
 * @param post x 10 to 220, y ±60, r 1.5 to 6 mm
 * @throws BadReading outside these ranges, `impossible` when post and slot overlap
 * Source: plane geometry, computed. Band ±0.5 mm of the rule: ±0.6° at 45 mm, common practice.
 */
export function slotPlanAngle(slotYMm: number, post: Post, side: TouchingSide): PlanAngle {
  within('acrossY', slotYMm);
  within('postX', post.xMm);
  within('acrossY', post.yMm);
  within('postRadius', post.radiusMm);
  const sideways = post.yMm - slotYMm;
  const distance = Math.hypot(post.xMm, sideways);
  if (distance <= post.radiusMm) throw overlap(distance, post.radiusMm);
  const lean = Math.asin(post.radiusMm / distance);
  const angle = Math.atan2(sideways, post.xMm) + (side === 'low' ? -lean : lean);
  const freeLengthMm = Math.sqrt(distance ** 2 - post.radiusMm ** 2);
  return aimed(slotYMm, angle, freeLengthMm, distance);
}

/**
 * Plan angle for a slotted head, whose rollers lie across: the slot aims at the string's own place on
 * the roller.
 * @param rollerXMm top of the roller along the neck, mm  @param onRollerYMm the string on it, mm
 * @throws BadReading for a place out of range
 */
export function slottedAngle(slotYMm: number, rollerXMm: number, onRollerYMm: number): PlanAngle {
  within('acrossY', slotYMm);
  within('postX', rollerXMm);
  within('acrossY', onRollerYMm);
  const sideways = onRollerYMm - slotYMm;
  const distance = Math.hypot(rollerXMm, sideways);
  return aimed(slotYMm, Math.atan2(sideways, rollerXMm), distance, distance);
}

function aimed(slotY: number, angle: number, free: number, distance: number): PlanAngle {
  const angleDeg = angle * DEG;
  return {
    angleDeg,
    direction: directionOf(angleDeg, slotY),
    band: bandByAmount(angleDeg, Math.atan2(0.5, distance) * DEG),
    freeLengthMm: free,
    touchesAtMm: { x: free * Math.cos(angle), y: slotY + free * Math.sin(angle) },
    about: ABOUT_PLAN,
  };
}

function directionOf(angleDeg: number, slotY: number): PlanDirection {
  if (Math.abs(angleDeg) < STRAIGHT_DEG) return 'straight';
  // From the centre line itself every way leads outward.
  return slotY === 0 || Math.sign(angleDeg) === Math.sign(slotY) ? 'outward' : 'inward';
}

function overlap(distance: number, radius: number): BadReading {
  return new BadReading({
    code: 'impossible',
    field: 'postX',
    sentence: `Post: its middle is ${plainAmount(distance, 'mm')} from the slot and its radius ${plainAmount(radius, 'mm')}. Post overlaps the nut: check the coordinates.`,
  });
}
