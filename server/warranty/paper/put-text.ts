import type { Style } from './type.ts';

export interface Place {
  x: number;
  y: number;
  width: number;
  align?: 'left' | 'right';
}

/** A run of text in one face within a paragraph. */
export interface Run {
  text: string;
  face?: Style['face'];
}

function set(doc: PDFKit.PDFDocument, { face, size, leading, colour }: Style): number {
  doc.font(face).fontSize(size).fillColor(colour);
  return size * leading - doc.currentLineHeight(false);
}

/** The height a text takes in a style, in points. */
export function heightOf(
  doc: PDFKit.PDFDocument,
  style: Style,
  text: string,
  width: number,
): number {
  const lineGap = set(doc, style);
  return doc.heightOfString(text, { width, lineGap });
}

/** Puts a text at a place and returns the y below it. The caller has opened a structure for it. */
export function putText(
  doc: PDFKit.PDFDocument,
  style: Style,
  text: string,
  { x, y, width, align = 'left' }: Place,
): number {
  const lineGap = set(doc, style);
  doc.text(text, x, y, { width, lineGap, align, characterSpacing: style.spacing ?? 0 });
  return doc.y;
}

/** Puts a paragraph of several faces and returns the y below it. */
export function putRuns(
  doc: PDFKit.PDFDocument,
  style: Style,
  runs: Run[],
  { x, y, width }: Place,
): number {
  runs.forEach(({ text, face = style.face }, at) => {
    const lineGap = set(doc, { ...style, face });
    const continued = at < runs.length - 1;
    if (at === 0) doc.text(text, x, y, { width, lineGap, continued });
    else doc.text(text, { width, lineGap, continued });
  });
  return doc.y;
}
