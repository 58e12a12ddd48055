import { grouped, type PaperFacts } from './paper-facts.ts';
import { drawHead } from './page-head.ts';
import { drawRule } from './purfling.ts';
import { heightOf, putRuns, putText } from './put-text.ts';
import { COLOUR, INNER, PAGE, px } from './sheet.ts';
import { group, tag, type Doc, type Element } from './tagging.ts';
import { termsInFull, type Section } from './terms.ts';
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

const CONTINUED = (heading: string) => `${heading.replace(/, continued$/, '')}, continued`;

/** What of a text fits into a height, whole words, and what is left; a short text is not split. */
function splitAt(doc: Doc, text: string, height: number): [now: string, rest: string] {
  const fits = (words: string[]) =>
    heightOf(doc, TYPE.termsInFull, words.join(' '), TEXT_WIDTH) <= height;
  const words = text.split(' ');
  if (fits(words)) return [text, ''];
  if (words.length < 120) return ['', text];
  let [least, most] = [0, words.length];
  while (most - least > 1) {
    const middle = (least + most) >> 1;
    if (fits(words.slice(0, middle))) least = middle;
    else most = middle;
  }
  return [words.slice(0, least).join(' '), words.slice(least).join(' ')];
}

function drawPiece(doc: Doc, section: Element, { heading, text }: Section, y: number): number {
  const at = y + PAD;
  tag(doc, section, 'H2', () =>
    putText(doc, TYPE.heading, heading, { x: INNER.left, y: at, width: px(170) }),
  );
  const below = tag(doc, section, 'P', () =>
    putText(doc, TYPE.termsInFull, text, { x: TEXT_X, y: at, width: TEXT_WIDTH }),
  );
  drawRule(doc, INNER.left, below + PAD, INNER.width, COLOUR.line);
  return below + PAD;
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
  const pieces = termsInFull(facts);
  for (let piece = pieces.shift(); piece; piece = pieces.shift()) {
    const { heading, text } = piece;
    const [now, rest] = splitAt(doc, text, FOOT - y - 2 * PAD);
    if (rest !== '')
      pieces.unshift({ heading: now === '' ? heading : CONTINUED(heading), text: rest });
    if (now !== '') y = drawPiece(doc, section, { heading, text: now }, y);
    if (rest !== '') {
      drawFoot(doc, section, facts, page);
      y = begin('Terms in full, continued') + px(18);
    }
  }
  drawFoot(doc, section, facts, page);
}
