import type { Route } from './+types/rack';
import { viewerContext } from '#app/context.ts';
import { longDayTime } from '#app/lib/format/date.ts';
import { countedInWords } from '#app/lib/format/number.ts';
import { refuse } from '#app/lib/problem.ts';
import { useChanges } from '#app/lib/use-changes.ts';
import { Dock } from '#app/ui/bar/dock.tsx';
import { ButtonLink } from '#app/ui/control/button.tsx';
import { Rack } from '#app/ui/tag/rack.tsx';
import { listRack } from '#server/cases/list-rack.ts';
import { listTrouble } from '#server/jobs/list-trouble.ts';
import { listPeople } from '#server/shop/list-people.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { railsView } from './rack-view.ts';
import { TroubleNotice } from './trouble-notice.tsx';
import { Whose } from './whose.tsx';

const firstName = (name: string) => name.split(' ')[0] ?? name;

export async function loader({ context, url }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const who = url.searchParams.get('who');
  const now = new Date();
  const [{ timeZone: zone }, people] = await Promise.all([readShop(), listPeople(viewer)]).catch(
    refuse,
  );
  const chosen = people.find(({ id }) => id === who);
  const technicianId = chosen?.id ?? null;
  const [cases, trouble] = await Promise.all([
    listRack(viewer, { technicianId }, { now }),
    listTrouble(viewer, { number: null }),
  ]).catch(refuse);
  const bench = people.filter(({ role }) => role !== 'desk');
  return {
    sub: `${longDayTime(now, zone)}. ${countedInWords(cases.length, 'open case', 'open cases')}.`,
    rails: railsView(cases, { now, zone }),
    trouble: trouble.map(({ sentence }) => sentence),
    whose: [
      { label: 'Everyone', href: '/bench', current: technicianId === null },
      ...bench.map(({ id, name }) => ({
        label: firstName(name),
        href: `/bench?who=${id}`,
        current: id === technicianId,
      })),
    ],
  };
}

export default function RackPage({ loaderData }: Route.ComponentProps) {
  const { sub, rails, whose, trouble } = loaderData;
  useChanges({});
  const takeIn = (big: boolean) => (
    <ButtonLink
      to="/bench/take-in"
      kind="primary"
      icon="plus"
      size={big ? 'big' : 'normal'}
      wide={big}
    >
      Take in an instrument
    </ButtonLink>
  );
  return (
    <>
      <title>Rack · Witnessmark</title>
      <div className="mx-auto max-w-360 px-8 max-phone:px-4">
        <TroubleNotice sentences={trouble} />
      </div>
      <Rack sub={sub} rails={rails} takeIn={takeIn(false)} whose={<Whose choices={whose} />} />
      <Dock>{takeIn(true)}</Dock>
    </>
  );
}
