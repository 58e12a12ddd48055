import { useEffect, useRef, useState } from 'react';
import type { GoingUp } from './upload-queue.ts';

const WIDTH = 240;

/** A small picture of a photo file as a blob address; null where the browser cannot decode it (HEIC, mostly). */
async function makeThumb(file: Blob): Promise<string | null> {
  try {
    const bitmap = await createImageBitmap(file, { resizeWidth: WIDTH });
    const canvas = document.createElement('canvas');
    canvas.width = bitmap.width;
    canvas.height = bitmap.height;
    canvas.getContext('2d')?.drawImage(bitmap, 0, 0);
    bitmap.close();
    const small = await new Promise<Blob | null>((done) => canvas.toBlob(done, 'image/jpeg', 0.8));
    return small && URL.createObjectURL(small);
  } catch {
    return null;
  }
}

/**
 * A small picture for each photo on its way, by file. Made one after the other: a phone that decodes
 * twenty large photos at once runs out of memory.
 */
export function useThumbs(photos: readonly GoingUp[]): ReadonlyMap<Blob, string> {
  const [thumbs, setThumbs] = useState<ReadonlyMap<Blob, string>>(new Map());
  const seen = useRef(new Set<Blob>());
  const before = useRef(Promise.resolve());
  const addresses = useRef<string[]>([]);

  useEffect(() => {
    for (const { file } of photos) {
      if (seen.current.has(file)) continue;
      seen.current.add(file);
      before.current = before.current.then(async () => {
        const address = await makeThumb(file);
        if (address === null) return;
        addresses.current.push(address);
        setThumbs((all) => new Map(all).set(file, address));
      });
    }
  }, [photos]);
  useEffect(() => {
    const made = addresses.current;
    return () => made.forEach((address) => URL.revokeObjectURL(address));
  }, []);
  return thumbs;
}
