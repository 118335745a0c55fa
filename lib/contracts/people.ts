import { z } from 'zod';
import { email, name, uuid } from './common';

export const role = z.enum(['owner', 'bookkeeper', 'foreman']);

export const personRow = z.object({
  id: uuid,
  name: z.string(),
  email: z.string(),
  role,
  locale: z.enum(['en', 'es']),
  joinedAt: z.iso.datetime(),
  /** Whoever asks: an owner can't change his own role or remove himself by accident. */
  isYou: z.boolean(),
});
export type PersonRow = z.infer<typeof personRow>;

export const invitationRow = z.object({
  id: uuid,
  email: z.string(),
  name: z.string(),
  role,
  state: z.enum(['open', 'expired']),
  invitedBy: z.string(),
  invitedAt: z.iso.datetime(),
  expiresAt: z.iso.datetime(),
});
export type InvitationRow = z.infer<typeof invitationRow>;

export const listPeopleInput = z.strictObject({});
export const listPeopleOutput = z.object({
  people: z.array(personRow),
  /** Neither accepted nor withdrawn. */
  invitations: z.array(invitationRow),
});

export const invitePersonInput = z.strictObject({ email, name, role });
export const changeRoleInput = z.strictObject({ personId: uuid, role });
export const removePersonInput = z.strictObject({ personId: uuid });
export const removePersonOutput = z.object({ id: uuid });
export const withdrawInvitationInput = z.strictObject({ invitationId: uuid });
export const withdrawInvitationOutput = z.object({ id: uuid });
