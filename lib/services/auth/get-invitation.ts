import { findInvitation } from '../../../db/queries/accounts';
import { hashToken } from '../../auth/tokens';
import { getInvitationInput, invitationWelcome } from '../../contracts/auth';
import { fail, ok } from '../../domain/result';
import { failure } from '../failure';
import { definePublicVerb } from '../public-verb';
import { refuseTooMany } from './limits';

/** What whoever opens a link that is over is told. */
export const invitationOver = () =>
  failure(
    'notFound',
    'This invitation is used up, withdrawn or too old. Ask whoever invited you for a new one.',
  );

export const getInvitation = definePublicVerb({
  name: 'auth.getInvitation',
  says: 'See what an invitation is for',
  http: { method: 'GET', path: '/api/invitations/{token}' },
  input: getInvitationInput,
  output: invitationWelcome,
  async run(ctx, { token }) {
    const refusal = await refuseTooMany(ctx.handle, 'attempts', [['linkAddress', ctx.address]]);
    if (refusal) return fail(refusal);
    const invitation = await findInvitation(ctx.handle, hashToken(token), ctx.clock.now());
    if (!invitation) return fail(invitationOver());
    const { companyName, email, name, role, expiresAt } = invitation;
    return ok({ companyName, email, name, role, expiresAt: expiresAt.toISOString() });
  },
});
