import type { FieldOf } from '#app/lib/field-of.ts';
import { ChoiceField } from '#app/ui/control/choice-field.tsx';
import { TextField } from '#app/ui/control/text-field.tsx';
import { FieldRow } from './form-section.tsx';

const TELL_BY = [
  { value: 'email', label: 'By e-mail' },
  { value: 'telephone', label: 'By telephone' },
];

/** A new customer; `part` names them in the form: "owner", "bringer", "payer". */
export function CustomerFields({ part, field }: { part: string; field: FieldOf }) {
  return (
    <>
      <TextField label="Name" autoComplete="off" {...field(`${part}.name`)} />
      <FieldRow>
        <TextField
          label="E-mail address"
          type="email"
          inputMode="email"
          autoComplete="off"
          {...field(`${part}.email`)}
        />
        <TextField
          label="Telephone"
          type="tel"
          autoComplete="off"
          {...field(`${part}.telephone`)}
        />
      </FieldRow>
      <FieldRow>
        <TextField label="Address" autoComplete="off" {...field(`${part}.address`)} />
        <ChoiceField
          label="How they want to be told"
          options={TELL_BY}
          {...field(`${part}.tellBy`, 'email')}
        />
      </FieldRow>
    </>
  );
}
