import { Link } from 'react-router';
import type { BarLink } from './staff-bar.tsx';

/** Now, Timeline, Warranty: at the foot, in reach of the thumb. */
export function PortalTabs({ tabs }: { tabs: BarLink[] }) {
  return (
    <nav className="portal-tabs" aria-label="Portal">
      {tabs.map((tab) => (
        <Link key={tab.href} to={tab.href} aria-current={tab.current ? 'page' : undefined}>
          {tab.label}
        </Link>
      ))}
    </nav>
  );
}
