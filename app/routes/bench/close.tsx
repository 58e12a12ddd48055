import { Form, redirect } from 'react-router';
import type { Route } from './+types/close';
import { viewerContext } from '#app/context.ts';
import { longDayTime } from '#app/lib/format/date.ts';
import { counted } from '#app/lib/format/number.ts';
import { refuse } from '#app/lib/problem.ts';
import { retry } from '#app/lib/retry.ts';
import { CaseHead } from '#app/ui/case/case-head.tsx';
import { Button, ButtonLink } from '#app/ui/control/button.tsx';
import { WitnessMark } from '#app/ui/mark/witness-mark.tsx';
import { Notice } from '#app/ui/notice.tsx';
import { Conflict, Invalid } from '#domain/errors.ts';
import type { Viewer } from '#domain/viewer.ts';
import { getCase } from '#server/cases/get-case.ts';
import { tellOwner } from '#server/cases/tell-owner.ts';
import { listTimeline } from '#server/entries/list-timeline.ts';
import { closeCase } from '#server/record/close-case.ts';
import { handBack } from '#server/record/hand-back.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { caseTagView } from './case-view.ts';

async function loadClose(viewer: Viewer, number: string) {
  const now = new Date();
  const [file, timeline, { timeZone: zone }] = await Promise.all([
    getCase(viewer, { number }, { now }),
    listTimeline(viewer, { caseNumber: number }),
    readShop(),
  ]);
  if (file.handedBackAt)
    throw new Conflict('This instrument went home already. Nothing is left to do.');
  const photos = new Set(timeline.flatMap((entry) => entry.photos.map(({ id }) => id)));
  return {
    number,
    tag: caseTagView(file, { now, zone }),
    isClosed: file.closedAt !== null,
    told: file.ownerToldAt && longDayTime(file.ownerToldAt, zone),
    owner: file.owner,
    counts: `${counted(timeline.length, 'entry', 'entries')}, ${counted(photos.size, 'photo', 'photos')}`,
    drafts: timeline.filter(({ seal }) => seal === null).map(({ id, title }) => ({ id, title })),
  };
}

export async function loader({ context, params }: Route.LoaderArgs) {
  return loadClose(context.get(viewerContext), params.number).catch(refuse);
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const viewer = context.get(viewerContext);
  const input = { caseNumber: params.number };
  const form = await request.formData();
  try {
    switch (form.get('intent')) {
      case 'close':
        await closeCase(viewer, input);
        return redirect(`/bench/cases/${params.number}/warranty`);
      case 'told':
        await tellOwner(viewer, input);
        return redirect(`/bench/cases/${params.number}/close`);
      case 'hand back':
        await handBack(viewer, input);
        return redirect(`/bench/cases/${params.number}`);
      default:
        throw new Invalid({}, 'This button is not known here. Open the case again.');
    }
  } catch (error) {
    return retry(error, form);
  }
}

export default function ClosePage({ loaderData, actionData }: Route.ComponentProps) {
  const { number, tag, isClosed } = loaderData;
  const here = `/bench/cases/${number}`;
  return (
    <main className="mx-auto max-w-[42rem] px-8 pt-4 pb-16 max-phone:px-4" aria-label="Close">
      <title>{`${isClosed ? 'Hand back' : 'Close'} ${number} · Witnessmark`}</title>
      <CaseHead tag={tag} />
      {actionData && <Notice tone="failed" lead={actionData.problem} className="mt-4" alert />}
      <section className="panel mt-5 grid gap-5 p-6 max-phone:p-4">
        {isClosed ? <HandBack {...loaderData} /> : <Close {...loaderData} />}
        <ButtonLink to={here} size="tall">
          Back to the case
        </ButtonLink>
      </section>
    </main>
  );
}

type View = Route.ComponentProps['loaderData'];

function Close({ number, counts, drafts }: View) {
  return (
    <>
      <WitnessMark state="hollow" size={120} className="mx-auto text-ink-2" />
      <h1 className="text-h2">Close the case?</h1>
      <p className="text-note">
        It lists {counts}. After this nothing can be altered; corrections are added beside it. The
        owner is told that it is ready to go home.
      </p>
      {drafts.length > 0 && (
        <Notice tone="waiting" lead="Not everything is sealed." icon="note">
          Seal or remove first:
          <ul className="mt-1 list-disc pl-5">
            {drafts.map(({ id, title }) => (
              <li key={id}>
                <a href={`/bench/cases/${number}/entries/${id}`}>{title}</a>
              </li>
            ))}
          </ul>
        </Notice>
      )}
      <Form method="post">
        <Button
          kind="primary"
          size="big"
          wide
          name="intent"
          value="close"
          disabled={drafts.length > 0}
        >
          Close the case
        </Button>
      </Form>
    </>
  );
}

function HandBack({ told, owner }: View) {
  return (
    <>
      <WitnessMark state="aligned" size={120} className="mx-auto text-verdigris" />
      <h1 className="text-h2">Closed. Hand it back?</h1>
      <p className="text-note">
        {told ? `${owner} was told ${told}.` : `${owner} has not been told yet.`} Handing back is
        sealed too, and takes the case off the Rack.
      </p>
      <Form method="post" className="grid gap-3">
        <Button kind="primary" size="big" wide name="intent" value="hand back">
          Hand it back
        </Button>
        <Button size="tall" wide name="intent" value="told">
          {told ? 'Told again, in person or by telephone' : 'Told in person or by telephone'}
        </Button>
      </Form>
    </>
  );
}
