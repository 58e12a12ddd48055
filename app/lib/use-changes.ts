import { useEffect, useRef } from 'react';
import { useRevalidator } from 'react-router';

const EVERY_MS = 5_000;

/** The version now, or null when it cannot be known: no network, or the server is being restarted. */
async function askVersion(path: string, signal: AbortSignal): Promise<string | null> {
  try {
    const answer = await fetch(path, { signal });
    // Signed out meanwhile: the page's own loaders then lead to the sign-in.
    if (answer.status === 401) return 'signed out';
    return answer.ok ? ((await answer.json()) as { version: string }).version : null;
  } catch {
    return null;
  }
}

/**
 * Keeps an open page current: asks every five seconds, while the page is to be seen, whether the
 * case has changed, and if so has the page's loaders run again. Without `case` it watches all that
 * the viewer's first page shows. `version` is the loader's own, when it has one. Trouble on the way
 * changes nothing on the page.
 */
export function useChanges({ case: number, version }: { case?: string; version?: string }): void {
  const { revalidate } = useRevalidator();
  const known = useRef(version);
  const path =
    number === undefined ? '/api/changes' : `/api/changes?case=${encodeURIComponent(number)}`;

  useEffect(() => {
    if (version !== undefined) known.current = version;
  }, [version]);

  useEffect(() => {
    const leaving = new AbortController();
    const ask = async () => {
      if (document.visibilityState !== 'visible') return;
      const told = await askVersion(path, leaving.signal);
      if (told === null || told === known.current || leaving.signal.aborted) return;
      const first = known.current === undefined;
      known.current = told;
      if (!first) await revalidate();
    };
    const timer = setInterval(() => void ask(), EVERY_MS);
    const onVisible = () => void ask();
    document.addEventListener('visibilitychange', onVisible);
    return () => {
      leaving.abort();
      clearInterval(timer);
      document.removeEventListener('visibilitychange', onVisible);
    };
  }, [path, revalidate]);
}
