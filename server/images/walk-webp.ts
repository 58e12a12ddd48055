import { Unsupported } from '#domain/errors.ts';
import { damaged, type Walk } from './feed.ts';
import type { SizeSeen } from './walk-photo.ts';

const ANIMATION = 0x02;

const u16 = (bytes: Uint8Array, at: number) => (bytes[at] ?? 0) | ((bytes[at + 1] ?? 0) << 8);
const u24 = (bytes: Uint8Array, at: number) => u16(bytes, at) | ((bytes[at + 2] ?? 0) << 16);
const u32 = (bytes: Uint8Array, at: number) => u16(bytes, at) + u16(bytes, at + 2) * 0x10000;

/** How many bytes of each chunk tell the size. */
const LOOKED_AT: Record<string, number> = { 'VP8 ': 10, VP8L: 5, VP8X: 10 };

/** The size in a VP8 key frame (RFC 6386 9.1), a VP8L header or a VP8X header (RFC 9649 2.7, 3.4). */
function sizeIn(type: string, head: Uint8Array): [width: number, height: number] {
  if (type === 'VP8X') return [u24(head, 4) + 1, u24(head, 7) + 1];
  if (type === 'VP8L') {
    if (head[0] !== 0x2f) throw damaged();
    const bits = u32(head, 1);
    return [(bits & 0x3fff) + 1, ((bits >>> 14) & 0x3fff) + 1];
  }
  if (u24(head, 3) !== 0x2a019d) throw damaged();
  return [u16(head, 6) & 0x3fff, u16(head, 8) & 0x3fff];
}

/** WebP: the RIFF chunks to the length that the file gives itself (RFC 9649 2). One still picture, no animation. */
export function* walkWebp(size: SizeSeen): Walk {
  const riff = yield { take: 12 };
  let left = u32(riff, 4) - 4;
  let pictures = 0;
  while (left >= 8) {
    const head = yield { take: 8 };
    const type = String.fromCharCode(...head.subarray(0, 4));
    const length = u32(head, 4);
    const padded = length + (length % 2);
    left -= 8 + padded;
    if (left < 0) throw damaged();

    const looked = LOOKED_AT[type] ?? 0;
    if (looked > length) throw damaged();
    if (looked > 0) {
      const body = yield { take: looked };
      if (type === 'VP8X' && ((body[0] ?? 0) & ANIMATION) !== 0) {
        throw new Unsupported('This file is a moving picture. Send a still photo.');
      }
      size(...sizeIn(type, body));
      if (type !== 'VP8X') pictures += 1;
    }
    if (padded > looked) yield { pass: padded - looked };
  }
  if (pictures !== 1) throw damaged();
}
