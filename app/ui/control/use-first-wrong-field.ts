import { useEffect, type RefObject } from 'react';

/** Moves the focus to the first wrong field of the form each time `errors` is a new object. */
export function useFirstWrongField(form: RefObject<HTMLFormElement | null>, errors: unknown): void {
  useEffect(() => {
    if (errors) form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [form, errors]);
}
