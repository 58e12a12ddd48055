import type { Route } from './+types/warranty';
import { viewerContext } from '#app/context.ts';
import { dateYear } from '#app/lib/format/date.ts';
import { refuse } from '#app/lib/problem.ts';
import { useChanges } from '#app/lib/use-changes.ts';
import { PortalTabs } from '#app/ui/bar/portal-tabs.tsx';
import { ButtonLink } from '#app/ui/control/button.tsx';
import { EmptyState } from '#app/ui/empty-state.tsx';
import { PortalPage } from '#app/ui/portal/portal-page.tsx';
import { WarrantyCard } from '#app/ui/portal/warranty-card.tsx';
import { kindInSentence } from '#domain/instrument-kinds.ts';
import { getOwnCase } from '#server/cases/get-own-case.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { getWarranty } from '#server/warranty/get-warranty.ts';

export async function loader({ context, params }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const [own, warranty, { timeZone: zone }] = await Promise.all([
    getOwnCase(viewer, { number: params.number }),
    getWarranty(viewer, { caseNumber: params.number }),
    readShop(),
  ]).catch(refuse);
  return {
    number: own.number,
    version: own.version,
    kind: own.kind,
    maker: own.maker,
    warranty: warranty && {
      code: warranty.code,
      term: `${warranty.term}, to ${dateYear(warranty.validUntil, zone)}`,
      covers: `Covers: ${warranty.work.map(({ text }) => text).join('; ')}.`,
      standing: warranty.standing ?? 'not stated',
      paper: warranty.paperId && `/api/papers/${warranty.paperId}`,
      check: `/verify/${warranty.code.replaceAll('-', '')}`,
    },
  };
}

export default function OwnWarrantyPage({ loaderData }: Route.ComponentProps) {
  const { number, version, kind, maker, warranty } = loaderData;
  useChanges({ case: number, version });
  const here = `/portal/cases/${number}`;
  return (
    <>
      <title>{`Warranty, your ${kindInSentence(kind)} · Witnessmark`}</title>
      <PortalPage title={`Your ${kindInSentence(kind)}`} sub={maker}>
        {warranty ? (
          <WarrantyCard
            term={warranty.term}
            covers={warranty.covers}
            number={warranty.code}
            rows={[{ label: 'Standing', value: warranty.standing }]}
          >
            <p className="mt-4 grid gap-3">
              {warranty.paper && (
                <ButtonLink to={warranty.paper} kind="primary" size="tall" wide reloadDocument>
                  Open the warranty, a PDF
                </ButtonLink>
              )}
              <ButtonLink to={warranty.check} size="tall" wide>
                Check it as a stranger would
              </ButtonLink>
            </p>
          </WarrantyCard>
        ) : (
          <div className="px-4.5 pt-6">
            <EmptyState
              missing="There is no warranty yet."
              filledBy="It comes when the work is done and the case is closed, and you are told by e-mail."
            />
          </div>
        )}
      </PortalPage>
      <PortalTabs
        tabs={[
          { label: 'Now', href: here },
          { label: 'Timeline', href: `${here}/timeline` },
          { label: 'Warranty', href: `${here}/warranty`, current: true },
        ]}
      />
    </>
  );
}
