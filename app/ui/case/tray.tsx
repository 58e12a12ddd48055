import type { TrayPartView } from '../types.ts';
import './case.css';

/** The parts that are off, one in each cell, with the place where each is. */
export function Tray({ parts }: { parts: TrayPartView[] }) {
  return (
    <section aria-labelledby="tray">
      <h2 id="tray" className="mb-2.5 text-lead">
        Tray
      </h2>
      <ul className="tray">
        {parts.map((part) => (
          <li key={part.name}>
            <b>{part.name}</b>
            {part.place}
          </li>
        ))}
      </ul>
      {parts.length === 0 && <p className="mt-2 text-label text-ink-2">Nothing is off.</p>}
    </section>
  );
}
