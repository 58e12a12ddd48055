import type { ReactNode } from 'react';
import { Form } from 'react-router';
import { Button } from '../control/button.tsx';
import { TextField } from '../control/text-field.tsx';
import { HALF_LARGE } from '../mark/strokes.ts';
import './verify.css';

interface Props {
  action: string;
  error?: string;
  number?: string;
  /** Under the question. "Nothing you drop here leaves this device" only where that is how it works. */
  text: string;
  /** "or", and the place to drop a file on. */
  children?: ReactNode;
}

/** The first page of Verify: the question left of the seam, the form right. */
export function VerifyStart({ action, error, number, text, children }: Props) {
  return (
    <main className="seam verify-start">
      <svg className="hollow" viewBox="0 0 266 86" aria-hidden>
        <path d={HALF_LARGE} />
        <path d={HALF_LARGE} transform="rotate(180 133 44)" />
      </svg>
      <div className="verify-start-grid">
        <div className="verify-start-words">
          <h1>Has anything moved?</h1>
          <p>{text}</p>
        </div>
        <div className="verify-start-form">
          <Form action={action} className="grid gap-4">
            <TextField
              label="Warranty number"
              name="number"
              defaultValue={number}
              error={error}
              help="Top right on the page, ten letters and figures"
              autoComplete="off"
              autoCapitalize="characters"
              spellCheck={false}
              required
              tall
              mono
            />
            <Button kind="primary" size="tall" wide>
              Check the number
            </Button>
          </Form>
          {children}
        </div>
      </div>
    </main>
  );
}
