import type { ReactNode } from 'react';
import './staff-bar.css';

/** The one thing to do, under the thumb; on the phone only. The page leaves 7 rem free below itself. */
export function Dock({ children }: { children: ReactNode }) {
  return (
    <aside className="dock" aria-label="To do now">
      {children}
    </aside>
  );
}
