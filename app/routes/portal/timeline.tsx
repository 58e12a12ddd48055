import type { Route } from './+types/timeline';
import { viewerContext } from '#app/context.ts';
import { dateOnly, dayTime, longDay } from '#app/lib/format/date.ts';
import { counted } from '#app/lib/format/number.ts';
import { refuse } from '#app/lib/problem.ts';
import { useChanges } from '#app/lib/use-changes.ts';
import type { Sight } from '#app/lib/views/entry-view.ts';
import { phasesView } from '#app/lib/views/phases-view.ts';
import { photoView } from '#app/lib/views/photo-view.ts';
import { Compare } from '#app/ui/compare/compare.tsx';
import { EmptyState } from '#app/ui/empty-state.tsx';
import { SealedBanner } from '#app/ui/portal/sealed-banner.tsx';
import { Timeline } from '#app/ui/timeline/timeline.tsx';
import { CASE_STATE_WORDS } from '#domain/case-state.ts';
import type { TimelineEntry } from '#domain/timeline.ts';
import type { OwnCase } from '#server/cases/read-own-cases.ts';
import { CaseFrame } from './case-frame.tsx';
import { comparePair, type Placed } from './compare-pair.ts';
import { loadOwnCase } from './load-own-case.ts';

function compareView(timeline: TimelineEntry[], { zone }: Sight) {
  const pair = comparePair(timeline);
  if (!pair) return null;
  const date = ({ entry }: Placed) => dateOnly(entry.occurredAt ?? entry.writtenAt, zone);
  return {
    before: photoView(pair.before.photo),
    after: photoView(pair.after.photo),
    dates: `Left ${date(pair.before)}, right ${date(pair.after)}.`,
    shape: pair.after.photo.height > pair.after.photo.width ? 3 / 4 : 4 / 3,
  };
}

function closedView(timeline: TimelineEntry[], { zone }: Sight) {
  const close = timeline.findLast(({ kind }) => kind === 'close');
  if (!close?.seal) return null;
  const photos = timeline.reduce((sum, { photos: own }) => sum + own.length, 0);
  const counts = `${counted(timeline.length, 'entry', 'entries')} and ${counted(photos, 'photo', 'photos')}`;
  const by = close.seal.by === null ? '' : `, by ${close.seal.by}`;
  return {
    lead: `Closed and sealed ${dayTime(close.seal.at, zone)}${by}`,
    text: `You see ${counts}. Whatever is corrected later stands beside what it corrects.`,
  };
}

function subOf({ state, closedAt, handedBackAt }: OwnCase, zone: string): string {
  const words = CASE_STATE_WORDS[state.state].replace('the owner', 'you');
  const at = handedBackAt ?? closedAt;
  return at ? `${words} since ${longDay(at, zone)}` : words;
}

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const { own, timeline, sight, photos } = await loadOwnCase(
    viewer,
    params.number,
    url.searchParams.get('photo'),
  ).catch(refuse);
  return {
    number: own.number,
    version: own.version,
    kind: own.kind,
    sub: subOf(own, sight.zone),
    compare: compareView(timeline, sight),
    closed: closedView(timeline, sight),
    phases: phasesView(timeline, sight).filter(({ entries }) => entries.length > 0),
    photos,
  };
}

export default function OwnTimelinePage({ loaderData }: Route.ComponentProps) {
  const { number, version, kind, sub, compare, closed, phases, photos } = loaderData;
  useChanges({ case: number, version });
  return (
    <CaseFrame number={number} kind={kind} sub={sub} tab="timeline" photos={photos}>
      {compare && (
        <div className="mt-4">
          <Compare {...compare} sizes="(min-width: 40rem) 640px, 100vw" edge />
        </div>
      )}
      {closed && <SealedBanner {...closed} />}
      {phases.length > 0 ? (
        <Timeline phases={phases} portal eagerFirst={!compare} />
      ) : (
        <div className="mx-4.5 mt-7">
          <EmptyState
            missing="Nothing is sealed yet."
            filledBy="The first entry appears here by itself, and you are told by e-mail."
          />
        </div>
      )}
    </CaseFrame>
  );
}
