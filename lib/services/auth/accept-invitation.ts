import type { Handle } from '../../../db/client';
import type { FoundInvitation } from '../../../db/queries/accounts';
import {
  findAccount,
  findInvitation,
  insertPerson,
  reinstate,
  spendInvitation,
} from '../../../db/queries/accounts';
import { inTx } from '../../../db/tx';
import { hashPassword } from '../../auth/password';
import { endSession, startSession } from '../../auth/session';
import { hashToken } from '../../auth/tokens';
import { acceptInvitationInput, nextPage } from '../../contracts/auth';
import type { PersonId } from '../../domain/ids';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { routes } from '../../routes';
import { failure } from '../failure';
import { definePublicVerb } from '../public-verb';
import { writeActivity } from '../record';
import { isAddressTaken } from './address-taken';
import { invitationOver } from './get-invitation';
import { refuseTooMany } from './limits';
import { refuseObvious } from './password-rules';

const taken = () =>
  failure(
    'conflict',
    'There is an account with this address already. Ask to be invited under another address.',
  );

export const acceptInvitation = definePublicVerb({
  name: 'auth.acceptInvitation',
  says: 'Join a company with the link from an invitation',
  http: { method: 'POST', path: '/api/accept-invitation' },
  input: acceptInvitationInput,
  output: nextPage,
  async run(ctx, { token, name, password }) {
    const refusal = await refuseTooMany(ctx.handle, 'attempts', [['linkAddress', ctx.address]]);
    if (refusal) return fail(refusal);
    const now = ctx.clock.now();
    const invitation = await findInvitation(ctx.handle, hashToken(token), now);
    if (!invitation) return fail(invitationOver());
    const { companyId, companyName, email, role } = invitation;
    const obvious = refuseObvious(password, [email, name, companyName], 'password');
    if (obvious) return fail(obvious);
    if (await findAccount(ctx.handle, email)) return fail(taken());
    const passwordHash = await hashPassword(password);
    try {
      const started = await inTx({ companyId, handle: ctx.handle }, async ({ handle }) => {
        if (!(await spendInvitation(handle, hashToken(token), now))) return null;
        const personId = await join(handle, invitation, { name, passwordHash });
        await writeActivity(handle, { companyId, id: personId, name }, now, {
          action: 'people.join',
          entity: 'person',
          entityId: personId,
          summary: `${name} joined as ${role}`,
          after: { name, email, role },
        });
        return startSession(handle, personId, now);
      });
      if (!started) return fail(invitationOver());
      if (ctx.sessionToken) await endSession(ctx.handle, ctx.sessionToken);
      ctx.setSession(started);
    } catch (error) {
      if (isAddressTaken(error)) return fail(taken());
      throw error;
    }
    return ok({ next: routes.home() });
  },
});

async function join(
  handle: Handle,
  { companyId, email, role }: FoundInvitation,
  values: { readonly name: string; readonly passwordHash: string },
): Promise<PersonId> {
  const returned = await reinstate(handle, companyId, email, { ...values, role });
  if (returned) return returned;
  const id = newId<'person'>();
  await insertPerson(handle, { id, companyId, email, role, ...values });
  return id;
}
