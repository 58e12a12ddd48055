import { useState } from 'react';
import { Link } from 'react-router';
import { Toast } from '#app/ui/toast.tsx';

/** What has just been done to a case, as its address says. */
export type JustDone =
  { what: 'added'; entryId: string } | { what: 'sealed' } | { what: 'taken in' } | null;

/** Reads from the address what has just been done: `?added=<entry>`, `?sealed`, `?taken-in`. */
export function justDone(search: URLSearchParams): JustDone {
  const entryId = search.get('added');
  if (entryId) return { what: 'added', entryId };
  if (search.has('sealed')) return { what: 'sealed' };
  return search.has('taken-in') ? { what: 'taken in' } : null;
}

/** One short word on what has just been done. */
export function CaseToast({ done, caseNumber }: { done: JustDone; caseNumber: string }) {
  const [closed, setClosed] = useState<JustDone>(null);
  if (done === null || closed === done) return null;
  const close = () => setClosed(done);
  switch (done.what) {
    case 'added':
      return (
        <Toast
          state="hollow"
          onClose={close}
          action={
            <Link to={`/bench/cases/${caseNumber}/entries/${done.entryId}?ask=seal`}>Seal it</Link>
          }
        >
          Entry added. Not yet sealed.
        </Toast>
      );
    case 'sealed':
      return (
        <Toast state="aligned" onClose={close}>
          Sealed.
        </Toast>
      );
    case 'taken in':
      return (
        <Toast
          state="hollow"
          onClose={close}
          action={<Link to={`/bench/cases/${caseNumber}/add`}>Take photos</Link>}
        >
          Taken in as {caseNumber}. Not yet photographed.
        </Toast>
      );
  }
}
