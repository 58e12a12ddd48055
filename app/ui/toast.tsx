import { useEffect, useState, type ReactNode } from 'react';
import { WitnessMark } from './mark/witness-mark.tsx';
import type { MarkState } from './types.ts';

const STAYS_MS = 8_000;

interface Props {
  state: MarkState;
  /** "Entry added. Not yet sealed." */
  children: ReactNode;
  /** A link or a button: "Seal it". */
  action?: ReactNode;
  onClose: () => void;
}

/** One short word on what has just been done, for eight seconds; it stays while it has the focus or the pointer. */
export function Toast({ state, children, action, onClose }: Props) {
  const [held, setHeld] = useState(false);
  useEffect(() => {
    if (held) return;
    const timer = setTimeout(onClose, STAYS_MS);
    return () => clearTimeout(timer);
  }, [held, onClose]);
  return (
    <div
      className="toast on-ebony"
      role="status"
      onFocus={() => setHeld(true)}
      onBlur={() => setHeld(false)}
      onMouseEnter={() => setHeld(true)}
      onMouseLeave={() => setHeld(false)}
    >
      <WitnessMark state={state} size={22} />
      <p>{children}</p>
      <span className="ml-auto">{action}</span>
    </div>
  );
}
