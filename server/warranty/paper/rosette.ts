import type { Doc } from './tagging.ts';
import { COLOUR } from './sheet.ts';

const CENTRE = 50;
const STEP = (2 * Math.PI) / 64;

const point = (radius: number, angle: number) =>
  `${(CENTRE + radius * Math.cos(angle)).toFixed(2)},${(CENTRE + radius * Math.sin(angle)).toFixed(2)}`;

function bar(inner: number, height: number, angle: number): string {
  const half = 0.3 * STEP;
  return [
    `M${point(inner, angle - half)}`,
    `L${point(inner + height, angle - half)}`,
    `L${point(inner + height, angle + half)}`,
    `L${point(inner, angle + half)}Z`,
  ].join('');
}

function ring(inner: number, step: number, digits: number[]): string {
  return digits
    .map((digit, at) => {
      const angle = (2 * at + 0.5) * STEP - Math.PI / 2;
      const left = bar(inner, step * (1 + (digit >> 2)), angle);
      return left + bar(inner, step * (1 + (digit & 3)), angle + STEP);
    })
    .join('');
}

const CIRCLES = [
  [49, 0.5],
  [47.6, 1.1],
  [46.2, 0.5],
  [34.8, 0.5],
  [33.6, 1],
  [22.8, 0.5],
  [21.6, 1.1],
  [20.2, 0.5],
] as const;

/** The bars of a rosette as one SVG path in a box of 100: two rings of 32 digits, two bars a digit. */
export function rosettePath(sealValue: string): string {
  const digits = [...sealValue].map((digit) => parseInt(digit, 16));
  return ring(36.2, 2.15, digits.slice(0, 32)) + ring(24.2, 2, digits.slice(32));
}

/** Draws the rosette of a seal value (64 hex digits) into a square of `size` points. */
export function drawRosette(doc: Doc, sealValue: string, x: number, y: number, size: number): void {
  doc
    .save()
    .translate(x, y)
    .scale(size / 100);
  doc.strokeColor(COLOUR.verdigris);
  for (const [radius, width] of CIRCLES) {
    doc.lineWidth(width).circle(CENTRE, CENTRE, radius).stroke();
  }
  doc.path(rosettePath(sealValue)).fill(COLOUR.verdigris);
  doc.restore();
}
