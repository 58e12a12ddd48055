import { readForm, textOf, type FormValues } from '#app/lib/read-form.ts';

const list = <T>(value: T | T[] | undefined): T[] =>
  value === undefined ? [] : Array.isArray(value) ? value : [value];

const branch = (value: unknown): FormValues =>
  typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as FormValues) : {};

/**
 * An entry as its operations take it, from the form: materials by line, a rest only where its fields
 * were sent, a photo for the bench where that was ticked.
 */
export function entryInput(form: FormData) {
  const { draft, used, photos, takeOff, phase, visibility } = readForm(form);
  return {
    phase,
    visibility,
    draft: { ...branch(draft), used: textOf(used).split('\n') },
    photos: list(photos as FormValues[] | undefined)
      .map(branch)
      .map(({ photoId, caption, bench }) => ({
        photoId,
        caption,
        visibility: bench === undefined ? 'shared' : 'bench',
      })),
    takeOff: list(takeOff as string | string[] | undefined).filter((id) => id !== ''),
  };
}
