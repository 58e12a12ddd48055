import { Link } from 'react-router';

/** Whose cases the Rack shows: everyone's, or one person's. */
export interface WhoseView {
  label: string;
  href: string;
  current: boolean;
}

/** A few links side by side, in the shape of a choice: each is a page of its own. */
export function Whose({ choices }: { choices: WhoseView[] }) {
  return (
    <nav className="seg" aria-label="Whose cases">
      {choices.map(({ label, href, current }) => (
        <Link key={href} to={href} aria-current={current ? 'page' : undefined}>
          {label}
        </Link>
      ))}
    </nav>
  );
}
