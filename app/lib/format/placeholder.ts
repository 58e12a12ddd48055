import { thumbHashToRGBA } from 'thumbhash';

const CRC = Uint32Array.from({ length: 256 }, (_, n) => {
  let c = n;
  for (let k = 0; k < 8; k += 1) c = c & 1 ? (c >>> 1) ^ 0xedb88320 : c >>> 1;
  return c;
});

function chunk(type: string, data: Uint8Array): Uint8Array {
  const out = new Uint8Array(12 + data.length);
  const view = new DataView(out.buffer);
  view.setUint32(0, data.length);
  for (let i = 0; i < 4; i += 1) out[4 + i] = type.charCodeAt(i);
  out.set(data, 8);
  let crc = 0xffffffff;
  for (let i = 4; i < 8 + data.length; i += 1)
    crc = (CRC[(crc ^ (out[i] ?? 0)) & 255] ?? 0) ^ (crc >>> 8);
  view.setUint32(8 + data.length, (crc ^ 0xffffffff) >>> 0);
  return out;
}

function storedZlib(data: Uint8Array): Uint8Array {
  const out = new Uint8Array(11 + data.length);
  const view = new DataView(out.buffer);
  out.set([0x78, 0x01, 0x01]);
  view.setUint16(3, data.length, true);
  view.setUint16(5, ~data.length & 0xffff, true);
  out.set(data, 7);
  let a = 1;
  let b = 0;
  for (const byte of data) {
    a = (a + byte) % 65521;
    b = (b + a) % 65521;
  }
  view.setUint32(7 + data.length, ((b << 16) | a) >>> 0);
  return out;
}

/** Mean of the hash's pixels in a small grid: the browser smooths it again when it is drawn large. */
function shrink(hash: Uint8Array, long: number): { width: number; height: number; rgb: number[] } {
  const { w, h, rgba } = thumbHashToRGBA(hash);
  const width = w >= h ? long : Math.max(1, Math.round((long * w) / h));
  const height = h >= w ? long : Math.max(1, Math.round((long * h) / w));
  const rgb: number[] = [];
  for (let y = 0; y < height; y += 1)
    for (let x = 0; x < width; x += 1) {
      const sum = [0, 0, 0];
      let count = 0;
      for (let v = Math.floor((y * h) / height); v < Math.ceil(((y + 1) * h) / height); v += 1)
        for (let u = Math.floor((x * w) / width); u < Math.ceil(((x + 1) * w) / width); u += 1) {
          for (let c = 0; c < 3; c += 1) sum[c] = (sum[c] ?? 0) + (rgba[(v * w + u) * 4 + c] ?? 0);
          count += 1;
        }
      for (const value of sum) rgb.push(Math.round(value / count));
    }
  return { width, height, rgb };
}

/**
 * A ThumbHash (base64) as a PNG data URL of at most 7 px, some 240 characters long: a page of sixty
 * photos carries sixty of them. PNG by W3C "Portable Network Graphics (PNG) Specification (Third
 * Edition)", section 5; its zlib stream is one stored block (RFC 1950, RFC 1951 section 3.2.4).
 */
export function placeholderUrl(thumbHash: string): string {
  const hash = Uint8Array.from(atob(thumbHash), (c) => c.charCodeAt(0));
  const { width, height, rgb } = shrink(hash, 7);
  const rows = new Uint8Array(height * (1 + width * 3));
  for (let y = 0; y < height; y += 1)
    rows.set(rgb.slice(y * width * 3, (y + 1) * width * 3), y * (1 + width * 3) + 1);
  const head = new Uint8Array(13);
  const view = new DataView(head.buffer);
  view.setUint32(0, width);
  view.setUint32(4, height);
  head.set([8, 2, 0, 0, 0], 8);
  const file = [
    Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a),
    chunk('IHDR', head),
    chunk('IDAT', storedZlib(rows)),
    chunk('IEND', new Uint8Array()),
  ];
  const bytes = file.flatMap((part) => [...part]);
  return `data:image/png;base64,${btoa(String.fromCharCode(...bytes))}`;
}
