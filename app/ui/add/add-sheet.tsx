import type { ReactNode } from 'react';
import './add.css';

/** The frame of Add to timeline. */
export function AddSheet({ children }: { children: ReactNode }) {
  return <main className="add-sheet">{children}</main>;
}
