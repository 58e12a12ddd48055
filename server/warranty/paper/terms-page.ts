import { grouped, type PaperFacts } from './paper-facts.ts';
import { drawHead } from './page-head.ts';
import { drawRule } from './purfling.ts';
import { heightOf, putRuns, putText } from './put-text.ts';
import { COLOUR, INNER, PAGE, px } from './sheet.ts';
import { group, tag, type Doc, type Element } from './tagging.ts';
import { termsInFull } from './terms.ts';
import { TYPE } from './type.ts';

const TEXT_X = INNER.left + px(186);
const TEXT_WIDTH = INNER.right - TEXT_X;
const PAD = px(13);
const FOOT = px(992);

function drawFoot(doc: Doc, section: Element, facts: PaperFacts, page: number): void {
  drawRule(doc, INNER.left, FOOT, INNER.width, COLOUR.ink);
  const lines = [
    ['Signed', facts.signed],
    ['Shop’s key', grouped(facts.logKeyId)],
    ['Seal value', 'as on page 1; it covers all pages'],
  ] as const;
  let y = FOOT + px(12);
  for (const [label, value] of lines) {
    const at = y;
    y = tag(doc, section, 'P', () => {
      putText(doc, TYPE.factLabel, label, { x: INNER.left, y: at, width: px(74) });
      const style = label === 'Shop’s key' ? TYPE.digest : TYPE.fact;
      return putText(doc, style, value, { x: INNER.left + px(76), y: at, width: px(430) });
    });
  }
  tag(doc, section, 'P', () =>
    putText(doc, TYPE.foot, `Page ${page}`, {
      x: INNER.right - px(100),
      y: FOOT + px(48),
      width: px(100),
      align: 'right',
    }),
  );
}

/** Draws the terms in full, on as many pages as they take: two by the shipped wording. */
export function drawTerms(doc: Doc, root: Element, facts: PaperFacts): void {
  let page = 1;
  let section = root;
  const begin = (title: string) => {
    doc.addPage({ size: [PAGE.width, PAGE.height], margin: 0 });
    page += 1;
    section = group(doc, root, 'Sect');
    return drawHead(doc, section, facts, title);
  };
  const title = begin('Terms in full');
  let y = tag(doc, section, 'P', () =>
    putRuns(
      doc,
      TYPE.lead,
      [
        { text: 'Limited warranty on the repair of the ' },
        { text: facts.instrument, face: 'serif-strong' },
        {
          text: `${facts.serial === null ? '' : `, serial ${facts.serial}`}, case ${facts.caseNumber}.`,
        },
      ],
      { x: INNER.left, y: title + px(10), width: px(600) },
    ),
  );
  y += px(18);
  drawRule(doc, INNER.left, y, INNER.width, COLOUR.ink);
  for (const { heading, text } of termsInFull(facts)) {
    const height = heightOf(doc, TYPE.termsInFull, text, TEXT_WIDTH);
    if (y + 2 * PAD + height > FOOT) {
      drawFoot(doc, section, facts, page);
      y = begin('Terms in full, continued') + px(18);
    }
    const at = y + PAD;
    tag(doc, section, 'H2', () =>
      putText(doc, TYPE.heading, heading, { x: INNER.left, y: at, width: px(170) }),
    );
    const below = tag(doc, section, 'P', () =>
      putText(doc, TYPE.termsInFull, text, { x: TEXT_X, y: at, width: TEXT_WIDTH }),
    );
    y = below + PAD;
    drawRule(doc, INNER.left, y, INNER.width, COLOUR.line);
  }
  drawFoot(doc, section, facts, page);
}
