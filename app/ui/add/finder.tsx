import type { ReactNode } from 'react';
import './add.css';

interface Props {
  /** The camera's picture: a video element. */
  children: ReactNode;
  /** An earlier photo laid over it, at 35 %. */
  overlay?: { src: string; n: number };
  /** Lays the photo over, or takes it away. */
  onOverlay?: () => void;
  /** "Lay Photo 2 over" when it is off. */
  overlayOffer?: string;
}

/** The finder. An overlay helps to frame; it proves nothing, so no mark stands on it. */
export function Finder({ children, overlay, onOverlay, overlayOffer }: Props) {
  return (
    <div className="finder">
      {children}
      {overlay && <img className="finder-overlay" src={overlay.src} alt="" />}
      <svg className="finder-corners" viewBox="0 0 390 376" preserveAspectRatio="none" aria-hidden>
        <path d="M38 96H64M38 96V122M352 96H326M352 96V122M38 330H64M38 330V304M352 330H326M352 330V304" />
      </svg>
      {(overlay || overlayOffer) && (
        <button type="button" onClick={onOverlay} aria-pressed={Boolean(overlay)}>
          {overlay ? `Photo ${overlay.n} laid over, 35\u00a0%` : overlayOffer}
        </button>
      )}
    </div>
  );
}
