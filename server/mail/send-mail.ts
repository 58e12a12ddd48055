import { z } from 'zod';
import { env } from '../env.ts';
import { newestCheckpoint } from '../evidence/newest-checkpoint.ts';
import { GiveUp } from '../jobs/job.ts';
import { MailAddressSchema } from './address.ts';
import { letterHtml, letterText } from './letter.ts';
import { readSender } from './read-sender.ts';
import { letterOf, MailSchema } from './templates.ts';
import { mailTransport } from './transport.ts';

const PayloadSchema = z.intersection(
  MailSchema,
  z.object({
    to: MailAddressSchema.nullable(),
    messageId: z.string().regex(/^<[\w.-]+@[\w.-]+>$/),
    notAfter: z.iso.datetime().nullable(),
  }),
);

// RFC 5321, 4.2.1: 4yz may pass, 5yz will not. Only the answer to RCPT is about the address.
function isAddressRefused(error: unknown): boolean {
  const { code, responseCode } = error as { code?: string; responseCode?: number };
  return code === 'EENVELOPE' && responseCode !== undefined && responseCode >= 500;
}

// A file, never text in the mail: a signed note is for programs, and people skip what they cannot read.
const checkpointFile = (note: string) => ({
  filename: 'checkpoint.txt',
  content: note,
  contentType: 'text/plain; charset=utf-8',
  // Its bytes are signed; no mail program on the way may turn a line end.
  contentTransferEncoding: 'base64' as const,
});

/** Sends one queued mail, with the newest checkpoint of the witness log as a file. */
export async function sendMail(payload: unknown, { now = new Date() } = {}): Promise<void> {
  const parsed = PayloadSchema.safeParse(payload);
  if (!parsed.success) throw new GiveUp('bad-address');
  const { to, messageId, notAfter } = parsed.data;
  if (to === null || (notAfter !== null && new Date(notAfter) < now)) return;
  const { MAIL_FROM, PUBLIC_URL } = env();
  const letter = letterOf(parsed.data);
  const sender = await readSender();
  const checkpoint = await newestCheckpoint();
  const transport = mailTransport();
  try {
    await transport.sendMail({
      from: MAIL_FROM,
      to: { name: '', address: to },
      subject: letter.subject,
      messageId,
      text: letterText(letter, sender, PUBLIC_URL),
      html: letterHtml(letter, sender, PUBLIC_URL),
      headers: { 'Auto-Submitted': 'auto-generated' },
      attachments: checkpoint === null ? [] : [checkpointFile(checkpoint)],
    });
  } catch (error) {
    throw isAddressRefused(error) ? new GiveUp('address-refused') : error;
  } finally {
    transport.close();
  }
}
