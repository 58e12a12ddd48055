import { crc32 } from 'node:zlib';
import { damaged, type Walk } from './feed.ts';
import type { SizeSeen } from './walk-photo.ts';

const view = (bytes: Uint8Array) => new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);

/** PNG from signature to IEND, chunk by chunk with each CRC (PNG specification, third edition, 5). */
export function* walkPng(size: SizeSeen): Walk {
  yield { take: 8 };
  let data = 0;
  for (let first = true; ; first = false) {
    const head = yield { take: 8 };
    const length = view(head).getUint32(0);
    const type = String.fromCharCode(...head.subarray(4));
    if (length > 0x7fffffff || first !== (type === 'IHDR')) throw damaged();

    let crc = crc32(head.subarray(4));
    const sides: number[] = [];
    if (type === 'IHDR') {
      if (length !== 13) throw damaged();
      const body = yield { take: 13 };
      crc = crc32(body, crc);
      sides.push(view(body).getUint32(0), view(body).getUint32(4));
    } else if (length > 0) {
      yield { pass: length, see: (piece) => (crc = crc32(piece, crc)) };
    }
    if (view(yield { take: 4 }).getUint32(0) !== crc) throw damaged();
    const [width, height] = sides;
    if (width !== undefined && height !== undefined) size(width, height);
    if (type === 'IDAT') data += length;
    if (type === 'IEND') break;
  }
  if (data === 0) throw damaged();
}
