import type { Phase } from '../types.ts';

const tapers = {
  during: 'M3.5 0C3.5 18 6 16 6 34M12.5 0C12.5 18 10 16 10 34',
  after: 'M6 0C6 20 8 14 8 34M10 0C10 20 8 14 8 34',
};

/** Where the joint closes further: from two lines to two nearer ones, then to one. */
export function Taper({ phase }: { phase: Phase }) {
  if (phase === 'before') return null;
  return (
    <svg className="taper" viewBox="0 0 16 34" aria-hidden>
      <path d={tapers[phase]} />
    </svg>
  );
}
