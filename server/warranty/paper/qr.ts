import { create } from 'qrcode';
import type { Doc } from './tagging.ts';
import { COLOUR } from './sheet.ts';

/**
 * Draws a QR code (ISO/IEC 18004), level M, as plain squares without its quiet zone: the caller leaves
 * four modules free about it.
 * @param size side of the code in points
 * @returns the side of one module, in points
 */
export function drawQr(doc: Doc, text: string, x: number, y: number, size: number): number {
  const { modules } = create(text, { errorCorrectionLevel: 'M' });
  const side = size / modules.size;
  const squares = Array.from(modules.data, (dark, at) => {
    const [row, column] = [Math.floor(at / modules.size), at % modules.size];
    return dark ? `M${column} ${row}h1v1h-1z` : '';
  });
  doc.save().translate(x, y).scale(side);
  doc.path(squares.join('')).fill(COLOUR.ink);
  doc.restore();
  return side;
}
