import type { ReactNode } from 'react';
import './add.css';

/** The frame of Add to timeline; the camera's step is dark in both themes. */
export function AddSheet({ camera, children }: { camera?: boolean; children: ReactNode }) {
  return (
    <main
      className={`add-sheet ${camera ? 'add-camera on-ebony' : ''}`}
      data-theme={camera ? 'dark' : undefined}
    >
      {children}
    </main>
  );
}
