import { useId } from 'react';
import type { RailView } from '../types.ts';
import { RackRow, RackTag } from './rack-tag.tsx';
import './tag.css';

/** More than these stand in lines of text under the same rail. */
const HANGING = 15;

const words: Record<RailView['rail'], { title: string; sub: string; empty: string }> = {
  bench: {
    title: 'On the bench',
    sub: 'someone is working on it',
    empty: 'Nothing is on the bench.',
  },
  resting: { title: 'Resting', sub: 'glue or finish curing', empty: 'Nothing rests.' },
  owner: {
    title: 'Waiting for the owner',
    sub: 'awaiting authorisation',
    empty: 'Nothing waits for an owner.',
  },
  home: {
    title: 'Ready to go home',
    sub: 'inspected, closed, owner told',
    empty: 'Nothing is ready to go home.',
  },
};

/** One rail of the Rack with its tags; it keeps its line when nothing hangs on it. */
export function Rail({ rail, half }: { rail: RailView; half?: boolean }) {
  const headingId = useId();
  const { title, sub, empty } = words[rail.rail];
  const rows = rail.tags.length > HANGING;
  const Item = rows ? RackRow : RackTag;
  return (
    <section aria-labelledby={headingId} className={half ? '' : 'case:col-span-2'}>
      <div className="rail-head">
        <h2 id={headingId}>
          {title}
          <span className="rail-count">{rail.tags.length}</span>
        </h2>
        <p>{sub}</p>
      </div>
      <div className="rail-line">
        {rail.tags.length === 0 ? (
          <p className="pt-4 pb-2 text-ink-2">{empty}</p>
        ) : (
          <ul className={rows ? 'rack-rows' : 'rail-tags'}>
            {rail.tags.map((tag) => (
              <li key={tag.href}>
                <Item tag={tag} />
              </li>
            ))}
          </ul>
        )}
      </div>
    </section>
  );
}
