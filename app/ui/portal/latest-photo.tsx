import { Mat } from '../photo/mat.tsx';
import { SealLine } from '../timeline/seal-line.tsx';
import type { PhotoView, SealView } from '../types.ts';

/** The newest sealed photo: the first thing under the state. */
export function LatestPhoto({ photo, seal }: { photo: PhotoView; seal: SealView }) {
  return (
    <section aria-labelledby="latest">
      <h2 id="latest" className="portal-section">
        Latest from the bench
      </h2>
      <Mat
        photo={photo}
        shape={photo.height > photo.width ? undefined : 4 / 3}
        sizes="(min-width: 40rem) 582px, calc(100vw - 58px)"
        eager
      />
      <SealLine seal={seal} />
    </section>
  );
}
