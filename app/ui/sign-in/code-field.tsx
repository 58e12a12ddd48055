import { TextField } from '../control/text-field.tsx';

/** The six digits from the mail; a phone offers them by itself. */
export function CodeField({ error, defaultValue }: { error?: string; defaultValue?: string }) {
  return (
    <TextField
      label="Six-digit code"
      name="code"
      inputMode="numeric"
      autoComplete="one-time-code"
      pattern="[0-9 ]*"
      maxLength={11}
      required
      defaultValue={defaultValue}
      error={error}
      className="sign-in-code"
    />
  );
}
