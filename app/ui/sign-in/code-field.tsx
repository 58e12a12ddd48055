import { TextField } from '../control/text-field.tsx';
import './sign-in.css';

/** The six digits from the mail; a phone offers them by itself. */
export function CodeField({ name, error }: { name: string; error?: string }) {
  return (
    <TextField
      label="Six-digit code"
      name={name}
      inputMode="numeric"
      autoComplete="one-time-code"
      maxLength={11}
      required
      error={error}
      className="sign-in-code"
    />
  );
}
