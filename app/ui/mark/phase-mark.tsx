import type { Phase } from '../types.ts';

const joint: Record<Phase, string> = {
  before: 'M8 2C10 8 10 16 8 22M16 2C14 8 14 16 16 22',
  during: 'M10.4 2V22M13.6 2V22',
  after: 'M12 2V22',
};

/** The joint open, under clamps, closed. Always beside the phase's word. */
export function PhaseMark({ phase, size = 22 }: { phase: Phase; size?: number }) {
  return (
    <svg viewBox="0 0 24 24" width={size} height={size} aria-hidden>
      <path
        d={joint[phase]}
        stroke="currentColor"
        strokeWidth={1.4}
        fill="none"
        strokeLinecap="round"
      />
      {phase === 'during' && (
        <path d="M1.5 7.5 8 12 1.5 16.5ZM22.5 7.5 16 12 22.5 16.5Z" fill="currentColor" />
      )}
    </svg>
  );
}
