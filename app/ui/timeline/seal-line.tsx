import { WitnessMark } from '../mark/witness-mark.tsx';
import type { SealView } from '../types.ts';

const states = { sealed: 'aligned', open: 'hollow', altered: 'displaced' } as const;

function words(seal: SealView): string {
  if (seal.state !== 'sealed') return seal.sentence;
  return `Sealed ${seal.when} ${seal.act ?? `by ${seal.by}`}`;
}

/** Says whether an entry is sealed, by whom or on what act; each has a short hash of its own. */
export function SealLine({ seal, arrive }: { seal: SealView; arrive?: boolean }) {
  return (
    <p className="seal-line">
      <WitnessMark state={states[seal.state]} size={18} arrive={arrive} />
      <span>
        {words(seal)} {seal.state === 'sealed' && seal.shortHash && <code>{seal.shortHash}</code>}
      </span>
    </p>
  );
}
