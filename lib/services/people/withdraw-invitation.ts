import { withdrawInvitation as storeWithdrawal } from '../../../db/queries/people';
import { withdrawInvitationInput, withdrawInvitationOutput } from '../../contracts/people';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';

export const withdrawInvitation = defineVerb({
  name: 'people.withdrawInvitation',
  says: 'Withdraw an invitation that nobody has answered',
  kind: 'write',
  permission: 'people.manage',
  http: { method: 'DELETE', path: '/api/people/invitations/{invitationId}' },
  input: withdrawInvitationInput,
  output: withdrawInvitationOutput,
  async run(ctx, { invitationId }) {
    const before = await storeWithdrawal(ctx.scope, invitationId, ctx.clock.now());
    if (!before) return fail(notFound('open invitation'));
    await ctx.record({
      action: 'people.withdrawInvitation',
      entity: 'invitation',
      entityId: invitationId,
      summary: `Withdrew the invitation of ${before.name} (${before.email})`,
      before,
    });
    return ok({ id: invitationId });
  },
});
