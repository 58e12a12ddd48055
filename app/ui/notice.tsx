import type { ReactNode } from 'react';
import { Icon, type IconName } from './icon.tsx';
import { WitnessMark } from './mark/witness-mark.tsx';

const marks = { sealed: 'aligned', failed: 'displaced' } as const;

interface Props {
  tone: 'plain' | 'sealed' | 'waiting' | 'failed';
  /** The first words, printed heavier: what it is about. */
  lead: ReactNode;
  children?: ReactNode;
  /** For plain and waiting; sealed and failed carry the mark. */
  icon?: IconName;
  size?: number;
  className?: string;
  /** Read out at once when it appears: only for what has just gone wrong. */
  alert?: boolean;
}

/** A notice on its wash: mark or icon, bold first words, then the rest. */
export function Notice({ tone, lead, children, icon, size = 24, className = '', alert }: Props) {
  const sign =
    tone === 'sealed' || tone === 'failed' ? (
      <WitnessMark state={marks[tone]} size={size} />
    ) : (
      <Icon name={icon ?? (tone === 'waiting' ? 'rest' : 'note')} size={size} />
    );
  return (
    <div
      className={`notice ${tone === 'plain' ? '' : `notice-${tone}`} ${className}`}
      role={alert ? 'alert' : undefined}
    >
      {sign}
      <div>
        <b>{lead}</b> {children}
      </div>
    </div>
  );
}
