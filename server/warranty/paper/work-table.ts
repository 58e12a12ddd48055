import type { PaperFacts } from './paper-facts.ts';
import { drawRule } from './purfling.ts';
import { heightOf, putText } from './put-text.ts';
import { COLOUR, INNER, px } from './sheet.ts';
import { group, tag, type Doc, type Element } from './tagging.ts';
import { TYPE } from './type.ts';

/** Width of the column of covered work. */
export const WORK_WIDTH = px(324);
const MOST_NAME = px(110);
const GAP = px(12);
const PAD = px(6);

type Line = { text: string; name: string };

/** The lines that stand on the page: at most `most`, then how many more are in the file. */
export function workLines({ work }: PaperFacts, most: number): Line[] {
  const more = work.length - most;
  if (more <= 0) return work;
  return [...work.slice(0, most), { text: `and ${more} more, listed in the file`, name: '' }];
}

/** Widths of the two columns: names take what the longest needs, up to a third. */
function widths(doc: Doc, lines: Line[]): { text: number; name: number } {
  const { face, size } = TYPE.name;
  doc.font(face).fontSize(size);
  const longest = Math.max(...lines.map(({ name }) => doc.widthOfString(name)));
  const name = Math.min(longest + 1, MOST_NAME);
  return { name, text: WORK_WIDTH - name - GAP };
}

function rowHeight(doc: Doc, { text, name }: Line, width: { text: number; name: number }): number {
  const nameHeight = name === '' ? 0 : heightOf(doc, TYPE.name, name, width.name);
  return 2 * PAD + Math.max(heightOf(doc, TYPE.line, text, width.text), nameHeight);
}

/** Height of the heading above a column. */
export const HEADING = px(30);

/** The height of the table with its heading. */
export function workHeight(doc: Doc, lines: Line[]): number {
  const width = widths(doc, lines);
  return HEADING + lines.reduce((sum, line) => sum + rowHeight(doc, line, width), 0);
}

/** A heading with the line under it. */
export function drawHeading(
  doc: Doc,
  section: Element,
  text: string,
  { x, y, width }: { x: number; y: number; width: number },
): number {
  tag(doc, section, 'H2', () => putText(doc, TYPE.heading, text, { x, y, width }));
  drawRule(doc, x, y + HEADING - px(1), width, COLOUR.ink);
  return y + HEADING;
}

/** Draws the covered work with whoever did it. */
export function drawWork(doc: Doc, section: Element, lines: Line[], top: number): void {
  let y = drawHeading(doc, section, 'Covered work', { x: INNER.left, y: top, width: WORK_WIDTH });
  const table = group(doc, section, 'Table');
  const width = widths(doc, lines);
  for (const line of lines) {
    const row = group(doc, table, 'TR');
    const height = rowHeight(doc, line, width);
    const at = y + PAD;
    tag(doc, row, 'TD', () =>
      putText(doc, TYPE.line, line.text, { x: INNER.left, y: at, width: width.text }),
    );
    tag(doc, row, 'TD', () =>
      putText(doc, TYPE.name, line.name, {
        x: INNER.left + WORK_WIDTH - width.name,
        y: at,
        width: width.name,
        align: 'right',
      }),
    );
    y += height;
    drawRule(doc, INNER.left, y, WORK_WIDTH, COLOUR.line);
  }
}
