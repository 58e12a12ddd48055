import type { ReactNode } from 'react';
import { WitnessMark } from '../mark/witness-mark.tsx';

export interface FieldTexts {
  label: ReactNode;
  help?: ReactNode;
  /** What is wrong, then what to do. */
  error?: string;
}

/** The attributes that tie a control to its help and its error. */
export function described(id: string, { help, error }: FieldTexts) {
  const ids = [help && `${id}-help`, error && `${id}-error`].filter(Boolean).join(' ');
  return {
    id,
    'aria-describedby': ids || undefined,
    'aria-invalid': error ? (true as const) : undefined,
  };
}

/** Label above, control, error, help: the frame of every field. */
export function FieldShell({
  id,
  label,
  help,
  error,
  children,
}: FieldTexts & { id: string; children: ReactNode }) {
  return (
    <div className="field">
      <label className="field-label" htmlFor={id}>
        {label}
      </label>
      {children}
      {error && (
        <p className="field-error" id={`${id}-error`}>
          <WitnessMark state="displaced" size={20} />
          {error}
        </p>
      )}
      {help && (
        <p className="field-help" id={`${id}-help`}>
          {help}
        </p>
      )}
    </div>
  );
}
