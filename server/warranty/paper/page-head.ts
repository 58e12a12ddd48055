import type { PaperFacts } from './paper-facts.ts';
import { drawPurfling } from './purfling.ts';
import { putText } from './put-text.ts';
import { INNER, px } from './sheet.ts';
import { tag, type Doc, type Element } from './tagging.ts';
import { TYPE } from './type.ts';

/** Draws border, shop and number of a page, and its title. Returns the y below the title. */
export function drawHead(doc: Doc, section: Element, facts: PaperFacts, title: string): number {
  drawPurfling(doc);
  const left = { x: INNER.left, width: px(430) };
  const right = { x: px(522), width: px(200), align: 'right' as const };
  const below = tag(doc, section, 'P', () => {
    const y = putText(doc, TYPE.shop, facts.shop.name, { ...left, y: INNER.top });
    return putText(doc, TYPE.place, facts.shop.place, { ...left, y: y + px(2) });
  });
  tag(doc, section, 'P', () => {
    const y = putText(doc, TYPE.label, 'Warranty number', { ...right, y: INNER.top + px(6) });
    putText(doc, TYPE.code, facts.code, { ...right, y });
  });
  return tag(doc, section, 'H1', () =>
    putText(doc, TYPE.title, title, { x: INNER.left, y: below + px(20), width: INNER.width }),
  );
}
