import { z } from 'zod';

const SENTENCE =
  'This is not an e-mail address. Check it for a missing part, such as anna@example.org.';

/**
 * One plain e-mail address, trimmed. A line break or a second address inside would be handed to
 * others by the mail library as if we had named them.
 */
export const MailAddressSchema = z
  .string(SENTENCE)
  .trim()
  .max(254, SENTENCE)
  .pipe(z.email({ error: SENTENCE, pattern: z.regexes.html5Email }))
  .refine((address) => /^[\x21-\x7e]+@[\x21-\x7e]+\.[a-z0-9-]+$/i.test(address), SENTENCE);
