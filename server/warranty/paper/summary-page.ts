import type { PaperFacts } from './paper-facts.ts';
import { drawHead } from './page-head.ts';
import { drawPair, pairFrame, PICTURE } from './photo-pair.ts';
import { drawRule } from './purfling.ts';
import { heightOf, putRuns, putText, type Run } from './put-text.ts';
import { drawSeal, SEAL_TOP } from './seal-block.ts';
import { COLOUR, INNER, px } from './sheet.ts';
import { tag, type Doc, type Element } from './tagging.ts';
import { termsInShort } from './terms.ts';
import { TYPE } from './type.ts';
import { drawHeading, drawWork, HEADING, WORK_WIDTH, workHeight, workLines } from './work-table.ts';

const TERMS_X = INNER.left + WORK_WIDTH + px(36);
const TERMS_WIDTH = INNER.right - TERMS_X;
const BETWEEN = px(18);
/** Covered lines on the page; the others are in the file. */
const MOST_LINES = 6;

function leadOf({ instrument, serial, owner, repaired, caseNumber }: PaperFacts): Run[] {
  return [
    { text: 'for the ' },
    { text: instrument, face: 'serif-strong' },
    ...(serial === null ? [] : [{ text: ', serial ' }, { text: serial, face: 'mono' as const }]),
    { text: ', belonging to ' },
    { text: owner, face: 'serif-strong' },
    { text: `. Repaired in this shop ${repaired} under case ${caseNumber}.` },
  ];
}

function claimOf({ shop }: PaperFacts): Run[][] {
  return [
    [
      { text: 'How to claim: ', face: 'sans-strong' },
      {
        text: `bring or send the instrument to ${shop.name}, ${shop.address}; telephone ${shop.telephone}.`,
      },
    ],
    [
      { text: 'Your rights by law stay as they are; this warranty is added to them. ' },
      { text: 'Terms in full on page 2.', face: 'sans-strong' },
    ],
  ];
}

const textOf = (runs: Run[]) => runs.map(({ text }) => text).join('');
const claimHeight = (doc: Doc, facts: PaperFacts) =>
  px(9) +
  claimOf(facts).reduce(
    (sum, runs) => sum + heightOf(doc, TYPE.claim, textOf(runs), INNER.width) + px(3),
    0,
  );
const termsHeight = (doc: Doc, terms: string[]) =>
  terms.reduce((sum, text) => sum + px(7) + heightOf(doc, TYPE.terms, text, TERMS_WIDTH), HEADING);

/** What fits between the lead and the seal: how many lines, which terms, how high the pictures. */
function fit(doc: Doc, facts: PaperFacts, top: number) {
  const room = SEAL_TOP - px(14) - claimHeight(doc, facts) - BETWEEN - top;
  const frame = facts.pair ? pairFrame(doc, facts.pair) + BETWEEN : 0;
  const short = termsInShort(facts);
  const wordings = [short, [...short.slice(0, 1), 'What it does not cover stands on page 2.']];
  for (const terms of wordings) {
    for (let most = MOST_LINES; most >= 1; most -= 1) {
      const lines = workLines(facts, most);
      const columns = Math.max(workHeight(doc, lines), termsHeight(doc, terms));
      const picture = Math.min(room - frame - columns, PICTURE.most);
      if (facts.pair ? picture >= PICTURE.least : columns <= room) {
        return { lines, terms, columns, picture: facts.pair ? picture : 0 };
      }
    }
  }
  throw new Error('The first page of the warranty has too much text.');
}

function drawClaim(doc: Doc, section: Element, facts: PaperFacts, top: number): void {
  drawRule(doc, INNER.left, top, INNER.width, COLOUR.line);
  let y = top + px(9);
  for (const runs of claimOf(facts)) {
    const at = y;
    y = tag(doc, section, 'P', () =>
      putRuns(doc, TYPE.claim, runs, { x: INNER.left, y: at, width: INNER.width }),
    );
    y += px(3);
  }
}

/** Draws the summary: one side, whatever the length of names and lines. */
export function drawSummary(doc: Doc, section: Element, facts: PaperFacts): void {
  const title = drawHead(doc, section, facts, 'Warranty summary');
  const lead = tag(doc, section, 'P', () =>
    putRuns(doc, TYPE.lead, leadOf(facts), { x: INNER.left, y: title + px(10), width: px(600) }),
  );
  let y = lead + BETWEEN;
  const { lines, terms, columns, picture } = fit(doc, facts, y);
  if (facts.pair) y = drawPair(doc, section, facts.pair, { y, picture }) + BETWEEN;
  drawWork(doc, section, lines, y);
  let below = drawHeading(doc, section, 'Terms', { x: TERMS_X, y, width: TERMS_WIDTH });
  for (const text of terms) {
    const at = below + px(7);
    below = tag(doc, section, 'P', () =>
      putText(doc, TYPE.terms, text, { x: TERMS_X, y: at, width: TERMS_WIDTH }),
    );
  }
  drawClaim(doc, section, facts, y + columns + BETWEEN);
  drawSeal(doc, section, facts);
}
