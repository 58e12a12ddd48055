import type { FieldOf } from '#app/lib/field-of.ts';
import { CheckField } from '#app/ui/control/check-field.tsx';
import { ChoiceField } from '#app/ui/control/choice-field.tsx';
import { NoteField } from '#app/ui/control/note-field.tsx';
import { TextField } from '#app/ui/control/text-field.tsx';
import { CustomerFields } from './customer-fields.tsx';
import { FieldRow, FormSection } from './form-section.tsx';

interface Props {
  people: { value: string; label: string }[];
  field: FieldOf;
}

const PARTIES = [
  { part: 'bringer', words: 'Somebody else brings it' },
  { part: 'payer', words: 'Somebody else pays' },
];

/** What it is in for, what came with it, what was agreed, and when it is promised. */
export function CaseSections({ people, field }: Props) {
  const ticked = (name: string) => {
    const { defaultValue, ...rest } = field(name);
    return { ...rest, defaultChecked: defaultValue === 'on' };
  };
  return (
    <>
      <FormSection title="What it is in for" sub="A few words for the tag, then the owner’s own.">
        <TextField
          label="In a few words"
          help="“Lifted bridge; crack in the top below it”"
          {...field('job')}
        />
        <NoteField label="The complaint, in the owner’s words" rows={4} {...field('complaint')} />
        <TextField
          label="What came with it"
          help="“Hard case, strap, spare saddle”"
          {...field('accessories')}
        />
      </FormSection>
      <FormSection title="Agreed" sub="Asked of the owner, here at the counter.">
        <CheckField
          label="Photographs may be taken"
          help="They show the work, and go to the owner’s portal once they are sealed."
          {...ticked('consentPhotos')}
        />
        <CheckField
          label="Verify may show picture and work"
          help="To whoever holds the warranty’s number. Without it Verify shows number and standing only."
          {...ticked('publishWork')}
        />
      </FormSection>
      <FormSection title="In the shop">
        <FieldRow>
          <TextField label="Promised for" type="date" {...field('promisedOn')} />
          <ChoiceField
            label="Who has it"
            options={[{ value: '', label: 'Not yet set' }, ...people]}
            {...field('technicianId')}
          />
        </FieldRow>
        <FieldRow>
          <TextField
            label="What is next"
            help="“Look over, write estimate”"
            {...field('nextStep')}
          />
          <TextField label="Where it hangs" {...field('place')} />
        </FieldRow>
        {PARTIES.map(({ part, words }) => (
          <details key={part} open={field(`${part}.name`).defaultValue !== '' || undefined}>
            <summary className="min-h-11 py-2 font-semibold">{words}</summary>
            <div className="grid gap-5 pt-2">
              <CustomerFields part={part} field={field} />
            </div>
          </details>
        ))}
      </FormSection>
    </>
  );
}
