/**
 * Structure of the tagged PDF (ISO 32000-1, 14.7 and 14.8): what a screen reader is given, in order.
 */
export type Doc = PDFKit.PDFDocument;
export type Element = PDFKit.PDFStructureElement;

/** What a structure element says of itself; `bbox` is left, top, right, bottom in points. */
export type Says = PDFKit.Mixins.StructureElementOptions & {
  bbox?: [number, number, number, number];
  scope?: 'Row' | 'Column';
};

/** Adds a structure element that holds others. It is ended with its parent. */
export function group(doc: Doc, parent: Element, type: string): Element {
  const element = doc.struct(type);
  parent.add(element);
  return element;
}

/** Adds a structure element with the content that `draw` puts on the page, and returns what it does. */
export function tag<T>(
  doc: Doc,
  parent: Element,
  type: string,
  draw: () => T,
  options: Says = {},
): T {
  let drawn: T | undefined;
  // The content is drawn the moment the element is tied to the page.
  parent.add(doc.struct(type, options, () => void (drawn = draw())));
  return drawn as T;
}

/** Draws what is not content: lines, borders, grounds. */
export function decoration(doc: Doc, draw: () => void): void {
  doc.markContent('Artifact', { type: 'Layout' });
  draw();
  doc.endMarkedContent();
}
