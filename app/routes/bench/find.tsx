import { Form, Link } from 'react-router';
import type { Route } from './+types/find';
import { viewerContext } from '#app/context.ts';
import { dateYear } from '#app/lib/format/date.ts';
import { counted } from '#app/lib/format/number.ts';
import { refuse } from '#app/lib/problem.ts';
import { thumbView } from '#app/lib/views/photo-view.ts';
import { Button } from '#app/ui/control/button.tsx';
import { TextField } from '#app/ui/control/text-field.tsx';
import { EmptyState } from '#app/ui/empty-state.tsx';
import { CASE_STATE_WORDS } from '#domain/case-state.ts';
import { findCases, MOST_FOUND } from '#server/cases/find-cases.ts';
import { readShop } from '#server/shop/read-shop.ts';

export async function loader({ context, url }: Route.LoaderArgs) {
  const words = url.searchParams.get('q')?.slice(0, 160) ?? '';
  const [cases, { timeZone: zone }] = await Promise.all([
    findCases(context.get(viewerContext), { words }),
    readShop(),
  ]).catch(refuse);
  return {
    words,
    full: cases.length === MOST_FOUND,
    cases: cases.map(({ number, kind, maker, serial, owner, job, takenInAt, state, thumb }) => ({
      number,
      instrument: [kind, maker, serial].filter((part) => part !== null).join(', '),
      owner,
      job,
      state: CASE_STATE_WORDS[state.state],
      takenIn: dateYear(takenInAt, zone),
      thumb: thumb && thumbView(thumb),
    })),
  };
}

export default function FindPage({ loaderData }: Route.ComponentProps) {
  const { words, cases, full } = loaderData;
  const found = counted(cases.length, 'case', 'cases');
  return (
    <main className="mx-auto max-w-[60rem] px-8 pt-6 pb-16 max-phone:px-4" aria-label="Search">
      <title>Find a case · Witnessmark</title>
      <h1 className="mb-5">Find a case</h1>
      <Form role="search" aria-label="Cases" className="mb-7 flex flex-wrap items-end gap-3">
        <div className="min-w-0 flex-1 basis-64">
          <TextField
            key={words}
            label="Case, serial or owner"
            name="q"
            type="search"
            defaultValue={words}
            maxLength={120}
          />
        </div>
        <Button icon="search">Find</Button>
      </Form>
      {words !== '' && cases.length === 0 && (
        <EmptyState
          missing={`No case was found under “${words}”.`}
          filledBy="Try the number on its tag, the beginning of the serial, or a part of the owner’s name."
        />
      )}
      {cases.length > 0 && (
        <p role="status" className="mb-3 text-ink-2">
          {found}
          {full && ' or more: add to the words to narrow it'}
        </p>
      )}
      <ul className="grid gap-2.5">
        {cases.map((one) => (
          <li key={one.number}>
            <Link
              to={`/bench/cases/${one.number}`}
              className="panel flex min-h-20 items-center gap-4 px-4 py-3 no-underline"
            >
              <span className="mat mat-small w-18 shrink-0">
                <span className="mat-window">
                  {one.thumb ? (
                    <img
                      src={one.thumb.src}
                      width={one.thumb.width}
                      height={one.thumb.height}
                      alt=""
                      loading="lazy"
                    />
                  ) : (
                    <span className="mat-empty" />
                  )}
                </span>
              </span>
              <span className="min-w-0">
                <b>
                  {one.number}, {one.instrument}
                </b>
                <span className="block text-ink-2">
                  {one.owner}. {one.job}
                </span>
                <span className="block text-label text-ink-3">
                  {one.state}. Taken in {one.takenIn}.
                </span>
              </span>
            </Link>
          </li>
        ))}
      </ul>
    </main>
  );
}
