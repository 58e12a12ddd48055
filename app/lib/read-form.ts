/** What a form sends, nested by the dots in its names: lists where the names are numbers. */
export type FormValues = { [name: string]: FormValues | FormValues[] | string | string[] };

const NAME = /^[a-z][a-z0-9]*(\.[a-z0-9]+)*$/i;

type Branch = Map<string, Branch | string[]>;

function plant(root: Branch, path: string[], value: string): void {
  const [step = '', ...rest] = path;
  const found = root.get(step);
  if (rest.length === 0) {
    if (Array.isArray(found)) found.push(value);
    else if (!found) root.set(step, [value]);
    return;
  }
  const next = found instanceof Map ? found : new Map<string, Branch | string[]>();
  root.set(step, next);
  plant(next, rest, value);
}

function grown(branch: Branch): FormValues | FormValues[] {
  const entries = [...branch].map(([name, value]) => {
    if (value instanceof Map) return [name, grown(value)] as const;
    return [name, value.length > 1 ? value : (value[0] ?? '')] as const;
  });
  const isList = entries.length > 0 && entries.every(([name]) => /^\d+$/.test(name));
  if (isList) return entries.map(([, value]) => value as FormValues);
  // fromEntries defines own properties, so that a name such as "__proto__" could do no harm; NAME
  // lets none through.
  return Object.fromEntries(entries) as FormValues;
}

/**
 * Reads a form into nested values: `owner.name` into `{ owner: { name } }`, `photos.0.caption` into a
 * list, a name sent several times into a list of texts. Files and odd names are left out.
 */
export function readForm(form: FormData): FormValues {
  const root: Branch = new Map();
  for (const [name, value] of form)
    if (typeof value === 'string' && NAME.test(name)) plant(root, name.split('.'), value);
  return grown(root) as FormValues;
}

/** One text of a form; "" when it was not sent, or was no text. */
export function textOf(value: unknown): string {
  return typeof value === 'string' ? value : '';
}

/** The texts of a form by their names, to fill it in again after an error without a script. */
export function textsOf(form: FormData): Record<string, string> {
  return Object.fromEntries(
    [...form].flatMap(([name, value]) => (typeof value === 'string' ? [[name, value]] : [])),
  );
}
