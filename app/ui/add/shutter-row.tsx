import type { ReactNode } from 'react';
import { Icon } from '../icon.tsx';
import './add.css';

interface Props {
  onShutter: () => void;
  /** The last photo and how many were taken. */
  last?: { src: string; count: number };
  /** The way on: "What it shows". */
  children: ReactNode;
}

/** Last photo, shutter, the way on. */
export function ShutterRow({ onShutter, last, children }: Props) {
  return (
    <div className="shutter-row">
      {last ? (
        <span className="last-photo">
          <img src={last.src} width={66} height={66} alt="Last photo" />
          <b>
            {last.count}
            <span className="sr-only"> taken</span>
          </b>
        </span>
      ) : (
        <span />
      )}
      <button type="button" className="shutter" aria-label="Take a photo" onClick={onShutter}>
        <Icon name="camera" size={34} />
      </button>
      {children}
    </div>
  );
}
