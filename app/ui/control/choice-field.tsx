import { useId, type SelectHTMLAttributes } from 'react';
import { described, FieldShell, type FieldTexts } from './field-shell.tsx';

type Props = FieldTexts &
  SelectHTMLAttributes<HTMLSelectElement> & { options: { value: string; label: string }[] };

/** One of a list. */
export function ChoiceField({ label, help, error, options, className = '', ...select }: Props) {
  const made = useId();
  const id = select.id ?? made;
  return (
    <FieldShell id={id} label={label} help={help} error={error}>
      <select
        {...select}
        {...described(id, { label, help, error })}
        className={`input ${className}`}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </FieldShell>
  );
}
