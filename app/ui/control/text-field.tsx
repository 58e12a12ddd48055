import { useId, type InputHTMLAttributes } from 'react';
import { described, FieldShell, type FieldTexts } from './field-shell.tsx';

type Props = FieldTexts &
  InputHTMLAttributes<HTMLInputElement> & { tall?: boolean; mono?: boolean };

/** One line of text. `tall` is 56 px high, for public pages and phones. */
export function TextField({ label, help, error, tall, mono, className = '', ...input }: Props) {
  const made = useId();
  const id = input.id ?? made;
  return (
    <FieldShell id={id} label={label} help={help} error={error}>
      <input
        type="text"
        {...input}
        {...described(id, { label, help, error })}
        className={`input ${tall ? 'input-tall' : ''} ${mono ? 'font-mono' : ''} ${className}`}
      />
    </FieldShell>
  );
}

/** A figure: comma and point are both taken; the unit stands in the label. */
export function FigureField(props: Props) {
  return <TextField inputMode="decimal" autoComplete="off" {...props} />;
}
