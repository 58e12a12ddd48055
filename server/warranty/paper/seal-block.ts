import { grouped, type PaperFacts } from './paper-facts.ts';
import { drawRule } from './purfling.ts';
import { putText } from './put-text.ts';
import { drawQr } from './qr.ts';
import { drawRosette } from './rosette.ts';
import { COLOUR, INNER, MM, px } from './sheet.ts';
import { decoration, group, tag, type Doc, type Element } from './tagging.ts';
import { TYPE, type Style } from './type.ts';
import { drawMark } from './witness-mark.ts';

/** The y of the line above the block; what is above it may reach so far. */
export const SEAL_TOP = px(882);

const ROSETTE = px(118);
const QR = 27 * MM;

type Fact = [label: string, value: string, style?: Style];

const factsOf = (facts: PaperFacts): Fact[] => [
  ['Signed', facts.signed],
  ['Shop’s key', grouped(facts.logKeyId), TYPE.digest],
  // Four groups to a line, so that it can be compared line by line.
  [
    'Seal value',
    `${grouped(facts.sealValue.slice(0, 32))}\n${grouped(facts.sealValue.slice(32))}`,
    TYPE.digest,
  ],
  ['Case file', facts.counts],
  ['Time', facts.stamp],
];

function drawFacts(doc: Doc, section: Element, facts: PaperFacts): void {
  const x = INNER.left + ROSETTE + px(22);
  let y = SEAL_TOP + px(16);
  decoration(doc, () => drawMark(doc, x, y - px(3), px(26), COLOUR.verdigris));
  y = tag(doc, section, 'P', () =>
    putText(doc, TYPE.sealed, 'Sealed and intact when issued', {
      x: x + px(34),
      y,
      width: px(330),
    }),
  );
  y += px(6);
  const table = group(doc, section, 'Table');
  for (const [label, value, style = TYPE.fact] of factsOf(facts)) {
    const row = group(doc, table, 'TR');
    const top = y;
    tag(doc, row, 'TH', () => putText(doc, TYPE.factLabel, label, { x, y: top, width: px(74) }), {
      scope: 'Row',
    } as object);
    y = tag(doc, row, 'TD', () =>
      putText(doc, style, value, { x: x + px(76), y: top, width: px(312) }),
    );
    y += px(1);
  }
}

/** Draws the foot of the first page: rosette, signature facts, seal value, QR code. */
export function drawSeal(doc: Doc, section: Element, facts: PaperFacts): void {
  drawRule(doc, INNER.left, SEAL_TOP, INNER.width, COLOUR.ink);
  const y = SEAL_TOP + px(18);
  tag(doc, section, 'Figure', () => drawRosette(doc, facts.sealValue, INNER.left, y, ROSETTE), {
    alt: 'Rosette drawn from the seal value',
    bbox: [INNER.left, y, INNER.left + ROSETTE, y + ROSETTE],
  });
  drawFacts(doc, section, facts);
  const x = INNER.right - QR;
  tag(doc, section, 'Figure', () => drawQr(doc, facts.qr, x, y, QR), {
    alt: 'QR code that opens the page where this warranty is checked',
    bbox: [x, y, x + QR, y + QR],
  });
  const foot = px(1045);
  tag(doc, section, 'P', () =>
    putText(
      doc,
      TYPE.foot,
      'The rosette is drawn from the seal value: change one figure and it changes.',
      {
        x: INNER.left,
        y: foot,
        width: px(400),
      },
    ),
  );
  tag(doc, section, 'P', () =>
    putText(doc, TYPE.foot, `Check this page at ${facts.address}`, {
      x: INNER.right - px(250),
      y: foot,
      width: px(250),
      align: 'right',
    }),
  );
}
