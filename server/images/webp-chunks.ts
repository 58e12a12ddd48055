/** One chunk of a WebP file: its four letters and its bytes without padding. */
export interface Chunk {
  type: string;
  body: Uint8Array;
}

/** The chunks of a WebP file in order (RFC 9649 2.3). Stops at the first that does not fit. */
export function* chunksIn(file: Uint8Array): Generator<Chunk, void> {
  const view = new DataView(file.buffer, file.byteOffset, file.byteLength);
  let at = 12;
  while (at + 8 <= file.length) {
    const length = view.getUint32(at + 4, true);
    if (at + 8 + length > file.length) return;
    const type = String.fromCharCode(...file.subarray(at, at + 4));
    yield { type, body: file.subarray(at + 8, at + 8 + length) };
    at += 8 + length + (length % 2);
  }
}

/** A WebP file of these chunks. */
export function webpOf(chunks: Chunk[]): Buffer {
  const parts = chunks.flatMap(({ type, body }) => {
    const head = Buffer.alloc(8);
    head.write(type, 'latin1');
    head.writeUInt32LE(body.length, 4);
    return [head, body, Buffer.alloc(body.length % 2)];
  });
  const content = Buffer.concat([Buffer.from('WEBP'), ...parts]);
  const riff = Buffer.alloc(8);
  riff.write('RIFF', 'latin1');
  riff.writeUInt32LE(content.length, 4);
  return Buffer.concat([riff, content]);
}
