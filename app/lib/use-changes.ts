import { useEffect, useRef } from 'react';
import { useFetcher, useRevalidator } from 'react-router';

const EVERY_MS = 5_000;

/**
 * Keeps an open page current: asks every five seconds, while the page is to be seen, whether the
 * case has changed, and if so has the page's loaders run again. Without `case` it watches all that
 * the viewer's first page shows. `version` is the loader's own, when it has one.
 */
export function useChanges({ case: number, version }: { case?: string; version?: string }): void {
  const { load, data } = useFetcher<{ version: string }>();
  const { revalidate } = useRevalidator();
  const path =
    number === undefined ? '/api/changes' : `/api/changes?case=${encodeURIComponent(number)}`;

  useEffect(() => {
    const ask = () => {
      if (document.visibilityState === 'visible') void load(path);
    };
    const timer = setInterval(ask, EVERY_MS);
    document.addEventListener('visibilitychange', ask);
    return () => {
      clearInterval(timer);
      document.removeEventListener('visibilitychange', ask);
    };
  }, [load, path]);

  const told = data?.version;
  const known = useRef(version);
  useEffect(() => {
    if (version !== undefined) known.current = version;
  }, [version]);
  useEffect(() => {
    if (told === undefined || told === known.current) return;
    const first = known.current === undefined;
    known.current = told;
    if (!first) void revalidate();
  }, [told, revalidate]);
}
