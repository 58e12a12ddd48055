import type { ReactNode } from 'react';
import { PhaseMark } from '../mark/phase-mark.tsx';
import { Tick } from '../mark/tick.tsx';
import type { PhaseView, TimelineEntryView } from '../types.ts';
import { Entry } from './entry.tsx';
import { Taper } from './spine.tsx';

const names = { before: 'Before', during: 'During', after: 'After' };

interface Props {
  phase: PhaseView;
  portal?: boolean;
  /** The first photo of the page is in this phase. */
  eager?: boolean;
  actions?: (entry: TimelineEntryView) => ReactNode;
}

/** One phase with its entries, oldest first. */
export function PhaseSection({ phase, portal, eager, actions }: Props) {
  const firstWithPhotos = phase.entries.find((entry) => entry.photos.length > 0);
  return (
    <section className={`phase phase-${phase.phase}`} aria-labelledby={`phase-${phase.phase}`}>
      <Taper phase={phase.phase} />
      <div className="phase-head">
        <span className="phase-glyph">
          <PhaseMark phase={phase.phase} size={26} />
        </span>
        <h2 id={`phase-${phase.phase}`}>{names[phase.phase]}</h2>
        {phase.sub && <p>{phase.sub}</p>}
      </div>
      <ol>
        {phase.entries.map((entry) => (
          <li key={entry.id}>
            <Entry
              entry={entry}
              portal={portal}
              eager={eager && entry === firstWithPhotos}
              actions={actions?.(entry)}
            />
          </li>
        ))}
      </ol>
      {phase.entries.length === 0 && phase.empty && (
        <div className="entry">
          <span className="entry-when" />
          <Tick state="hollow" />
          <p className="entry-body max-w-136 text-ink-2">{phase.empty}</p>
        </div>
      )}
    </section>
  );
}
