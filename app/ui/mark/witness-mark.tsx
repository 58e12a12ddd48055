import type { MarkState } from '../types.ts';
import { HALF, HALF_SMALL } from './strokes.ts';

interface Props {
  state: MarkState;
  /** In px, 16 or more. */
  size?: number;
  /** Only where no words stand beside it; otherwise the mark is hidden from screen readers. */
  label?: string;
  /** Moves the halves once, because the answer has just come. */
  arrive?: boolean;
  className?: string;
}

/** The witness mark: two half-strokes on a joint, in one of three states. The words stand beside it. */
export function WitnessMark({ state, size = 18, label, arrive, className = '' }: Props) {
  const small = size <= 20;
  const d = small ? HALF_SMALL : HALF;
  const displaced = state === 'displaced';
  const stroke =
    state === 'hollow'
      ? {
          fill: 'none',
          stroke: 'currentColor',
          strokeWidth: small ? 1.5 : size >= 80 ? 0.75 : 1.2,
          strokeLinejoin: 'round' as const,
        }
      : { fill: 'currentColor' };
  return (
    <svg
      className={`wm-${state} ${arrive ? 'wm-arrive' : ''} ${className}`.trim()}
      viewBox="0 0 24 24"
      width={size}
      height={size}
      {...(label ? { role: 'img', 'aria-label': label } : { 'aria-hidden': true })}
    >
      <path
        d={displaced ? 'M12 0V24' : 'M12 1V23'}
        stroke="currentColor"
        strokeWidth={small ? 1.4 : size >= 80 ? 0.6 : 1}
      />
      <g className="wm-left">
        <path d={d} {...stroke} transform={displaced ? 'translate(0 -.6)' : undefined} />
      </g>
      <g className="wm-right">
        <path
          d={d}
          {...stroke}
          transform={`${displaced ? `translate(0 ${small ? 6.6 : 5.6}) ` : ''}rotate(180 12 12)`}
        />
      </g>
    </svg>
  );
}
