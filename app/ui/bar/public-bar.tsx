import { Link } from 'react-router';
import { Wordmark } from '../mark/wordmark.tsx';
import type { BarLink } from './staff-bar.tsx';
import './public-bar.css';

/** Over the pages that anyone may open. */
export function PublicBar({ home, links }: { home: string; links: BarLink[] }) {
  return (
    <header className="public-bar">
      <Link to={home}>
        <Wordmark height={40} />
      </Link>
      <nav aria-label="Verify">
        {links.map((link) => (
          <Link key={link.href} to={link.href} aria-current={link.current ? 'page' : undefined}>
            {link.label}
          </Link>
        ))}
      </nav>
    </header>
  );
}
