import { useEffect } from 'react';
import { useNavigationType } from 'react-router';

/** Whether a case was opened since this document was loaded: from then on a POP is a way back. */
let opened = false;

function comesBack(type: string): boolean {
  if (type !== 'POP') return false;
  const [load] = performance.getEntriesByType('navigation') as PerformanceNavigationTiming[];
  return opened || load?.type !== 'navigate';
}

/**
 * Opens an open case at its latest entry, unless the address says where, or one comes back to where
 * one was. Only when it is opened: news must not move a page that is being read.
 */
export function useLatestEntry(isOpen: boolean, latest: string | null): void {
  const type = useNavigationType();
  useEffect(() => {
    const isBack = comesBack(type);
    opened = true;
    const { hash, search } = window.location;
    if (!isOpen || latest === null || isBack || hash !== '' || search !== '') return;
    document.getElementById(`entry-${latest}`)?.scrollIntoView({ block: 'start' });
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);
}
