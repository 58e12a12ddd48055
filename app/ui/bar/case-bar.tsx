import { Link } from 'react-router';
import { Icon } from '../icon.tsx';
import './staff-bar.css';

interface Props {
  back: { href: string; label: string };
  title: string;
  /** "All but 1 photo is up" */
  status?: string;
}

/** On the phone, over a case file: back, where one is, how the photos are doing. */
export function CaseBar({ back, title, status }: Props) {
  return (
    <header className="case-bar on-ebony">
      <Link to={back.href} aria-label={back.label}>
        <Icon name="left" size={24} />
      </Link>
      {title}
      {status && <small>{status}</small>}
    </header>
  );
}
