import './image-data.ts';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import decode, { init as initDecoder } from '@jsquash/webp/decode.js';
import encode, { init as initEncoder } from '@jsquash/webp/encode.js';
import type { Pixels } from './pixels.ts';

const moduleOf = (file: string) =>
  new WebAssembly.Module(
    readFileSync(createRequire(import.meta.url).resolve(`@jsquash/webp/codec/${file}`)),
  );

let encoder: Promise<unknown> | undefined;
let decoder: Promise<unknown> | undefined;

/** Encodes as lossy WebP, quality from 0 to 100, by libwebp; without any metadata. The codec stays loaded. */
export async function encodeWebp(
  { data, width, height }: Pixels,
  quality: number,
): Promise<Uint8Array> {
  encoder ??= initEncoder(moduleOf('enc/webp_enc_simd.wasm'));
  await encoder;
  const pixels = new Uint8ClampedArray(data.buffer, data.byteOffset, data.length);
  return new Uint8Array(
    await encode(new ImageData(pixels as Uint8ClampedArray<ArrayBuffer>, width, height), {
      quality,
    }),
  );
}

/** Decodes a still WebP by libwebp. Throws when it cannot. */
export async function decodeWebp(file: Uint8Array): Promise<Pixels> {
  decoder ??= initDecoder(moduleOf('dec/webp_dec.wasm'));
  await decoder;
  const { data, width, height } = await decode(new Uint8Array(file).buffer);
  return { data: Buffer.from(data.buffer, data.byteOffset, data.byteLength), width, height };
}
