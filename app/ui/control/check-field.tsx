import { useId, type InputHTMLAttributes } from 'react';
import { described, type FieldTexts } from './field-shell.tsx';
import { WitnessMark } from '../mark/witness-mark.tsx';

/** Yes or no: a consent, a visibility. */
export function CheckField({
  label,
  help,
  error,
  ...input
}: FieldTexts & InputHTMLAttributes<HTMLInputElement>) {
  const made = useId();
  const id = input.id ?? made;
  return (
    <div className="check">
      <input type="checkbox" {...input} {...described(id, { label, help, error })} />
      <label htmlFor={id}>{label}</label>
      {help && (
        <p className="field-help" id={`${id}-help`}>
          {help}
        </p>
      )}
      {error && (
        <p className="field-error col-start-2" id={`${id}-error`}>
          <WitnessMark state="displaced" size={20} />
          {error}
        </p>
      )}
    </div>
  );
}
