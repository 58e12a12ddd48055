import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { WitnessMark } from '../mark/witness-mark.tsx';
import type { PhotoView } from '../types.ts';
import { PhotoPicture } from './photo-picture.tsx';

interface Props {
  photo: PhotoView;
  sizes: string;
  shape?: number;
  eager?: boolean;
  /** Pins, over the picture. */
  children?: ReactNode;
  className?: string;
}

function Window({ photo, sizes, shape, eager, children }: Props) {
  if (photo.state !== 'ready')
    return (
      <div className="mat-window mat-empty" style={{ aspectRatio: shape ?? 4 / 3 }}>
        <WitnessMark state="hollow" size={30} />
        <p>{photo.note ?? `Photo ${photo.n} is kept; its sizes are being made.`}</p>
      </div>
    );
  const picture = <PhotoPicture photo={photo} sizes={sizes} shape={shape} eager={eager} />;
  return (
    <div className="mat-window">
      {photo.href ? (
        <Link
          to={photo.href}
          className="block"
          aria-label={`Photo ${photo.n} in full: ${photo.alt}`}
          preventScrollReset
        >
          {picture}
        </Link>
      ) : (
        picture
      )}
      {children}
    </div>
  );
}

/** A photo on its mat, with its number and what it shows. */
export function Mat({ className = '', ...props }: Props) {
  const { photo } = props;
  return (
    <figure className={`mat ${className}`}>
      <Window {...props} />
      <figcaption>
        <b>Photo {photo.n}</b>
        <span>{photo.caption}</span>
      </figcaption>
    </figure>
  );
}
