import type { MarkState } from '../types.ts';
import { HALF_TICK } from './strokes.ts';

/** The halves of the mark on a spine or a seam, which is their joint. Words beside it say what it means. */
export function Tick({ state, className = '' }: { state: MarkState; className?: string }) {
  const paint =
    state === 'hollow'
      ? {
          fill: 'none',
          stroke: 'currentColor',
          strokeWidth: 1.5,
          strokeLinejoin: 'round' as const,
        }
      : { fill: 'currentColor' };
  return (
    <span className={`tick tick-${state} ${className}`.trim()} aria-hidden>
      <svg viewBox="0 0 16 18">
        <path d={HALF_TICK} {...paint} />
      </svg>
      <svg viewBox="0 0 16 18">
        <path d={HALF_TICK} {...paint} transform="rotate(180 8 9)" />
      </svg>
    </span>
  );
}
