import { Link } from 'react-router';
import type { Route } from './+types/warranties';
import { viewerContext } from '#app/context.ts';
import { dateYear } from '#app/lib/format/date.ts';
import { refuse } from '#app/lib/problem.ts';
import { EmptyState } from '#app/ui/empty-state.tsx';
import { readShop } from '#server/shop/read-shop.ts';
import { listWarranties } from '#server/warranty/list-warranties.ts';

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

export async function loader({ context, url }: Route.LoaderArgs) {
  const asked = url.searchParams.get('before');
  const before = asked !== null && UUID.test(asked) ? asked : null;
  const [{ warranties, more }, { timeZone: zone }] = await Promise.all([
    listWarranties(context.get(viewerContext), { before }),
    readShop(),
  ]).catch(refuse);
  return {
    next: more ? (warranties.at(-1)?.id ?? null) : null,
    first: before === null,
    warranties: warranties.map(({ id, code, caseNumber, instrument, owner, step, ...times }) => ({
      ...{ id, code, caseNumber, instrument, owner },
      until: dateYear(times.validUntil, zone),
      issued: step === 'issued' && times.issuedAt ? dateYear(times.issuedAt, zone) : null,
    })),
  };
}

export default function WarrantiesPage({ loaderData }: Route.ComponentProps) {
  const { warranties, next, first } = loaderData;
  return (
    <main className="mx-auto max-w-[64rem] px-8 pt-6 pb-16 max-phone:px-4">
      <title>Warranties · Witnessmark</title>
      <h1>Warranties</h1>
      {warranties.length === 0 ? (
        <div className="mt-8">
          <EmptyState
            missing={first ? 'No warranty is issued yet.' : 'There are no older ones.'}
            filledBy="Close a case, then issue its warranty from there."
          />
        </div>
      ) : (
        <ul className="mt-6 grid gap-2">
          {warranties.map(({ id, code, caseNumber, instrument, owner, issued, until }) => (
            <li key={id} className="panel flex flex-wrap items-baseline gap-x-5 gap-y-1 p-4">
              <Link to={`/bench/cases/${caseNumber}/warranty`} className="font-mono">
                {code}
              </Link>
              <span className="min-w-0 flex-1">
                {instrument}, {owner}, case {caseNumber}
              </span>
              <span className="text-ink-2">
                {issued === null ? 'being issued' : `issued ${issued}, to ${until}`}
              </span>
            </li>
          ))}
        </ul>
      )}
      {next !== null && (
        <p className="mt-6">
          <Link to={`?before=${next}`}>Older ones</Link>
        </p>
      )}
    </main>
  );
}
