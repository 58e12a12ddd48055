import type { ReactNode } from 'react';
import { Rosette } from '../mark/rosette.tsx';
import { PhotoPicture } from '../photo/photo-picture.tsx';
import type { PhotoView } from '../types.ts';
import './verify.css';

interface Props {
  /** "Parlour guitar, Aldous Pike, serial …17" */
  title: string;
  text: string;
  photo?: PhotoView;
  sealValue?: string;
  /** "The rosette printed on your page should look like this one." */
  rosetteWords?: string;
  /** A link to the repair, where the owner has published it. */
  children?: ReactNode;
}

/** What the warranty is about, and the rosette to hold against the paper. */
export function SealedCard({ title, text, photo, sealValue, rosetteWords, children }: Props) {
  return (
    <section className="sealed-card" aria-label="What it covers">
      {photo && (
        <div className="mat mat-small">
          <div className="mat-window">
            <PhotoPicture photo={photo} shape={4 / 3} sizes="(min-width: 40rem) 196px, 90vw" />
          </div>
        </div>
      )}
      <div className={photo ? '' : 'case:col-span-2'}>
        <h2 className="mb-1 text-h3">{title}</h2>
        <p className="text-ink-2">{text}</p>
        {children}
      </div>
      {sealValue && (
        <div className="sealed-card-rosette">
          <Rosette sealValue={sealValue} />
          <p>{rosetteWords ?? 'The rosette printed on your page should look like this one.'}</p>
        </div>
      )}
    </section>
  );
}
