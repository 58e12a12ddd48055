import type { PaperFacts, PaperPicture } from './paper-facts.ts';
import { heightOf, putRuns } from './put-text.ts';
import { COLOUR, INNER, px } from './sheet.ts';
import { decoration, tag, type Doc, type Element } from './tagging.ts';
import { TYPE } from './type.ts';

const MAT = px(12);
const WIDTH = px(278);
const BEYOND = px(70);
/** The mock-up's frame, 10 : 7; a page with much text may take it down to the least. */
export const PICTURE = { most: WIDTH * 0.7, least: px(120) };

const HALF = 'M44.500 21V38.500L7 50A2.200 2.200 0 0 1 5.400 45.800Z';

const captionOf = (word: string, { day, caption }: PaperPicture) => `${word}, ${day}. ${caption}`;

/** What the pair takes beside its pictures: mat and captions. */
export function pairFrame(doc: Doc, { before, after }: NonNullable<PaperFacts['pair']>): number {
  const heights = [captionOf('Before', before), captionOf('After', after)].map((text) =>
    heightOf(doc, TYPE.caption, text, WIDTH - px(8)),
  );
  return MAT + px(10) + Math.max(...heights) + MAT;
}

function drawPicture(doc: Doc, picture: PaperPicture, x: number, y: number, height: number): void {
  const edge = (grown: number, colour: string) =>
    doc.rect(x - grown, y - grown, WIDTH + 2 * grown, height + 2 * grown).fill(colour);
  edge(px(4), COLOUR.spruceEdge);
  edge(px(3), COLOUR.bevel);
  edge(px(1), COLOUR.spruceEdge);
  doc.save().rect(x, y, WIDTH, height).clip();
  doc.image(picture.jpeg, x, y, { cover: [WIDTH, height], align: 'center', valign: 'center' });
  doc.restore();
}

/** Draws both pictures on one mat with the joint between them. Returns the y below. */
export function drawPair(
  doc: Doc,
  section: Element,
  pair: NonNullable<PaperFacts['pair']>,
  { y, picture }: { y: number; picture: number },
): number {
  const height = pairFrame(doc, pair) + picture;
  const middle = INNER.left + INNER.width / 2;
  decoration(doc, () => {
    doc.rect(INNER.left, y, INNER.width, height).fill(COLOUR.spruce);
    doc.lineWidth(0.9).strokeColor(COLOUR.ink);
    doc
      .moveTo(middle, y)
      .lineTo(middle, y + height)
      .stroke();
    doc
      .save()
      .translate(middle - px(33), y + MAT + picture / 2 - px(21))
      .scale((0.75 * 66) / 96);
    doc.path(HALF).fill(COLOUR.ink);
    doc
      .rotate(180, { origin: [48, 30] })
      .path(HALF)
      .fill(COLOUR.ink);
    doc.restore();
  });
  const sides = [
    ['Before', pair.before, INNER.left + MAT],
    ['After', pair.after, INNER.left + MAT + WIDTH + BEYOND],
  ] as const;
  for (const [word, shown, x] of sides) {
    const alt = captionOf(word, shown);
    const bbox = [x, y + MAT, x + WIDTH, y + MAT + picture] as [number, number, number, number];
    tag(doc, section, 'Figure', () => drawPicture(doc, shown, x, y + MAT, picture), { alt, bbox });
    tag(doc, section, 'Caption', () =>
      putRuns(
        doc,
        TYPE.caption,
        [{ text: `${word}, ${shown.day}. `, face: 'sans-strong' }, { text: shown.caption }],
        { x, y: y + MAT + picture + px(10), width: WIDTH - px(8) },
      ),
    );
  }
  return y + height;
}
