import type { ReactNode } from 'react';
import { PlainRows } from './portal-now.tsx';

interface Props {
  /** "Two years, to 24 April 2028" */
  term: string;
  /** "Covers the bridge joint, the crack with its three cleats, and the back seam." */
  covers: string;
  /** "K7QM-3RXT-V2" */
  number: string;
  /** Further rows, such as its standing. */
  rows?: { label: string; value: string }[];
  /** "Open the warranty summary" */
  children: ReactNode;
}

/** The warranty as the owner sees it. */
export function WarrantyCard({ term, covers, number, rows = [], children }: Props) {
  return (
    <section className="panel mx-4.5 mt-6 border-line-strong p-4.5" aria-labelledby="warranty">
      <p className="text-micro text-ink-3">Warranty</p>
      <h2 id="warranty" className="mt-0.5 mb-2.5 text-h3">
        {term}
      </h2>
      <p className="leading-[1.45] text-ink-2">{covers}</p>
      <PlainRows rows={[...rows, { label: 'Number', value: number, mono: true }]} />
      {children}
    </section>
  );
}
