import type { Chunk } from './webp-chunks.ts';

/** The chunks of a PNG file in order (PNG 5.3), without their CRC. Stops at the first that does not fit. */
export function* pngChunksIn(file: Uint8Array): Generator<Chunk, void> {
  const view = new DataView(file.buffer, file.byteOffset, file.byteLength);
  let at = 8;
  while (at + 12 <= file.length) {
    const length = view.getUint32(at);
    if (at + 12 + length > file.length) return;
    const type = String.fromCharCode(...file.subarray(at + 4, at + 8));
    yield { type, body: file.subarray(at + 8, at + 8 + length) };
    at += 12 + length;
  }
}
