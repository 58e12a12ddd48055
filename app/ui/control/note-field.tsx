import { useId, type TextareaHTMLAttributes } from 'react';
import { described, FieldShell, type FieldTexts } from './field-shell.tsx';

/** Several lines, in the face that notes are read in. */
export function NoteField({
  label,
  help,
  error,
  className = '',
  ...area
}: FieldTexts & TextareaHTMLAttributes<HTMLTextAreaElement>) {
  const made = useId();
  const id = area.id ?? made;
  return (
    <FieldShell id={id} label={label} help={help} error={error}>
      <textarea
        rows={3}
        {...area}
        {...described(id, { label, help, error })}
        className={`input font-serif text-note ${className}`}
      />
    </FieldShell>
  );
}
