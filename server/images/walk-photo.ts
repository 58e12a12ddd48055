import { Invalid, TooLarge, Unsupported } from '#domain/errors.ts';
import {
  EMPTY_PHOTO,
  MAX_PHOTO_PIXELS,
  NOT_A_PHOTO,
  type PhotoType,
  SNIFFED_BYTES,
  sniffPhoto,
} from '#domain/photo-file.ts';
import { damaged, Feed, type Walk } from './feed.ts';
import { walkHeic } from './walk-heic.ts';
import { walkJpeg } from './walk-jpeg.ts';
import { walkPng } from './walk-png.ts';
import { walkWebp } from './walk-webp.ts';

/** A walk says each size it finds in a header, in px as stored, before any pixel is decoded. */
export type SizeSeen = (width: number, height: number) => void;

const WALKS: Record<PhotoType, (size: SizeSeen) => Walk> = {
  'image/jpeg': walkJpeg,
  'image/png': walkPng,
  'image/webp': walkWebp,
  'image/heic': walkHeic,
};

const million = (pixels: number) => String(Math.round(pixels / 1_000_000));

/**
 * Looks at a photo file while it streams past: what kind it is, how large, whether it is whole.
 * Nothing is decoded. Every refusal is a Problem with its sentence.
 */
export class PhotoWalk {
  /** Known after `SNIFFED_BYTES` bytes. */
  mediaType: PhotoType | undefined;
  /** In px as stored in the file, not yet upright. */
  width = 0;
  height = 0;
  #head = Buffer.alloc(0);
  #feed: Feed | undefined;

  /** Looks at the next piece. */
  push(piece: Uint8Array): void {
    if (this.#feed !== undefined) {
      this.#feed.push(piece);
      return;
    }
    this.#head = Buffer.concat([this.#head, piece]);
    if (this.#head.length >= SNIFFED_BYTES) this.#begin();
  }

  /** The file is over. */
  end(): void {
    if (this.#head.length === 0) {
      throw new Invalid({ photo: EMPTY_PHOTO });
    }
    if (this.#feed === undefined) this.#begin();
    this.#feed?.end();
    if (this.width === 0) throw damaged();
  }

  #begin(): void {
    const found = sniffPhoto(this.#head);
    if (found === null) {
      throw new Unsupported(NOT_A_PHOTO);
    }
    this.mediaType = found;
    this.#feed = new Feed(WALKS[found]((width, height) => this.#see(width, height)));
    this.#feed.push(this.#head);
  }

  #see(width: number, height: number): void {
    if (width === 0 || height === 0) throw damaged();
    if (width * height > MAX_PHOTO_PIXELS) {
      throw new TooLarge(
        `This picture has ${million(width * height)} million pixels and the shop takes ${million(MAX_PHOTO_PIXELS)}. Make it smaller and send it again.`,
      );
    }
    if (width * height > this.width * this.height) {
      this.width = width;
      this.height = height;
    }
  }
}
