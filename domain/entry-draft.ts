import { z } from 'zod';
import { neededText, optionalText, text } from './input.ts';

/** Where in the work an entry belongs. */
export const PHASES = ['before', 'during', 'after'] as const;
export type Phase = (typeof PHASES)[number];

/** Who may see an entry or a photo once it is sealed: the owner too, or the bench alone. */
export const VISIBILITIES = ['shared', 'bench'] as const;
export type Visibility = (typeof VISIBILITIES)[number];

/** The longest a rest may be written down for, in hours: 90 days. */
const LONGEST_REST = 2160;

/**
 * A figure as typed, kept as digits: the point or comma of the reader's keyboard becomes a point, a
 * typed minus a plain one. Null when empty.
 */
function figure(what: string, unit: string, least: number, most: number) {
  return z
    .string()
    .nullish()
    .transform((value) => (value ?? '').trim().replace(',', '.').replace('\u2212', '-'))
    .superRefine((value, context) => {
      if (value === '') return;
      const refuse = (message: string) => context.addIssue({ code: 'custom', message });
      if (!/^-?\d{1,4}(\.\d{1,2})?$/.test(value))
        refuse(
          `“${value}” cannot be read as ${what}. Write a figure such as ${example(least, most)}.`,
        );
      else if (Number(value) < least || Number(value) > most)
        refuse(
          `${minus(value)}${unit} is outside ${minus(least)} to ${most}${unit}. Measure again.`,
        );
    })
    .transform((value) => (value === '' ? null : value));
}

const minus = (value: number | string) => String(value).replace('-', '\u2212');
const example = (least: number, most: number) => String(Math.min(most, Math.max(least, 21)));

const restHours = (what: string) => figure(what, '\u00a0h', 0.1, LONGEST_REST);

const later = (a: string | null, b: string | null) =>
  a !== null && b !== null && Number(b) < Number(a);

/** What a photo shows, in one entry, and who may see it there. */
export const PhotoLinkSchema = z.object({
  photoId: z.uuid(),
  caption: optionalText('The caption', 400),
  visibility: z.enum(VISIBILITIES),
});
export type PhotoLink = z.output<typeof PhotoLinkSchema>;

/** A rest as written down: the product, and hours from its start to each of the times that are used. */
export const RestDraftSchema = z
  .object({
    product: neededText('The product', 120, 'What is resting? Name the glue or finish.'),
    clampsOffHours: restHours('hours to clamps off'),
    workedHours: restHours('hours to work'),
    stringsHours: restHours('hours to strings'),
  })
  .superRefine((rest, context) => {
    const add = (path: string, message: string) =>
      context.addIssue({ code: 'custom', path: [path], message });
    const { clampsOffHours, workedHours, stringsHours } = rest;
    if (clampsOffHours === null && workedHours === null && stringsHours === null)
      add('workedHours', 'A rest needs at least one time. Give the hours by the label.');
    if (later(clampsOffHours, workedHours))
      add(
        'workedHours',
        'It cannot be worked while the clamps are on. Give as many hours or more.',
      );
    if (later(workedHours ?? clampsOffHours, stringsHours))
      add(
        'stringsHours',
        'It cannot carry strings before it may be worked. Give as many hours or more.',
      );
  });
export type RestDraft = z.output<typeof RestDraftSchema>;

const CLOCK = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/;

/**
 * The words of an entry until it is sealed, as they are kept in `entries.draft`. Figures are strings of
 * the digits as typed, with a decimal point.
 */
export const EntryDraftSchema = z.object({
  title: neededText(
    'The title',
    120,
    'The title is missing. A few words: “Bridge off, crack cleaned”.',
  ),
  text: text('The note', 8000),
  /** Never shown to the owner, also not when the entry is shared. */
  benchNote: text('The bench note', 8000),
  /** Adhesive, batch, filler, finish: one line each. */
  used: z
    .array(optionalText('A material', 160))
    .default([])
    .transform((list) => list.filter((line) => line !== null))
    .refine(
      (list) => list.length <= 20,
      'Twenty materials are the most an entry holds. Add another entry.',
    ),
  /** °C */
  temperature: figure('a temperature', '\u00a0°C', -1, 50),
  /** Relative humidity in percent. */
  humidity: figure('a humidity', '\u00a0%', 5, 95),
  minutes: z.coerce
    .number({ error: 'The time worked cannot be read. Write whole minutes.' })
    .int('The time worked cannot be read. Write whole minutes.')
    .min(0, 'The time worked cannot be negative. Write whole minutes.')
    .max(1440, 'More than a day in one entry. Write the minutes of this entry alone.')
    .nullish()
    .transform((value) => value || null),
  /** When it happened by the shop's clock, if not now: "2026-04-15T09:40". */
  occurredClock: optionalText('The time', 16).refine(
    (value) => value === null || CLOCK.test(value),
    'This is no date and time. Choose both, or leave it empty for now.',
  ),
  rest: RestDraftSchema.nullish().transform((rest) => rest ?? null),
  /** Photos of this entry that are not up yet, with what is to be said of them once they are. */
  expected: z.array(PhotoLinkSchema).default([]),
});
export type EntryDraft = z.output<typeof EntryDraftSchema>;

/** An entry as its form sends it. */
export const EntrySchema = z.object({
  phase: z.enum(PHASES, { error: 'Is it before, during or after the work? Choose one.' }),
  visibility: z.enum(VISIBILITIES, { error: 'Who may see it? Choose one.' }),
  draft: EntryDraftSchema,
  /** The entry's photos, up or still going up. */
  photos: z
    .array(PhotoLinkSchema)
    .default([])
    .refine(
      (list) => list.length <= 100,
      'A hundred photos are the most an entry holds. Add another entry for the rest.',
    ),
  /** Ids of photos that are to leave the entry; they stay in the case. */
  takeOff: z.array(z.uuid()).default([]),
});
export type EntryInput = z.output<typeof EntrySchema>;
