import type { Route } from './+types/case';
import { viewerContext } from '#app/context.ts';
import { shortDay } from '#app/lib/format/date.ts';
import { refuse } from '#app/lib/problem.ts';
import { useChanges } from '#app/lib/use-changes.ts';
import type { Sight } from '#app/lib/views/entry-view.ts';
import { sealView } from '#app/lib/views/entry-view.ts';
import { photoView } from '#app/lib/views/photo-view.ts';
import { ButtonLink } from '#app/ui/control/button.tsx';
import { EmptyState } from '#app/ui/empty-state.tsx';
import { LatestPhoto } from '#app/ui/portal/latest-photo.tsx';
import { PortalNow } from '#app/ui/portal/portal-now.tsx';
import { Stations } from '#app/ui/timeline/stations.tsx';
import type { TimelineEntry } from '#domain/timeline.ts';
import { CaseFrame } from './case-frame.tsx';
import { loadOwnCase } from './load-own-case.ts';
import { nowView, stationsView } from './now-view.ts';

/** The newest sealed photo, and the seal it stands under. */
function latestPhoto(timeline: TimelineEntry[], sight: Sight) {
  const entry = timeline.findLast(({ photos }) => photos.some(({ state }) => state === 'ready'));
  const photo = entry?.photos.findLast(({ state }) => state === 'ready');
  if (!entry || !photo) return null;
  const view = photoView(photo, sight.photoHref?.(photo.n));
  const taken = shortDay(entry.occurredAt ?? entry.writtenAt, sight.zone);
  return {
    photo: { ...view, caption: `${view.caption}, ${taken}` },
    seal: sealView(entry, sight, { alone: true }),
  };
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
    maker: own.maker,
    serial: own.serial,
    now: nowView(own, sight),
    latest: latestPhoto(timeline, sight),
    stations: stationsView(own, timeline, sight),
    photos,
  };
}

export default function OwnCasePage({ loaderData }: Route.ComponentProps) {
  const { number, version, kind, maker, serial, now, latest, stations, photos } = loaderData;
  useChanges({ case: number, version });
  const sub = (
    <>
      {maker}
      {serial !== null && (
        <>
          , serial <code>{serial}</code>
        </>
      )}
    </>
  );
  return (
    <CaseFrame number={number} kind={kind} sub={sub} tab="now" photos={photos}>
      <div className="px-4.5 pt-4">
        <PortalNow now={now} />
        {latest ? (
          <LatestPhoto photo={latest.photo} seal={latest.seal} />
        ) : (
          <div className="mt-7">
            <EmptyState
              missing="No photo is sealed yet."
              filledBy="The first one appears here by itself, and you are told by e-mail."
            />
          </div>
        )}
        <section aria-labelledby="stations">
          <h2 id="stations" className="portal-section">
            Where it has been
          </h2>
          <Stations stations={stations} />
        </section>
        <p className="mt-4">
          <ButtonLink to={`/portal/cases/${number}/timeline`} size="tall" wide>
            See the whole timeline
          </ButtonLink>
        </p>
      </div>
    </CaseFrame>
  );
}
