import type { ReactNode } from 'react';
import { Form, Link } from 'react-router';
import { Icon } from '../icon.tsx';
import { Wordmark } from '../mark/wordmark.tsx';
import './staff-bar.css';

/** Fret lines of a 1049 mm scale that begins at 345, on a bar 1000 wide: x = L (1 − 2^(−n/12)). */
const frets = Array.from(
  { length: 18 },
  (_, n) => `M${(345 + 1049 * (1 - 2 ** (-n / 12))).toFixed(1)} 0V10`,
).join('');

export interface BarLink {
  label: string;
  href: string;
  current?: boolean;
}

interface Props {
  home: string;
  links: BarLink[];
  person: string;
  shop: string;
  /** Where the search is sent, with `q`. */
  findAction: string;
  query?: string;
  /** Theme, sign-out: what lies under the person's name. */
  menu?: ReactNode;
  /** On a case file the phone shows the case bar instead. */
  deskOnly?: boolean;
}

/** The staff's bar: Rack, Warranty, Verify, search, who is signed in. */
export function StaffBar(props: Props) {
  const { home, links, person, shop, findAction, query, menu, deskOnly } = props;
  const nav = (className: string) => (
    <nav className={className} aria-label="Bench">
      {links.map((link) => (
        <Link key={link.href} to={link.href} aria-current={link.current ? 'page' : undefined}>
          {link.label}
        </Link>
      ))}
    </nav>
  );
  return (
    <header className={`bar on-ebony ${deskOnly ? 'bar-desk' : ''}`}>
      <svg className="bar-frets" viewBox="0 0 1000 10" preserveAspectRatio="none" aria-hidden>
        <path d={frets} vectorEffect="non-scaling-stroke" />
      </svg>
      <Link to={home} aria-label="Witnessmark, Rack" className="grid min-h-11 items-center">
        <Wordmark height={36} />
      </Link>
      {nav('bar-nav')}
      <Form action={findAction} role="search" className="bar-find max-phone:hidden">
        <Icon name="search" size={18} />
        <input
          type="search"
          name="q"
          defaultValue={query}
          aria-label="Case, serial or owner"
          placeholder="Case, serial or owner"
          maxLength={120}
        />
      </Form>
      <Link
        to={findAction}
        aria-label="Search"
        className="ml-auto grid size-11 place-items-center phone:hidden"
      >
        <Icon name="search" size={22} />
      </Link>
      <details className="bar-menu">
        <summary aria-label={`${person}, ${shop}, menu`}>
          <span>
            {person}
            <small>{shop}</small>
          </span>
          <Icon name="menu" size={24} />
        </summary>
        <div className="bar-menu-sheet">
          <p className="bar-menu-who">
            <b>{person}</b>
            <br />
            {shop}
          </p>
          {nav('bar-menu-nav')}
          {menu}
        </div>
      </details>
    </header>
  );
}
