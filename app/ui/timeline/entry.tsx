import type { ReactNode } from 'react';
import { Tick } from '../mark/tick.tsx';
import { PhotoGroup } from '../photo/photo-group.tsx';
import { RestClock } from '../rest/rest-clock.tsx';
import type { TimelineEntryView } from '../types.ts';
import { Facts } from './facts.tsx';
import { SealLine } from './seal-line.tsx';
import { UsedList } from './used-list.tsx';

const ticks = { sealed: 'aligned', open: 'hollow', altered: 'displaced' } as const;

const sizes = {
  bench: {
    single:
      '(min-width: 68.75rem) 540px, (min-width: 40rem) calc(100vw - 252px), calc(100vw - 100px)',
    pair: '(min-width: 68.75rem) 262px, (min-width: 40rem) calc(50vw - 130px), calc(100vw - 100px)',
  },
  portal: {
    single: '(min-width: 40rem) 604px, calc(100vw - 36px)',
    pair: '(min-width: 40rem) 604px, calc(100vw - 36px)',
  },
};

interface Props {
  entry: TimelineEntryView;
  portal?: boolean;
  eager?: boolean;
  /** What staff can do with it: edit, seal, add a correction. */
  actions?: ReactNode;
}

/** One dated record of a case. */
export function Entry({ entry, portal, eager, actions }: Props) {
  const { when } = entry;
  const facts = <Facts facts={entry.facts} />;
  return (
    <article className="entry" id={`entry-${entry.id}`}>
      <p className="entry-when">
        <time dateTime={when.iso}>
          <b>{when.date}</b> <span>{when.time}</span>
        </time>
        {when.caution && <span className="block">{when.caution}</span>}
      </p>
      <Tick state={ticks[entry.seal.state]} />
      <div className="entry-body">
        <h3>{entry.title}</h3>
        {entry.benchOnly && <p className="text-label font-semibold text-ink-2">Bench only</p>}
        {entry.corrects && (
          <p className="text-label text-ink-2">
            Corrects <a href={`#entry-${entry.corrects.id}`}>{entry.corrects.title}</a>
          </p>
        )}
        {entry.text
          .split(/\n\s*\n/)
          .filter(Boolean)
          .map((paragraph, i) => (
            <p key={i} className="note">
              {paragraph}
            </p>
          ))}
        <PhotoGroup
          photos={entry.photos}
          sizes={portal ? sizes.portal : sizes.bench}
          stacked={portal}
          eager={eager}
          beside={entry.facts.length > 0 ? facts : undefined}
        />
        {entry.rest && <RestClock rest={entry.rest} />}
        <UsedList used={entry.used} />
        <SealLine seal={entry.seal} />
        {actions}
      </div>
    </article>
  );
}
