import { redirect } from 'react-router';
import type { Route } from './+types/warranty';
import { viewerContext } from '#app/context.ts';
import { refuse } from '#app/lib/problem.ts';
import { retry } from '#app/lib/retry.ts';
import { useChanges } from '#app/lib/use-changes.ts';
import { CaseHead } from '#app/ui/case/case-head.tsx';
import { Notice } from '#app/ui/notice.tsx';
import type { Viewer } from '#domain/viewer.ts';
import { getCase } from '#server/cases/get-case.ts';
import { listPeople } from '#server/shop/list-people.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { drawWarranty } from '#server/warranty/draw-warranty.ts';
import { getWarranty } from '#server/warranty/get-warranty.ts';
import { issueWarranty } from '#server/warranty/issue-warranty.ts';
import { caseTagView } from './case-view.ts';
import { IssueForm, issueInput } from './warranty-form.tsx';
import { IssuedWarranty } from './warranty-issued.tsx';
import { drawnView, issuedView } from './warranty-view.ts';

async function loadWarranty(viewer: Viewer, number: string) {
  const now = new Date();
  const [file, { timeZone: zone }, warranty] = await Promise.all([
    getCase(viewer, { number }, { now }),
    readShop(),
    getWarranty(viewer, { caseNumber: number }, { now }),
  ]);
  const drawn =
    warranty || !file.closedAt ? null : await drawWarranty(viewer, { caseNumber: number });
  return {
    number,
    version: file.version,
    tag: caseTagView(file, { now, zone }),
    isClosed: file.closedAt !== null,
    issued: warranty && issuedView(warranty, zone),
    drawn: drawn && drawnView(drawn, zone),
    people: drawn ? await listPeople(viewer) : [],
  };
}

export async function loader({ context, params }: Route.LoaderArgs) {
  return loadWarranty(context.get(viewerContext), params.number).catch(refuse);
}

export async function action({ context, params, request }: Route.ActionArgs) {
  const form = await request.formData();
  try {
    const input = { caseNumber: params.number, ...issueInput(form) };
    await issueWarranty(context.get(viewerContext), input);
    return redirect(`/bench/cases/${params.number}/warranty`);
  } catch (error) {
    return retry(error, form);
  }
}

export default function WarrantyPage({ loaderData, actionData }: Route.ComponentProps) {
  const { number, version, tag, isClosed, issued, drawn, people } = loaderData;
  useChanges({ case: number, version });
  return (
    <main className="mx-auto max-w-[52rem] px-8 pt-4 pb-16 max-phone:px-4" aria-label="Warranty">
      <title>{`Warranty ${number} · Witnessmark`}</title>
      <CaseHead tag={tag} />
      <h1 className="mt-6">Warranty</h1>
      {actionData && <Notice tone="failed" lead={actionData.problem} className="mt-4" alert />}
      {issued && <IssuedWarranty issued={issued} />}
      {drawn && <IssueForm drawn={drawn} people={people} problem={actionData} />}
      {!isClosed && (
        <Notice tone="plain" lead="The case is still open." className="mt-5">
          A warranty is drawn from a closed case. Close the case first.
        </Notice>
      )}
    </main>
  );
}
