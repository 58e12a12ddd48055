import { chunksIn, webpOf } from './webp-chunks.ts';

const HAS_PROFILE = 0x20;
const HAS_ALPHA = 0x10;

/**
 * The WebP file with a colour profile in it and nothing else beside the picture (RFC 9649 2.7: VP8X,
 * ICCP, then ALPH and VP8, or VP8L). `width` and `height` are the picture's, in px.
 */
export function withProfile(
  webp: Uint8Array,
  profile: Uint8Array,
  { width, height, opaque }: { width: number; height: number; opaque: boolean },
): Buffer {
  const picture = [...chunksIn(webp)].filter(({ type }) => /^(ALPH|VP8 |VP8L)$/.test(type));
  const head = Buffer.alloc(10);
  head[0] = HAS_PROFILE | (opaque ? 0 : HAS_ALPHA);
  head.writeUIntLE(width - 1, 4, 3);
  head.writeUIntLE(height - 1, 7, 3);
  return webpOf([{ type: 'VP8X', body: head }, { type: 'ICCP', body: profile }, ...picture]);
}
