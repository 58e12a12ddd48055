import type { PhotoShelf, WaitingPhoto } from './waiting-photo.ts';

/** A shelf that lasts as long as the page. */
export function memoryShelf(): PhotoShelf {
  const photos = new Map<string, WaitingPhoto>();
  return {
    keep: (photo) => {
      photos.set(photo.id, photo);
      return Promise.resolve();
    },
    all: () => Promise.resolve([...photos.values()]),
    remove: (id) => {
      photos.delete(id);
      return Promise.resolve();
    },
  };
}
