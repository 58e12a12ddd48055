const view = (bytes: Uint8Array) => new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);

/** One box of an ISO base media file: its four-letter type and what is in it. */
export interface Box {
  type: string;
  body: Uint8Array;
}

/** The boxes in `bytes`, one after the other (ISO/IEC 14496-12 4.2). Stops at the first that does not fit. */
export function* boxesIn(bytes: Uint8Array): Generator<Box, void> {
  let at = 0;
  while (at + 8 <= bytes.length) {
    const length = view(bytes).getUint32(at);
    if (length < 8 || at + length > bytes.length) return;
    const type = String.fromCharCode(...bytes.subarray(at + 4, at + 8));
    yield { type, body: bytes.subarray(at + 8, at + length) };
    at += length;
  }
}

/** The item properties (`iprp`/`ipco`) of the body of a `meta` box (ISO/IEC 23008-12 9.3.1). */
export function propertiesIn(meta: Uint8Array): Box[] {
  const found: Box[] = [];
  // `meta` begins with four bytes of version and flags.
  for (const { type, body } of boxesIn(meta.subarray(4))) {
    if (type !== 'iprp') continue;
    for (const inner of boxesIn(body)) {
      if (inner.type === 'ipco') found.push(...boxesIn(inner.body));
    }
  }
  return found;
}

/** Sizes given by the `ispe` properties: the picture, its tiles, its thumbnail. */
export function sizesIn(properties: Box[]): { width: number; height: number }[] {
  return properties
    .filter(({ type, body }) => type === 'ispe' && body.length >= 12)
    .map(({ body }) => ({ width: view(body).getUint32(4), height: view(body).getUint32(8) }));
}
