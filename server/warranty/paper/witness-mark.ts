import type { Doc } from './tagging.ts';

const HALF = 'M10.4 10.55V14.6L1.75 17.05A.62.62 0 0 1 1.3 15.9Z';

/** Draws the witness mark, aligned, into a square of `size` points. */
export function drawMark(doc: Doc, x: number, y: number, size: number, colour: string): void {
  doc
    .save()
    .translate(x, y)
    .scale(size / 24);
  doc.lineWidth(1).strokeColor(colour).moveTo(12, 1).lineTo(12, 23).stroke();
  doc.path(HALF).fill(colour);
  doc.rotate(180, { origin: [12, 12] });
  doc.path(HALF).fill(colour);
  doc.restore();
}
