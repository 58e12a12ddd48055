import { signHead } from '../evidence/sign-head.ts';
import { sendMail } from '../mail/send-mail.ts';
import { derivePhoto } from '../photos/derive-photo.ts';
import { issueWarrantyJob } from '../warranty/continue-warranty.ts';
import type { Handler } from './job.ts';

/** What does each kind of job: one line per kind. */
export const handlers: Record<string, Handler> = {
  mail: sendMail,
  'derive-photo': derivePhoto,
  'sign-head': async () => void (await signHead()),
  'issue-warranty': issueWarrantyJob,
};
