import type { ReactNode } from 'react';

interface Props {
  title: string;
  /** One sentence on what belongs here. */
  sub?: string;
  children: ReactNode;
}

/** A part of a long form: its name left, its fields right; below each other on the phone. */
export function FormSection({ title, sub, children }: Props) {
  return (
    <section className="grid gap-x-10 gap-y-4 border-t border-line py-7 bench:grid-cols-[14rem_minmax(0,1fr)]">
      <div>
        <h2 className="text-h3">{title}</h2>
        {sub && <p className="mt-1 text-label text-ink-2">{sub}</p>}
      </div>
      <div className="grid content-start gap-5">{children}</div>
    </section>
  );
}

/** Fields side by side where there is room. */
export function FieldRow({ children }: { children: ReactNode }) {
  return <div className="grid gap-5 phone:grid-cols-2">{children}</div>;
}
