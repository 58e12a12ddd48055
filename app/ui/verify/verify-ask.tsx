import type { ReactNode } from 'react';
import { Form } from 'react-router';
import { Button } from '../control/button.tsx';
import { TextField } from '../control/text-field.tsx';
import './verify.css';

interface Props {
  action: string;
  /** What was typed. */
  number?: string;
  error?: string;
  /** The place to drop a file on. */
  children?: ReactNode;
}

/** The number and the file, above an answer. */
export function VerifyAsk({ action, number, error, children }: Props) {
  return (
    <section className="ask" aria-label="Check a warranty">
      <div>
        <Form action={action}>
          <TextField
            label="Warranty number"
            name="number"
            defaultValue={number}
            error={error}
            autoComplete="off"
            autoCapitalize="characters"
            spellCheck={false}
            mono
          />
          <Button kind="primary">Check</Button>
        </Form>
        {children}
      </div>
    </section>
  );
}
