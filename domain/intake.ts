import { z } from 'zod';
import { isDay } from './calendar.ts';
import { neededText, optionalText, text, ticked } from './input.ts';
import { instrumentKind } from './instrument-kinds.ts';

const id = z.uuid({ error: 'This choice is not on the list any more. Choose again.' });

const email = optionalText('The e-mail address', 254).refine(
  (value) => value === null || z.email().safeParse(value).success,
  'This is no e-mail address. Write it as name@place.example.',
);

const NewCustomerSchema = z
  .object({
    id: z.literal('').optional(),
    name: neededText('The name', 160, 'A name is missing. Write it as it should stand on the tag.'),
    email,
    telephone: optionalText('The telephone number', 40),
    address: text('The address', 400).transform((value) => value || null),
    tellBy: z.enum(['email', 'telephone']).default('email'),
  })
  .superRefine(({ email, telephone, tellBy }, context) => {
    const add = (path: string, message: string) =>
      context.addIssue({ code: 'custom', path: [path], message });
    if (!email && !telephone)
      add('email', 'There is no way to reach them. Give an e-mail address or a telephone number.');
    else if (tellBy === 'email' && !email)
      add('email', 'They want to be told by e-mail. Give an e-mail address.');
    else if (tellBy === 'telephone' && !telephone)
      add('telephone', 'They want to be told by telephone. Give a number.');
  });

const NewInstrumentSchema = z.object({
  id: z.literal('').optional(),
  kind: text('The kind', 60).refine(
    (name) => instrumentKind(name) !== undefined,
    'What kind of instrument is it? Choose one from the list.',
  ),
  maker: neededText(
    'The maker',
    120,
    'The maker is missing. Write it as on the label, or “unknown”.',
  ),
  model: optionalText('The model', 120),
  serial: optionalText('The serial', 80),
  year: optionalText('The year', 20),
  finish: optionalText('The finish', 160),
  woods: optionalText('The woods', 240),
  strings: optionalText('The strings', 160),
  tuning: optionalText('The tuning', 120),
  marks: text('The distinguishing marks', 2000).transform((value) => value || null),
  declaredValue: optionalText('The declared value', 24),
});

const chosen = (value: unknown) =>
  typeof value === 'object' && value !== null && 'id' in value && Boolean(value.id);

const filled = (value: unknown) =>
  typeof value === 'object' &&
  value !== null &&
  Object.entries(value).some(
    ([name, v]) => name !== 'tellBy' && typeof v === 'string' && v.trim() !== '',
  );

/**
 * One that is known, by its id, or a new one; null where `wanted` says that nothing was given. Not a
 * zod union: that reports only that no branch fits, and each field is to keep its own sentence.
 */
const choice = <New extends z.ZodType, None = never>(
  fresh: New,
  wanted?: (value: unknown) => boolean,
) =>
  z
    .unknown()
    .optional()
    .transform((value, context): { id: string } | z.output<New> | None => {
      if (wanted && !wanted(value)) return null as None;
      const schema = chosen(value) ? z.object({ id }) : fresh;
      const result = schema.safeParse(value ?? {});
      if (result.success) return result.data;
      for (const { path, message } of result.error.issues)
        context.addIssue({ code: 'custom', path, message });
      return z.NEVER;
    });

/** Nothing filled in: null, which stands for the owner. */
const otherParty = choice<typeof NewCustomerSchema, null>(NewCustomerSchema, filled);

/** Everything that is asked when an instrument is taken in. */
export const TakeInSchema = z.object({
  owner: choice(NewCustomerSchema),
  bringer: otherParty,
  payer: otherParty,
  instrument: choice(NewInstrumentSchema),
  job: neededText('What it is in for', 160, 'What is it in for? A few words: “Lifted bridge”.'),
  complaint: text('The complaint', 4000).refine(
    (value) => value !== '',
    'The complaint is missing. Write what the owner says, in their words.',
  ),
  accessories: optionalText('What came with it', 400).transform((value) => value ?? ''),
  consentPhotos: ticked,
  publishWork: ticked,
  promisedOn: optionalText('The promised day', 10).refine(
    (value) => value === null || isDay(value),
    'This is no day of the calendar. Write it as 2026-04-24, or leave it empty.',
  ),
  technicianId: z
    .union([z.literal('').transform(() => null), z.null(), id])
    .optional()
    .default(null),
  nextStep: optionalText('What is next', 160),
  place: optionalText('Where it hangs', 80),
});
export type TakeIn = z.output<typeof TakeInSchema>;
export type NewCustomer = z.output<typeof NewCustomerSchema>;
export type NewInstrument = z.output<typeof NewInstrumentSchema>;
