import { lazy, Suspense } from 'react';
import { useNavigate, useSearchParams } from 'react-router';
import type { Route } from './+types/case';
import { viewerContext } from '#app/context.ts';
import { fieldsOf } from '#app/lib/field-of.ts';
import { refuse } from '#app/lib/problem.ts';
import { retry } from '#app/lib/retry.ts';
import { useChanges } from '#app/lib/use-changes.ts';
import { CaseBar } from '#app/ui/bar/case-bar.tsx';
import { Dock } from '#app/ui/bar/dock.tsx';
import { CasePage } from '#app/ui/case/case-page.tsx';
import { CaseTabs } from '#app/ui/case/case-tabs.tsx';
import { WhatIsNext } from '#app/ui/case/what-is-next.tsx';
import { ButtonLink } from '#app/ui/control/button.tsx';
import { Notice } from '#app/ui/notice.tsx';
import { Tag } from '#app/ui/tag/tag.tsx';
import { Timeline } from '#app/ui/timeline/timeline.tsx';
import { useRunningHead } from '#app/ui/use-running-head.ts';
import { actOnCase } from './case-action.ts';
import { CaseActs } from './case-acts.tsx';
import { loadCase } from './case-loader.ts';
import { CaseToast, justDone } from './case-toast.tsx';
import { EntryActions } from './entry-actions.tsx';
import type { BenchHandle } from './layout.tsx';
import { TroubleNotice } from './trouble-notice.tsx';
import { useLatestEntry } from './use-latest-entry.ts';

const PhotoViewer = lazy(() =>
  import('#app/ui/viewer/photo-viewer.tsx').then((module) => ({ default: module.PhotoViewer })),
);

export const handle: BenchHandle = { bar: 'desk' };

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const photo = url.searchParams.get('photo');
  return loadCase(viewer, params.number, photo, new Date()).catch(refuse);
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const form = await request.formData();
  try {
    return await actOnCase(context.get(viewerContext), params.number, form);
  } catch (error) {
    return retry(error, form);
  }
}

export default function CaseFilePage({ loaderData, actionData }: Route.ComponentProps) {
  const { number, tag, next, phases, acts, entryActs, viewer } = loaderData;
  const [search] = useSearchParams();
  const navigate = useNavigate();
  useChanges({ case: number, version: loaderData.version });
  useRunningHead(loaderData.heading);
  useLatestEntry(loaderData.isOpen, loaderData.latest);
  const here = `/bench/cases/${number}`;
  const add = (big: boolean) => (
    <ButtonLink to={`${here}/add`} kind="primary" icon="camera" size={big ? 'big' : 'normal'} wide>
      Add to timeline
    </ButtonLink>
  );
  const end = loaderData.isOpen ? 'Close the case' : 'Hand it back';
  const shown = viewer?.findIndex(({ n }) => String(n) === search.get('photo')) ?? -1;
  const show = (index: number) =>
    void navigate(`?photo=${viewer?.[index]?.n ?? ''}`, {
      replace: true,
      preventScrollReset: true,
    });
  return (
    <>
      <title>{`Case file ${number} · Witnessmark`}</title>
      <CaseBar
        back={{ href: '/bench', label: 'Back to the Rack' }}
        title="Case file"
        status={loaderData.status}
      />
      <CasePage
        heading={loaderData.heading}
        tag={<Tag tag={tag} />}
        next={
          <WhatIsNext next={next}>
            {loaderData.isOpen && add(false)}
            {loaderData.isHere && (
              <ButtonLink to={`${here}/close`} wide>
                {end}
              </ButtonLink>
            )}
          </WhatIsNext>
        }
      >
        <CaseTabs
          tabs={[
            { label: 'Timeline', href: here, current: true, count: loaderData.count },
            { label: 'Warranty', href: `${here}/warranty` },
          ]}
        />
        {actionData && <Notice tone="failed" lead={actionData.problem} className="mt-5" alert />}
        <TroubleNotice sentences={loaderData.trouble} />
        <Timeline
          phases={phases}
          actions={({ id }) => {
            const own = entryActs[id];
            return own && <EntryActions caseNumber={number} entryId={id} acts={own} />;
          }}
        />
        {loaderData.isHere && (
          <p className="mt-8 phone:hidden">
            <ButtonLink to={`${here}/close`} wide size="tall">
              {end}
            </ButtonLink>
          </p>
        )}
        <CaseActs acts={acts} intent={actionData?.values.intent} field={fieldsOf(actionData)} />
      </CasePage>
      {loaderData.isOpen && <Dock>{add(true)}</Dock>}
      <CaseToast done={justDone(search)} caseNumber={number} />
      {viewer && shown >= 0 && (
        <Suspense>
          <PhotoViewer
            caseNumber={number}
            photos={viewer}
            index={shown}
            onIndex={show}
            onClose={() => void navigate(here, { replace: true, preventScrollReset: true })}
          />
        </Suspense>
      )}
    </>
  );
}
