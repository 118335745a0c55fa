import { z } from 'zod';
import { givenPassword, newPassword } from './auth';
import { name, uuid } from './common';
import { role } from './people';

const locale = z.enum(['en', 'es']);

export const account = z.object({
  personId: uuid,
  name: z.string(),
  email: z.string(),
  role,
  locale,
  companyName: z.string(),
  timeZone: z.string(),
  clock: z.enum(['12', '24']),
  sessions: z.array(
    z.object({ startedAt: z.iso.datetime(), expiresAt: z.iso.datetime(), isThisOne: z.boolean() }),
  ),
});
export type Account = z.infer<typeof account>;

export const getAccountInput = z.strictObject({});
export const updateAccountInput = z.strictObject({ name, locale });
export const changePasswordInput = z.strictObject({
  currentPassword: givenPassword,
  newPassword,
});
export const changePasswordOutput = z.object({ endedSessions: z.int() });
export const endOtherSessionsInput = z.strictObject({});
export const endOtherSessionsOutput = z.object({ endedSessions: z.int() });
