import { PHASES, type Phase } from '#domain/entry-draft.ts';
import type { TimelineEntry } from '#domain/timeline.ts';
import type { PhaseView } from '#app/ui/types.ts';
import { dateOnly } from '../format/date.ts';
import { counted } from '../format/number.ts';
import { entryView, type Sight } from './entry-view.ts';

const empty: Record<Phase, string> = {
  before: 'The first photos of how it came in open this phase.',
  during: 'The first entry of the work opens this phase.',
  after: 'The first photo of the finished work opens this phase. The warranty follows.',
};

function sentence(phase: Phase, entries: TimelineEntry[], zone: string): string {
  const [first] = entries;
  if (!first) return 'Nothing here yet.';
  const since = dateOnly(first.occurredAt ?? first.writtenAt, zone);
  const words = {
    before: 'How it came in.',
    during: `On the bench since ${since}.`,
    after: 'How it goes home.',
  };
  const photos = entries.reduce((sum, entry) => sum + entry.photos.length, 0);
  const counts = [counted(entries.length, 'entry', 'entries'), counted(photos, 'photo', 'photos')];
  return `${words[phase]} ${counts.join(', ')}.`;
}

/** A timeline by its three phases, each with its sentence and counts. */
export function phasesView(entries: TimelineEntry[], sight: Sight): PhaseView[] {
  return PHASES.map((phase) => {
    const own = entries.filter((entry) => entry.phase === phase);
    return {
      phase,
      sub: sentence(phase, own, sight.zone),
      entries: own.map((entry) => entryView(entry, sight)),
      empty: empty[phase],
    };
  });
}
