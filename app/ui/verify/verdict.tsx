import type { ReactNode } from 'react';
import { HALF_LARGE } from '../mark/strokes.ts';
import type { VerdictKind } from '../types.ts';
import './verify.css';

export const verdictWords: Record<VerdictKind, string> = {
  intact: 'Intact',
  'does-not-match': 'Does not match',
  'not-known': 'Not known',
  'not-fully-checked': 'Not fully checked',
};

interface Props {
  kind: VerdictKind;
  /** What the verdict means here. */
  sentence: ReactNode;
  /** The answer has just come: the halves move into place, once. */
  arrive?: boolean;
}

function Half({ side, hollow }: { side: 'left' | 'right'; hollow: boolean }) {
  return (
    <svg className={`half half-${side}`} viewBox="0 0 126 86" aria-hidden>
      <path
        d={HALF_LARGE}
        transform={side === 'right' ? 'rotate(180 63 43)' : undefined}
        strokeLinejoin="round"
        {...(hollow
          ? { fill: 'none', stroke: 'currentColor', strokeWidth: 2 }
          : { fill: 'currentColor' })}
      />
    </svg>
  );
}

/** One of the four verdicts, on the seam: word, mark, sentence. */
export function Verdict({ kind, sentence, arrive }: Props) {
  const hollow = kind === 'not-known' || kind === 'not-fully-checked';
  return (
    <section className={`verdict verdict-${kind} ${arrive ? 'verdict-arrive' : ''}`}>
      <div className="verdict-word">
        <p className="small-label">Verdict</p>
        <p>{verdictWords[kind]}</p>
      </div>
      <div className="verdict-halves">
        <Half side="left" hollow={hollow} />
        <Half side="right" hollow={hollow} />
      </div>
      <p className="verdict-sentence">{sentence}</p>
    </section>
  );
}
