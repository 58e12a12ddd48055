import { useState, type CSSProperties, type KeyboardEvent } from 'react';
import { srcSet } from '../photo/photo-picture.tsx';
import type { PhotoView } from '../types.ts';

interface Props {
  before: PhotoView;
  after: PhotoView;
  /** "Left 31 March, right 22 April." */
  dates: string;
  /** From edge to edge, as in the portal. */
  edge?: boolean;
  /** Width : height. */
  shape?: number;
  sizes: string;
}

const GRIP = 'M31 17V31L4.5 40A2 2 0 0 1 3 36Z';
const STEP = 2;

/** Before left, after right, in the same frame; the joint between them slides, by hand and by keyboard. */
export function Compare({ before, after, dates, edge, shape = 1, sizes }: Props) {
  const [at, setAt] = useState(50);
  const onKeyDown = (event: KeyboardEvent) => {
    const by =
      { ArrowLeft: -STEP, ArrowDown: -STEP, ArrowRight: STEP, ArrowUp: STEP }[event.key] ?? 0;
    if (by === 0) return;
    event.preventDefault();
    setAt((now) => Math.min(100, Math.max(0, now + by)));
  };
  const picture = (photo: PhotoView, className?: string) => (
    <img
      src={photo.src960}
      srcSet={srcSet(photo)}
      sizes={sizes}
      width={photo.width}
      height={photo.height}
      alt={photo.alt}
      className={className}
      fetchPriority="high"
      style={{ backgroundImage: photo.placeholder && `url(${photo.placeholder})` }}
    />
  );
  return (
    <section
      className={`compare ${edge ? 'compare-edge' : ''}`}
      aria-label="Before and after"
      style={{ '--at': `${at}%` } as CSSProperties}
    >
      <div className="compare-frame">
        <div className="compare-window" style={{ aspectRatio: shape }}>
          {picture(after)}
          {picture(before, 'compare-before')}
          <span className="compare-joint" />
          <input
            type="range"
            min={0}
            max={100}
            step={0.5}
            value={at}
            aria-label="Slide between before and after"
            aria-valuetext={`${Math.round(at)} % before`}
            onChange={(event) => setAt(Number(event.target.value))}
            onKeyDown={onKeyDown}
          />
          <svg className="compare-grip" viewBox="0 0 74 48" aria-hidden>
            <path d={GRIP} />
            <path d={GRIP} transform="rotate(180 37 24)" />
          </svg>
          <button type="button" className="left-2.5" onClick={() => setAt(100)}>
            Before
          </button>
          <button type="button" className="right-2.5" onClick={() => setAt(0)}>
            After
          </button>
        </div>
      </div>
      <p className="compare-words">Slide the joint. {dates}</p>
    </section>
  );
}
