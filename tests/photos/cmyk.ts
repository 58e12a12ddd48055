const segment = (marker: number, ...body: number[]) => [
  ...[0xff, marker, 0, body.length + 2],
  ...body,
];

/**
 * A CMYK JPEG of 8 by 8 px in one middle grey, as printers' programs make them (ITU-T T.81 annex B,
 * with Adobe's APP14): every coefficient is zero.
 */
export function cmykJpeg(): Buffer {
  const parts = [1, 2, 3, 4];
  const counts = [1, ...Array<number>(15).fill(0)];
  return Buffer.from([
    ...[0xff, 0xd8],
    ...segment(0xee, ...Buffer.from('Adobe'), 0, 100, 0, 0, 0, 0, 0),
    ...segment(0xdb, 0, ...Array<number>(64).fill(1)),
    ...segment(0xc0, 8, 0, 8, 0, 8, 4, ...parts.flatMap((id) => [id, 0x11, 0])),
    // One code each, of one bit: difference nothing, and end of block.
    ...segment(0xc4, 0x00, ...counts, 0),
    ...segment(0xc4, 0x10, ...counts, 0),
    ...segment(0xda, 4, ...parts.flatMap((id) => [id, 0]), 0, 63, 0),
    ...[0x00, 0xff, 0xd9],
  ]);
}
