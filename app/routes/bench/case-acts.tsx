import { Form } from 'react-router';
import type { FieldOf } from '#app/lib/field-of.ts';
import { Button } from '#app/ui/control/button.tsx';
import { ChoiceField } from '#app/ui/control/choice-field.tsx';
import { TextField } from '#app/ui/control/text-field.tsx';
import { FieldRow, FormSection } from './form-section.tsx';

/** What can be done with a case beside its timeline, and what it starts from. */
export interface CaseActsView {
  next: { nextStep: string; technicianId: string; place: string } | null;
  people: { value: string; label: string }[];
  estimate: { currency: string } | null;
  /** An estimate that waits for its answer. */
  answer: { revision: number; total: string; summary: string } | null;
  proof: string | null;
}

interface Props {
  acts: CaseActsView;
  /** The form that was sent and came back. */
  intent: string | undefined;
  field: FieldOf;
}

const fresh: FieldOf = (name, preset = '') => ({ name, defaultValue: preset, error: undefined });

/** Below the timeline: what is next, the estimate and its answer, proof of ownership. */
export function CaseActs({ acts, intent, field }: Props) {
  const of = (wanted: string) => (intent === wanted ? field : fresh);
  const { next, estimate, answer, proof } = acts;
  return (
    <div className="mt-12 grid" id="acts">
      {proof !== null && (
        <FormSection title="Proof of ownership" sub={proof}>
          <Form method="post" className="grid gap-4" noValidate>
            <TextField
              label="What shows whose it is"
              help="Kept for the bench only. The case then goes on."
              {...of('proof')('proof')}
            />
            <Button name="intent" value="proof" className="justify-self-start">
              Record the proof
            </Button>
          </Form>
        </FormSection>
      )}
      {next && (
        <FormSection title="Next step" sub="As it stands on the Rack.">
          <Form method="post" className="grid gap-4" noValidate>
            <TextField label="What is next" {...of('next')('nextStep', next.nextStep)} />
            <FieldRow>
              <ChoiceField
                label="Who has it"
                options={[{ value: '', label: 'Not yet set' }, ...acts.people]}
                {...of('next')('technicianId', next.technicianId)}
              />
              <TextField label="Where it hangs" {...of('next')('place', next.place)} />
            </FieldRow>
            <Button name="intent" value="next" className="justify-self-start">
              Set it
            </Button>
          </Form>
        </FormSection>
      )}
      {answer && (
        <FormSection title="The owner’s answer" sub="Recorded here while the owner is present.">
          <Form method="post" className="grid gap-4" noValidate>
            <input type="hidden" name="revision" value={answer.revision} />
            <p>
              Revision {answer.revision}: {answer.summary} <b>{answer.total}</b>, with tax.
            </p>
            <input type="hidden" name="intent" value="answer" />
            <div className="flex flex-wrap gap-3">
              <Button name="answer" value="authorised">
                Authorised
              </Button>
              <Button name="answer" value="declined">
                Declined
              </Button>
            </div>
          </Form>
        </FormSection>
      )}
      {estimate && (
        <FormSection title="Estimate" sub="Sent, it waits for the owner. A new one replaces it.">
          <Form method="post" className="grid gap-4" noValidate>
            <TextField label="What is to be done" {...of('estimate')('summary')} />
            <TextField
              label={`Total with tax, ${estimate.currency}`}
              inputMode="decimal"
              {...of('estimate')('total')}
            />
            <Button name="intent" value="estimate" className="justify-self-start">
              Note it as sent
            </Button>
          </Form>
        </FormSection>
      )}
    </div>
  );
}
