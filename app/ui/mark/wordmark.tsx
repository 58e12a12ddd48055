import wordmarkUrl from './wordmark.svg?no-inline';

/** The name with the joint between its two words. Not smaller than 32 px; below that use the mark. */
export function Wordmark({ height = 36 }: { height?: number }) {
  return (
    <svg
      className="wordmark"
      viewBox="-1 -36 238 48"
      height={height}
      width={Math.round((height * 238) / 48)}
      role="img"
      aria-label="Witnessmark"
    >
      <use href={`${wordmarkUrl}#wordmark`} />
    </svg>
  );
}
