import type { Route } from './+types/home';
import { viewerContext } from '#app/context.ts';
import { refuse } from '#app/lib/problem.ts';
import { useChanges } from '#app/lib/use-changes.ts';
import { thumbView } from '#app/lib/views/photo-view.ts';
import { EmptyState } from '#app/ui/empty-state.tsx';
import { CaseLink } from '#app/ui/portal/case-link.tsx';
import { PortalPage } from '#app/ui/portal/portal-page.tsx';
import { listOwnInstruments } from '#server/cases/list-own-instruments.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { nowView } from './now-view.ts';

export async function loader({ context }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const now = new Date();
  const [own, { timeZone: zone }] = await Promise.all([
    listOwnInstruments(viewer, { now }),
    readShop(),
  ]).catch(refuse);
  return {
    name: viewer.kind === 'customer' ? viewer.name : '',
    items: own.map((one) => {
      const { state, tone, sentence } = nowView(one, { now, zone });
      const { number, kind, maker, thumb } = one;
      return {
        href: `/portal/cases/${number}`,
        instrument: kind,
        photo: thumb ? { ...thumbView(thumb), alt: '' } : undefined,
        ...{ maker, number, state, tone, sentence },
      };
    }),
  };
}

export default function PortalHome({ loaderData }: Route.ComponentProps) {
  const { name, items } = loaderData;
  useChanges({});
  return (
    <PortalPage title="My instruments" sub={name}>
      <title>My instruments · Witnessmark</title>
      <div className="px-4.5 pt-4">
        {items.length === 0 ? (
          <EmptyState
            missing="No instrument of yours is on record under this address."
            filledBy="Ask the shop which address they wrote down."
          />
        ) : (
          <ul className="grid gap-3">
            {items.map((item) => (
              <li key={item.href}>
                <CaseLink item={item} />
              </li>
            ))}
          </ul>
        )}
      </div>
    </PortalPage>
  );
}
