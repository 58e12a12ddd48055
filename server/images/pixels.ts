/** Pixels as rows of RGBA, one byte each, straight alpha: what jimp calls a bitmap. */
export interface Pixels {
  data: Buffer;
  width: number;
  height: number;
}
