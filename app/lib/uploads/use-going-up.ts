import { useEffect, useMemo, useSyncExternalStore } from 'react';
import { pageQueue } from './page-queue.ts';
import type { GoingUp } from './upload-queue.ts';

const NONE: readonly GoingUp[] = [];

const subscribe = (listener: () => void) => pageQueue().subscribe(listener);

/** The photos of one entry that are on their way, as they go. When the page leaves, those that are up are forgotten. */
export function useGoingUp(entryId: string): readonly GoingUp[] {
  const all = useSyncExternalStore(
    subscribe,
    () => pageQueue().snapshot(),
    () => NONE,
  );
  useEffect(() => () => pageQueue().clear(entryId), [entryId]);
  return useMemo(() => all.filter((photo) => photo.entryId === entryId), [all, entryId]);
}
