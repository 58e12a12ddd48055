import { damaged, type Walk } from './feed.ts';
import type { SizeSeen } from './walk-photo.ts';

const EOI = 0xd9;
const SOS = 0xda;

/** Frame headers SOF0 to SOF15 without DHT (c4), JPG (c8) and DAC (cc). */
const isFrame = (marker: number) =>
  marker >= 0xc0 && marker <= 0xcf && ![0xc4, 0xc8, 0xcc].includes(marker);

/** Markers that stand alone: TEM, RST0 to RST7, SOI. */
const isAlone = (marker: number) => marker === 0x01 || (marker >= 0xd0 && marker <= 0xd8);

const u16 = (bytes: Uint8Array, at: number) => ((bytes[at] ?? 0) << 8) | (bytes[at + 1] ?? 0);

/**
 * JPEG from SOI to EOI, marker by marker (ITU-T T.81 annex B). Coded data is only looked at for its
 * markers; what follows EOI (further pictures of a phone) is left alone.
 */
export function* walkJpeg(size: SizeSeen): Walk {
  yield { take: 2 };
  let frames = 0;
  let scans = 0;
  for (;;) {
    yield 'to next ff';
    let marker = (yield { take: 1 })[0] ?? 0;
    while (marker === 0xff) marker = (yield { take: 1 })[0] ?? 0;
    // Zero after 0xff is a byte of coded data.
    if (marker === 0 || isAlone(marker)) continue;
    if (marker === EOI) break;

    const length = u16(yield { take: 2 }, 0) - 2;
    if (length < 0) throw damaged();
    if (isFrame(marker)) {
      if (length < 6) throw damaged();
      const frame = yield { take: 6 };
      size(u16(frame, 3), u16(frame, 1));
      frames += 1;
      if (length > 6) yield { pass: length - 6 };
      continue;
    }
    if (marker === SOS) scans += 1;
    if (length > 0) yield { pass: length };
  }
  if (frames === 0 || scans === 0) throw damaged();
}
