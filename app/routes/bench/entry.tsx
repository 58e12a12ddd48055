import { useRef, useState } from 'react';
import { Form, Link, redirect, useSearchParams } from 'react-router';
import type { Route } from './+types/entry';
import { viewerContext } from '#app/context.ts';
import { fieldsOf } from '#app/lib/field-of.ts';
import { refuse } from '#app/lib/problem.ts';
import { retry } from '#app/lib/retry.ts';
import { AddHead } from '#app/ui/add/add-head.tsx';
import { Button, ButtonLink } from '#app/ui/control/button.tsx';
import { useFirstWrongField } from '#app/ui/control/use-first-wrong-field.ts';
import { Icon } from '#app/ui/icon.tsx';
import { Notice } from '#app/ui/notice.tsx';
import type { GoingUpView } from '#app/ui/types.ts';
import { PhotoDrop } from '#app/ui/uploads/photo-drop.tsx';
import { clockIn } from '#domain/calendar.ts';
import { Conflict, NotFound } from '#domain/errors.ts';
import { may } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { getCase } from '#server/cases/get-case.ts';
import { editEntry } from '#server/entries/edit-entry.ts';
import { listTimeline } from '#server/entries/list-timeline.ts';
import { removeDraft } from '#server/entries/remove-draft.ts';
import { sealEntry } from '#server/record/seal-entry.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { BesideTag } from './beside-tag.tsx';
import { caseTagView } from './case-view.ts';
import { EntryForm } from './entry-form.tsx';
import { entryInput } from './entry-input.ts';
import { entryValues } from './entry-values.ts';
import type { BenchHandle } from './layout.tsx';
import { openTiles } from './open-tiles.ts';
import { comingPhotos, entryPhotos } from './named-photos.ts';
import { PhotoWords } from './photo-words.tsx';
import { SealAsk } from './seal-ask.tsx';

export const handle: BenchHandle = { bar: 'none' };

async function loadEntry(viewer: Viewer, number: string, entryId: string) {
  const [file, timeline, { timeZone: zone }] = await Promise.all([
    getCase(viewer, { number }),
    listTimeline(viewer, { caseNumber: number }),
    readShop(),
  ]);
  const entry = timeline.find(({ id }) => id === entryId);
  if (!entry) throw new NotFound('No such entry is on this case. Open the case again.');
  if (entry.seal)
    throw new Conflict(
      'This entry is sealed. It is not changed any more; add a correction instead.',
    );
  return {
    number,
    entryId,
    tag: caseTagView(file, { now: new Date(), zone }),
    title: `${file.ordinal}, ${file.kind}`,
    values: entryValues(entry, (at) => clockIn(at, zone)),
    photos: entryPhotos(entry),
    missing: entry.expected.length,
    preparing: entry.photos.filter(({ state }) => state === 'waiting').length,
    version: file.version,
    shared: entry.visibility === 'shared',
    corrects: entry.corrects?.title ?? null,
    deskOnly: !may(viewer, 'add entry'),
    maySeal: may(viewer, 'seal', {
      own: viewer.kind === 'staff' && entry.writtenById === viewer.personId,
    }),
    from: (entry.occurredAt ?? entry.writtenAt).toISOString(),
    zone,
  };
}

export async function loader({ context, params }: Route.LoaderArgs) {
  return loadEntry(context.get(viewerContext), params.number, params.entry).catch(refuse);
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const viewer = context.get(viewerContext);
  const entry = { caseNumber: params.number, entryId: params.entry };
  const here = `/bench/cases/${params.number}`;
  const form = await request.formData();
  try {
    switch (form.get('intent')) {
      case 'seal':
        await sealEntry(viewer, entry);
        return redirect(`${here}?sealed#entry-${params.entry}`);
      case 'remove':
        await removeDraft(viewer, entry);
        return redirect(here);
      case 'save-and-seal':
        await editEntry(viewer, { ...entry, ...entryInput(form) });
        return redirect(`${here}/entries/${params.entry}?ask=seal`);
      default:
        await editEntry(viewer, { ...entry, ...entryInput(form) });
        return redirect(`${here}#entry-${params.entry}`);
    }
  } catch (error) {
    return retry(error, form);
  }
}

export default function EntryPage({ loaderData, actionData }: Route.ComponentProps) {
  const { number, entryId, title, corrects, deskOnly, from, zone, maySeal } = loaderData;
  const [search] = useSearchParams();
  const [coming, setComing] = useState<GoingUpView[]>([]);
  const form = useRef<HTMLFormElement>(null);
  useFirstWrongField(form, actionData);
  const asks = search.get('ask') === 'seal' && maySeal;
  const here = `/bench/cases/${number}`;
  const values = actionData?.values['draft.title'] ? actionData.values : loaderData.values;
  const field = fieldsOf({ values, fields: actionData?.fields });
  return (
    <BesideTag tag={loaderData.tag}>
      <title>{`${asks ? 'Seal' : 'Change'} an entry, ${number} · Witnessmark`}</title>
      <AddHead
        title={asks ? 'Seal the entry' : corrects ? 'Correction' : 'Change the entry'}
        sub={title}
        back={
          <Link to={`${here}#entry-${entryId}`} aria-label="Back to the case">
            <Icon name="left" size={24} />
          </Link>
        }
      />
      {actionData && (
        <Notice tone="failed" lead={actionData.problem} className="mx-3.5 mt-3.5" alert />
      )}
      {asks ? (
        <SealAsk
          title={loaderData.values['draft.title'] ?? ''}
          shared={loaderData.shared}
          photos={loaderData.photos.length - loaderData.missing}
          missing={loaderData.missing}
          preparing={loaderData.preparing}
          changes={{ case: number, version: loaderData.version }}
          back={`${here}/entries/${entryId}`}
        />
      ) : (
        <>
          <PhotoDrop caseNumber={number} entryId={entryId} onPhotos={setComing} />
          <Form method="post" ref={form} noValidate className="flex flex-1 flex-col">
            <div className="grid gap-4 p-3.5">
              {corrects && (
                <p className="text-label text-ink-2">
                  Corrects “{corrects}”. The sealed entry stays as it is; this stands beside it.
                </p>
              )}
              <EntryForm
                field={field}
                open={openTiles(values)}
                deskOnly={deskOnly}
                from={from}
                zone={zone}
              >
                <PhotoWords
                  photos={[...loaderData.photos, ...comingPhotos(coming, loaderData.photos)]}
                  field={field}
                />
              </EntryForm>
            </div>
            <div className="add-foot grid gap-3">
              <Button kind="primary" size="big" wide name="intent" value="save">
                Keep the draft
              </Button>
              {maySeal && (
                <Button size="tall" wide name="intent" value="save-and-seal">
                  Keep it, then seal it
                </Button>
              )}
            </div>
          </Form>
          <RemoveAsk />
        </>
      )}
    </BesideTag>
  );
}

/** Removing asks once, without a script too: the button lies under a fold. */
function RemoveAsk() {
  return (
    <details className="p-3.5">
      <summary className="min-h-11 py-2 font-semibold">Remove this draft</summary>
      <Form method="post" className="grid gap-3 pt-2">
        <p>It has not been sealed, so it leaves no trace. Its photos stay in the case.</p>
        <Button kind="grave" name="intent" value="remove">
          Remove it
        </Button>
        <ButtonLink to="." kind="text">
          Keep it
        </ButtonLink>
      </Form>
    </details>
  );
}
