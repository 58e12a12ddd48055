import type { ReactNode } from 'react';
import type { PhotoView } from '../types.ts';
import { Mat } from './mat.tsx';
import { PinnedPhoto } from './pinned-photo.tsx';

const PAIR = 4 / 3;
const WIDE = 16 / 10;

interface Props {
  photos: PhotoView[];
  /** What stands beside a single upright photo: the facts of an intake. */
  beside?: ReactNode;
  /** Widths of a single photo and of one of a pair, as in the `sizes` attribute. */
  sizes: { single: string; pair: string };
  eager?: boolean;
  /** One below the other, whole: the portal. */
  stacked?: boolean;
}

const isUpright = (photo: PhotoView) => photo.state === 'ready' && photo.height > photo.width;

function One({
  photo,
  sizes,
  eager,
  shape,
  className,
}: {
  photo: PhotoView;
  sizes: string;
  eager?: boolean;
  shape?: number;
  className?: string;
}) {
  return photo.pins.length > 0 && photo.state === 'ready' ? (
    <PinnedPhoto photo={photo} sizes={sizes} eager={eager} className={className} />
  ) : (
    <Mat
      photo={photo}
      sizes={sizes}
      eager={eager}
      shape={isUpright(photo) ? undefined : shape}
      className={className}
    />
  );
}

/** The photos of an entry: one large, in pairs, or one with its pins beside it. */
export function PhotoGroup({ photos, beside, sizes, eager, stacked }: Props) {
  const [first] = photos;
  if (!first) return beside;
  if (stacked)
    return (
      <div className="photos">
        {photos.map((photo, i) => (
          <div key={photo.id} className="photo-stacked">
            <One photo={photo} sizes={sizes.single} eager={eager && i === 0} shape={PAIR} />
          </div>
        ))}
        {beside}
      </div>
    );
  if (photos.length === 1) {
    if (first.pins.length > 0)
      return (
        <>
          <div className="photos photos-pinned">
            <One photo={first} sizes={sizes.pair} eager={eager} />
          </div>
          {beside}
        </>
      );
    if (beside && isUpright(first))
      return (
        <div className="photos photos-beside">
          <Mat photo={first} sizes={sizes.pair} eager={eager} />
          {beside}
        </div>
      );
    return (
      <>
        <div className="photos">
          <One
            photo={first}
            sizes={sizes.single}
            eager={eager}
            shape={WIDE}
            className={isUpright(first) ? 'mat-upright' : ''}
          />
        </div>
        {beside}
      </>
    );
  }
  const odd = photos.length % 2 === 1;
  return (
    <>
      <div className="photos photos-pair">
        {photos.map((photo, i) => {
          const wide = odd && i === 0;
          return (
            <div key={photo.id} className={`grid gap-2.5 ${wide ? 'photos-wide' : ''}`}>
              <One
                photo={photo}
                sizes={wide ? sizes.single : sizes.pair}
                eager={eager && i === 0}
                shape={wide ? WIDE : PAIR}
              />
            </div>
          );
        })}
      </div>
      {beside}
    </>
  );
}
