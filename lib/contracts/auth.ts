import { z } from 'zod';
import { email, name } from './common';

/** Any character and any mixture is welcome; length is what counts. */
export const newPassword = z
  .string()
  .min(10, 'at least 10 characters')
  .max(256, 'at most 256 characters');
/** A password that is only compared: its length says nothing about whether it is right. */
export const givenPassword = z.string().min(1, 'needed').max(256, 'at most 256 characters');

/** The token of a link in a message. */
const linkToken = z.string().regex(/^[A-Za-z0-9_-]{20,100}$/, 'not a complete link');

export const timeZone = z
  .string()
  .trim()
  .max(60)
  .refine(isTimeZone, 'a time zone such as America/Chicago');

function isTimeZone(text: string): boolean {
  // Offsets such as "+05:00" are accepted by Intl but don't know summer time.
  if (!/^[A-Za-z]/.test(text)) return false;
  try {
    new Intl.DateTimeFormat('en-US', { timeZone: text });
    return true;
  } catch {
    return false;
  }
}

/** Where the browser goes next. */
export const nextPage = z.object({ next: z.string() });

export const signInInput = z.strictObject({ email, password: givenPassword });

export const signUpInput = z.strictObject({
  companyName: name,
  timeZone,
  name,
  email,
  password: newPassword,
});

export const signOutInput = z.strictObject({});

export const forgotPasswordInput = z.strictObject({ email });
/** The same for an account that exists and one that does not. */
export const forgotPasswordOutput = z.object({ done: z.literal(true) });

export const resetPasswordInput = z.strictObject({ token: linkToken, password: newPassword });

export const getInvitationInput = z.strictObject({ token: linkToken });
export const invitationWelcome = z.object({
  companyName: z.string(),
  email: z.string(),
  name: z.string(),
  role: z.enum(['owner', 'bookkeeper', 'foreman']),
  expiresAt: z.iso.datetime(),
});
export type InvitationWelcome = z.infer<typeof invitationWelcome>;

export const acceptInvitationInput = z.strictObject({
  token: linkToken,
  name,
  password: newPassword,
});

export const signInHintsInput = z.strictObject({});
/** The demo company's sign-ins, or null where there is no demo company to show. */
export const signInHintsOutput = z.object({
  demo: z
    .object({
      companyName: z.string(),
      password: z.string(),
      people: z.array(z.object({ name: z.string(), email: z.string(), role: z.string() })),
    })
    .nullable(),
});
export type SignInHints = z.infer<typeof signInHintsOutput>;
