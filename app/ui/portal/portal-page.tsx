import type { ReactNode } from 'react';

interface Props {
  /** "Your parlour guitar" */
  title: string;
  /** "Aldous Pike, serial 0417", "Ready to go home since Friday 24 April" */
  sub: ReactNode;
  children: ReactNode;
}

/** A page of the portal: the phone's column, in the middle of a wider screen. */
export function PortalPage({ title, sub, children }: Props) {
  return (
    <main className="portal-page">
      <div className="portal-head">
        <h1>{title}</h1>
        <p>{sub}</p>
      </div>
      {children}
    </main>
  );
}
