import { Link } from 'react-router';
import type { BarLink } from '../bar/staff-bar.tsx';
import './case.css';

/** The parts of a case file. */
export function CaseTabs({ tabs }: { tabs: (BarLink & { count?: number })[] }) {
  return (
    <nav className="tabs" aria-label="Case file">
      {tabs.map((tab) => (
        <Link
          key={tab.href}
          to={tab.href}
          aria-current={tab.current ? 'page' : undefined}
          preventScrollReset
        >
          {tab.label}
          {tab.count !== undefined && <small>{tab.count}</small>}
        </Link>
      ))}
    </nav>
  );
}
