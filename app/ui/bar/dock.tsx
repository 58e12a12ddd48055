import type { ReactNode } from 'react';

/** The one thing to do, under the thumb; on the phone only. The page leaves 7 rem free below itself. */
export function Dock({ children }: { children: ReactNode }) {
  return <div className="dock">{children}</div>;
}
