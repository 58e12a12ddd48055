import type { ReactNode } from 'react';
import { WitnessMark } from './mark/witness-mark.tsx';

/** One sentence on what is missing, one on what fills it. */
export function EmptyState({ missing, filledBy }: { missing: string; filledBy: ReactNode }) {
  return (
    <div className="grid grid-cols-[auto_1fr] items-start gap-3.5 leading-[1.45] text-ink-2">
      <WitnessMark state="hollow" size={30} className="text-ink-3" />
      <div>
        <p>{missing}</p>
        <p>{filledBy}</p>
      </div>
    </div>
  );
}
