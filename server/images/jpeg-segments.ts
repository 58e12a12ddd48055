/** One segment of a JPEG file before its coded data. */
export interface Segment {
  marker: number;
  body: Uint8Array;
}

/** The segments from SOI to the first SOS (ITU-T T.81 B.1.1.4). Stops at the first that does not fit. */
export function* segmentsIn(file: Uint8Array): Generator<Segment, void> {
  let at = 2;
  while (at + 4 <= file.length && file[at] === 0xff) {
    const marker = file[at + 1] ?? 0;
    if (marker === 0xff) {
      at += 1;
      continue;
    }
    const length = ((file[at + 2] ?? 0) << 8) | (file[at + 3] ?? 0);
    if (marker === 0xda || length < 2 || at + 2 + length > file.length) return;
    yield { marker, body: file.subarray(at + 4, at + 2 + length) };
    at += 2 + length;
  }
}
