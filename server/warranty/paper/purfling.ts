import { COLOUR, px } from './sheet.ts';
import { decoration, type Doc } from './tagging.ts';

// Two lines about the page whose corners run out to a point, as the inlaid edge of a violin does.
const OUTER =
  'M20 0H698Q714 0 728 -10Q718 4 718 20V1027Q718 1043 728 1057Q714 1047 698 1047H20Q4 1047 -10 1057Q0 1043 0 1027V20Q0 4 -10 -10Q4 0 20 0Z';
const INNER =
  'M25 5H693Q709 5 718.5 -0.5Q713 9 713 25V1022Q713 1038 718.5 1047.5Q709 1042 693 1042H25Q9 1042 -0.5 1047.5Q5 1038 5 1022V25Q5 9 -0.5 -0.5Q9 5 25 5Z';

/** Draws the border of a page, 6.5 mm from its edge. */
export function drawPurfling(doc: Doc): void {
  decoration(doc, () => {
    doc.save().translate(px(38), px(38)).scale(0.75);
    doc.lineWidth(1.7).lineJoin('round').strokeColor(COLOUR.ink);
    doc.path(OUTER).stroke();
    doc.path(INNER).stroke();
    doc.restore();
  });
}

/** A straight line across, from `x` on. */
export function drawRule(doc: Doc, x: number, y: number, width: number, colour: string): void {
  decoration(doc, () => {
    doc.lineWidth(0.75).strokeColor(colour);
    doc
      .moveTo(x, y)
      .lineTo(x + width, y)
      .stroke();
  });
}
