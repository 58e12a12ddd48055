import { Form, Link } from 'react-router';
import { Button } from '#app/ui/control/button.tsx';

/** What staff see and can do with an entry beside what the owner would see. */
export interface EntryActsView {
  benchNote: string;
  /** Who wrote it, while it is open. */
  writtenBy: string | null;
  mayEdit: boolean;
  maySeal: boolean;
  mayCorrect: boolean;
}

/** Under an entry: the note that stays in the shop, and edit, seal or add a correction. */
export function EntryActions({
  caseNumber,
  entryId,
  acts,
}: {
  caseNumber: string;
  entryId: string;
  acts: EntryActsView;
}) {
  const path = `/bench/cases/${caseNumber}/entries/${entryId}`;
  return (
    <>
      {acts.benchNote !== '' && (
        <p className="border-l-3 border-line-strong pl-3 text-label text-ink-2">
          <b>Bench only.</b> {acts.benchNote}
        </p>
      )}
      {(acts.mayEdit || acts.maySeal) && (
        <p className="flex flex-wrap gap-x-5 gap-y-1">
          {acts.mayEdit && (
            <Link className="inline-flex min-h-11 items-center font-semibold" to={path}>
              Change it
            </Link>
          )}
          {acts.maySeal && (
            <Link
              className="inline-flex min-h-11 items-center font-semibold"
              to={`${path}?ask=seal`}
            >
              Seal it
            </Link>
          )}
        </p>
      )}
      {acts.mayCorrect && (
        <Form method="post" className="entry-correct">
          <input type="hidden" name="entryId" value={entryId} />
          <Button kind="text" name="intent" value="amend" className="text-label font-normal">
            Add a correction
          </Button>
        </Form>
      )}
    </>
  );
}
