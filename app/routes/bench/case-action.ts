import { redirect } from 'react-router';
import { readForm, textOf } from '#app/lib/read-form.ts';
import { Invalid } from '#domain/errors.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordProof } from '#server/cases/record-proof.ts';
import { setNextStep } from '#server/cases/set-next-step.ts';
import { recordAnswer } from '#server/estimates/record-answer.ts';
import { sendEstimate } from '#server/estimates/send-estimate.ts';
import { amendEntry } from '#server/record/amend-entry.ts';

/** Does what one of the case file's buttons says. Returns where to go on. */
export async function actOnCase(viewer: Viewer, caseNumber: string, form: FormData) {
  const { intent, entryId, ...values } = readForm(form);
  const input = { caseNumber, ...values };
  const here = `/bench/cases/${caseNumber}`;
  switch (intent) {
    case 'next':
      await setNextStep(viewer, input);
      return redirect(here);
    case 'estimate':
      await sendEstimate(viewer, input);
      return redirect(here);
    case 'answer':
      await recordAnswer(viewer, input);
      return redirect(here);
    case 'proof':
      await recordProof(viewer, input);
      return redirect(here);
    case 'amend': {
      const made = await amendEntry(viewer, { caseNumber, entryId: textOf(entryId) });
      return redirect(`${here}/entries/${made.entryId}`);
    }
    default:
      throw new Invalid({}, 'This button is not known here. Open the case again.');
  }
}
