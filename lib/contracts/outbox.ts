import { z } from 'zod';
import { pageInput, pageOf, uuid } from './common';

const MAIL_KINDS = ['invitation', 'passwordReset', 'order'] as const;
/** kept: no mail service is set up, so the message stays here for the owner to pass on. */
export const MAIL_STATES = ['waiting', 'sent', 'kept', 'failed'] as const;

const mailRow = z.object({
  id: uuid,
  kind: z.enum(MAIL_KINDS),
  to: z.string(),
  subject: z.string(),
  writtenAt: z.iso.datetime(),
  sentAt: z.iso.datetime().nullable(),
  state: z.enum(MAIL_STATES),
  /** Why the last attempt failed. */
  error: z.string().nullable(),
});
export type MailRow = z.infer<typeof mailRow>;
export const mailMessage = mailRow.extend({ text: z.string() });
export type MailMessage = z.infer<typeof mailMessage>;

export const listOutboxInput = z.strictObject({
  ...pageInput,
  state: z.enum([...MAIL_STATES, 'all']).default('all'),
  search: z.string().trim().max(80).default(''),
});
export const listOutboxOutput = pageOf(mailRow);
export const getMailInput = z.strictObject({ mailId: uuid });
