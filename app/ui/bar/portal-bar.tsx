import { Link } from 'react-router';
import { WitnessMark } from '../mark/witness-mark.tsx';

/** Whose portal this is: the shop's name and town. */
export function PortalBar({ home, shop, town }: { home: string; shop: string; town: string }) {
  return (
    <header className="portal-header">
      <Link to={home} className="portal-bar">
        <WitnessMark state="aligned" size={30} />
        <span>
          <b>{shop}</b>
          <small>{town}</small>
        </span>
      </Link>
    </header>
  );
}
