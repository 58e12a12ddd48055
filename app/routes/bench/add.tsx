import { useRef, useState } from 'react';
import { Form, Link, redirect, useSearchParams } from 'react-router';
import { v7, validate } from 'uuid';
import type { Route } from './+types/add';
import { viewerContext } from '#app/context.ts';
import { fieldsOf } from '#app/lib/field-of.ts';
import { refuse } from '#app/lib/problem.ts';
import { textOf } from '#app/lib/read-form.ts';
import { retry } from '#app/lib/retry.ts';
import { AddHead } from '#app/ui/add/add-head.tsx';
import { PhotoStrip } from '#app/ui/add/photo-strip.tsx';
import { Button } from '#app/ui/control/button.tsx';
import { useFirstWrongField } from '#app/ui/control/use-first-wrong-field.ts';
import { Icon } from '#app/ui/icon.tsx';
import { Notice } from '#app/ui/notice.tsx';
import type { GoingUpView } from '#app/ui/types.ts';
import { PhotoDrop } from '#app/ui/uploads/photo-drop.tsx';
import { phaseSuggested } from '#domain/phase-suggested.ts';
import { may } from '#domain/rights.ts';
import { getCase } from '#server/cases/get-case.ts';
import { addEntry } from '#server/entries/add-entry.ts';
import { listTimeline } from '#server/entries/list-timeline.ts';
import { listCasePhotos } from '#server/photos/list-case-photos.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { BesideTag } from './beside-tag.tsx';
import { caseTagView } from './case-view.ts';
import { EntryForm } from './entry-form.tsx';
import { entryInput } from './entry-input.ts';
import type { BenchHandle } from './layout.tsx';
import { openTiles } from './open-tiles.ts';
import { comingPhotos, loosePhotos } from './named-photos.ts';
import { PhotoWords } from './photo-words.tsx';

export const handle: BenchHandle = { bar: 'none' };

/** The form is filled in from where it was opened; news must not change it under the hands. */
export const shouldRevalidate = () => false;

/**
 * The entry's id is made here and stands in the address: photos go up under it before there is an
 * entry, also from a page that was loaded again meanwhile.
 */
export async function loader({ context, params: { number }, url }: Route.LoaderArgs) {
  const entryId = url.searchParams.get('entry') ?? '';
  if (!validate(entryId)) throw redirect(`/bench/cases/${number}/add?entry=${v7()}`);
  const viewer = context.get(viewerContext);
  const now = new Date();
  const [file, timeline, photos, { timeZone: zone }] = await Promise.all([
    getCase(viewer, { number }, { now }),
    listTimeline(viewer, { caseNumber: number }),
    listCasePhotos(viewer, { caseNumber: number }),
    readShop(),
  ]).catch(refuse);
  return {
    entryId,
    loose: loosePhotos(viewer, photos),
    number,
    tag: caseTagView(file, { now, zone }),
    title: `${file.ordinal}, ${file.kind}`,
    sub: `${file.maker}, ${file.owner}`,
    isClosed: file.closedAt !== null,
    phase: phaseSuggested({
      state: file.state.state,
      used: timeline.map(({ phase }) => phase),
      authorised: file.estimate?.answer === 'authorised',
    }),
    deskOnly: !may(viewer, 'add entry'),
    from: now.toISOString(),
    zone,
  };
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const form = await request.formData();
  try {
    const { entryId } = await addEntry(context.get(viewerContext), {
      caseNumber: params.number,
      entryId: textOf(form.get('entryId')),
      ...entryInput(form),
    });
    return redirect(`/bench/cases/${params.number}?added=${entryId}#entry-${entryId}`);
  } catch (error) {
    return retry(error, form);
  }
}

export default function AddPage({ loaderData, actionData }: Route.ComponentProps) {
  const { number, entryId, title, sub, phase, deskOnly, from, zone } = loaderData;
  const [photos, setPhotos] = useState<GoingUpView[]>([]);
  const [search] = useSearchParams();
  const form = useRef<HTMLFormElement>(null);
  useFirstWrongField(form, actionData);
  const what = search.get('step') === 'what' || actionData !== undefined;
  const here = `/bench/cases/${number}`;
  const field = fieldsOf(actionData);
  const named = [...loaderData.loose, ...comingPhotos(photos, loaderData.loose)];
  return (
    <BesideTag tag={loaderData.tag}>
      <title>{`Add to timeline, ${number} · Witnessmark`}</title>
      <AddHead
        title={what ? 'What it shows' : title}
        sub={what ? title : sub}
        back={
          <Link
            to={what ? `?entry=${entryId}` : here}
            replace={what}
            preventScrollReset={!what}
            aria-label={what ? 'Back to the photos' : 'Close'}
          >
            <Icon name={what ? 'left' : 'close'} size={24} />
          </Link>
        }
      />
      {loaderData.isClosed && (
        <Notice tone="failed" lead="The case is closed." className="m-3.5">
          Nothing is added to it any more. Add a correction beside the entry it corrects.
        </Notice>
      )}
      <div className={`add-step ${what ? 'max-phone:hidden' : ''}`}>
        <PhotoDrop caseNumber={number} entryId={entryId} onPhotos={setPhotos} />
        <p className="p-3.5 phone:hidden">
          <Link
            className="btn btn-primary btn-big w-full"
            to={`?entry=${entryId}&step=what`}
            replace
            preventScrollReset={false}
          >
            What it shows
          </Link>
        </p>
      </div>
      <Form
        method="post"
        ref={form}
        noValidate
        className={`flex flex-1 flex-col ${what ? '' : 'max-phone:hidden'}`}
      >
        <input type="hidden" name="entryId" value={entryId} />
        {photos.length > 0 && (
          <div className="phone:hidden">
            <PhotoStrip photos={photos} />
          </div>
        )}
        <div className="grid gap-4 p-3.5">
          {actionData && (
            <Notice tone="failed" lead={actionData.problem} alert>
              Nothing is lost: mend it and add it again.
            </Notice>
          )}
          <EntryForm
            field={(name, preset) => field(name, name === 'phase' ? phase : preset)}
            open={openTiles(actionData?.values ?? {})}
            deskOnly={deskOnly}
            from={from}
            zone={zone}
          >
            <PhotoWords photos={named} field={field} />
          </EntryForm>
        </div>
        <div className="add-foot">
          <Button kind="primary" size="big" wide>
            Add to timeline
          </Button>
        </div>
      </Form>
    </BesideTag>
  );
}
