import type { ReactNode } from 'react';
import './add.css';

interface Props {
  title: string;
  sub: string;
  /** Back or close: a link or a button with an icon and a name. */
  back: ReactNode;
  /** The light of the phone, or nothing. */
  extra?: ReactNode;
}

/** Over both steps of Add to timeline. */
export function AddHead({ title, sub, back, extra }: Props) {
  return (
    <header className="add-head on-ebony">
      {back}
      <h1 className="font-sans text-body leading-[1.2] font-semibold tracking-normal">
        {title}
        <small>{sub}</small>
      </h1>
      {extra}
    </header>
  );
}
