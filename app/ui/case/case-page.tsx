import type { ReactNode } from 'react';
import './case.css';

interface Props {
  /** "Case file 2026-031, parlour guitar by Aldous Pike": the page's heading, for those who do not see the tag. */
  heading: string;
  tag: ReactNode;
  next: ReactNode;
  /** Tabs and what they show. */
  children: ReactNode;
}

/** A case file: tag, timeline, what is next. The phone has them below each other. */
export function CasePage({ heading, tag, next, children }: Props) {
  return (
    <main className="case-page" aria-label="Case file">
      <h1 className="sr-only">{heading}</h1>
      <div className="case-left">
        <div>{tag}</div>
      </div>
      <div className="case-middle">{children}</div>
      <div className="case-next">{next}</div>
    </main>
  );
}
