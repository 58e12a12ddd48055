import type { ReactNode } from 'react';
import type { PhaseView, TimelineEntryView } from '../types.ts';
import { PhaseSection } from './phase-section.tsx';

interface Props {
  phases: PhaseView[];
  /** The owner's view: the phone's layout, photos from edge to edge. */
  portal?: boolean;
  /** Fetch its first photo at once, where no larger picture stands above it. */
  eagerFirst?: boolean;
  actions?: (entry: TimelineEntryView) => ReactNode;
}

/** The timeline of a case: Before, During, After, on a joint that closes. */
export function Timeline({ phases, portal, eagerFirst, actions }: Props) {
  const first = phases.find((phase) => phase.entries.some((entry) => entry.photos.length > 0));
  return (
    <div className={`tl ${portal ? 'tl-portal' : ''}`}>
      {phases.map((phase) => (
        <PhaseSection
          key={phase.phase}
          phase={phase}
          portal={portal}
          eager={eagerFirst && phase === first}
          actions={actions}
        />
      ))}
    </div>
  );
}
