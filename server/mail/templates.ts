import { z } from 'zod';
import type { Letter } from './letter.ts';

const text = z.string().min(1).max(400);
const about = { name: text, caseNumber: text, instrument: text };

/** What each mail needs to know. Times come as words, in the shop's time zone. */
export const MailSchema = z.discriminatedUnion('template', [
  z.object({
    template: z.literal('sign-in-code'),
    data: z.object({ code: z.string().regex(/^\d{6}$/) }),
  }),
  z.object({
    template: z.literal('receipt'),
    data: z.object({ ...about, accessories: z.string().max(400), promisedOn: text.nullable() }),
  }),
  z.object({ template: z.literal('entry-shared'), data: z.object({ ...about, title: text }) }),
  z.object({ template: z.literal('ready-to-go-home'), data: z.object(about) }),
  z.object({
    template: z.literal('warranty-issued'),
    data: z.object({ ...about, code: text, validUntil: text }),
  }),
]);

/** A template's name with what it needs to know. */
export type Mail = z.infer<typeof MailSchema>;

const casePath = (caseNumber: string) => `/portal/cases/${caseNumber}`;

/** The words of a mail. Paths in it are made addresses where it is written out. */
export function letterOf(mail: Mail): Letter {
  const { template, data } = mail;
  switch (template) {
    case 'sign-in-code':
      return {
        subject: `${data.code} is your code`,
        lines: [
          `Your code is ${data.code}.`,
          'It works for ten minutes, once, and only in the browser that asked for it. If you did not ask for it, nothing happens and you need do nothing.',
        ],
        facts: [],
      };
    case 'receipt':
      return {
        subject: `${data.instrument}: taken in as ${data.caseNumber}`,
        greeting: data.name,
        lines: [
          `Your instrument was taken in. Its case file is ${data.caseNumber}.`,
          'Whatever is done is written down there with photos. You see where the instrument is at any time.',
        ],
        facts: [
          ['Instrument', data.instrument],
          ['Left with it', data.accessories === '' ? 'nothing' : data.accessories],
          ['Promised for', data.promisedOn ?? 'no day yet'],
        ],
        link: { path: casePath(data.caseNumber), label: 'See where it is' },
      };
    case 'entry-shared':
      return {
        subject: `${data.instrument}: ${data.title}`,
        greeting: data.name,
        lines: [
          `A new entry is on the timeline of ${data.caseNumber}: “${data.title}”. It is sealed: it cannot be altered from now on without showing.`,
        ],
        facts: [],
        link: { path: `${casePath(data.caseNumber)}/timeline`, label: 'See the timeline' },
      };
    case 'ready-to-go-home':
      return {
        subject: `${data.instrument}: ready to go home`,
        greeting: data.name,
        lines: [
          'The work is done and the case is closed. Your instrument is ready to go home: come by during opening hours.',
        ],
        facts: [
          ['Instrument', data.instrument],
          ['Case file', data.caseNumber],
        ],
        link: { path: casePath(data.caseNumber), label: 'See the case' },
      };
    case 'warranty-issued':
      return {
        subject: `${data.instrument}: your warranty ${data.code}`,
        greeting: data.name,
        lines: [
          'The warranty for the work is issued. Keep the paper: with it, anyone can check the warranty without asking you or us.',
        ],
        facts: [
          ['Warranty', data.code],
          ['Instrument', data.instrument],
          ['In force until', data.validUntil],
        ],
        link: { path: `${casePath(data.caseNumber)}/warranty`, label: 'See the warranty' },
      };
  }
}
