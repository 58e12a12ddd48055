import type { ReactNode } from 'react';
import type { VerdictKind } from '../types.ts';
import { verdictWords } from './verdict.tsx';
import './verify.css';

interface Props {
  kind: VerdictKind;
  /** The form that asks for another number or file. */
  ask?: ReactNode;
  /** Verdict, standing, rows. */
  children: ReactNode;
  /** Card and notices. */
  foot?: ReactNode;
}

/** The answer of Verify. Its region is read out when it changes. */
export function VerifyPage({ kind, ask, children, foot }: Props) {
  return (
    <>
      {ask}
      <main aria-live="polite">
        <div className="seam">
          <h1 className="sr-only">Verdict: {verdictWords[kind]}</h1>
          {children}
        </div>
        {foot && <div className="seam-foot mx-auto max-w-275 max-phone:px-0">{foot}</div>}
      </main>
    </>
  );
}
