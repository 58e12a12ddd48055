import { damaged, type Walk } from './feed.ts';
import { propertiesIn, sizesIn } from './heic-boxes.ts';
import type { SizeSeen } from './walk-photo.ts';

/** A `meta` box is held together to be read; phones write a few kilobytes. */
const MAX_META = 4_000_000;

const view = (bytes: Uint8Array) => new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);

/**
 * HEIC: the boxes on the first level, which must end exactly where the file does (ISO/IEC 14496-12
 * 4.2). The largest size among the properties is the picture's; the others are its tiles and thumbnail.
 */
export function* walkHeic(size: SizeSeen): Walk {
  let hasMeta = false;
  let hasData = false;
  for (;;) {
    const head = yield { take: 8, orEnd: true };
    if (head.length === 0) break;
    const type = String.fromCharCode(...head.subarray(4));
    let length = view(head).getUint32(0) - 8;
    // A last box without length reaches to the end of the file.
    const isOpen = length === 0 - 8;
    if (isOpen) length = Number.MAX_SAFE_INTEGER;
    else if (length === 1 - 8) length = Number(view(yield { take: 8 }).getBigUint64(0)) - 16;
    if (length < 0) throw damaged();

    if (type === 'mdat') hasData = true;
    if (type === 'meta') {
      if (hasMeta || length > MAX_META) throw damaged();
      hasMeta = true;
      const sizes = sizesIn(propertiesIn(yield { take: length }));
      const [largest] = sizes.sort((a, b) => b.width * b.height - a.width * a.height);
      if (largest === undefined) throw damaged();
      size(largest.width, largest.height);
    } else if (length > 0) {
      yield isOpen ? { pass: length, orEnd: true } : { pass: length };
    }
  }
  if (!hasMeta || !hasData) throw damaged();
}
