import { findAccount, insertCompany, insertPerson } from '../../../db/queries/accounts';
import { inTx } from '../../../db/tx';
import { hashPassword } from '../../auth/password';
import { startSession } from '../../auth/session';
import { nextPage, signUpInput } from '../../contracts/auth';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { routes } from '../../routes';
import { failure } from '../failure';
import { definePublicVerb } from '../public-verb';
import { writeActivity } from '../record';
import { isAddressTaken } from './address-taken';
import { refuseTooMany } from './limits';
import { refuseObvious } from './password-rules';

const taken = () =>
  failure('conflict', 'There is an account with this address already. Sign in instead.', [
    { path: 'email', message: 'already has an account' },
  ]);

export const signUp = definePublicVerb({
  name: 'auth.signUp',
  says: 'Start a company, with its first owner',
  http: { method: 'POST', path: '/api/sign-up' },
  input: signUpInput,
  output: nextPage,
  async run(ctx, { companyName, timeZone, name, email, password }) {
    const refusal =
      (await refuseTooMany(ctx.handle, 'new companies from your network', [
        ['signUpAddress', ctx.address],
      ])) ?? refuseObvious(password, [email, name, companyName], 'password');
    if (refusal) return fail(refusal);
    if (await findAccount(ctx.handle, email)) return fail(taken());
    const passwordHash = await hashPassword(password);
    const companyId = newId<'company'>();
    const personId = newId<'person'>();
    const now = ctx.clock.now();
    try {
      const token = await inTx({ companyId, handle: ctx.handle }, async ({ handle }) => {
        await insertCompany(handle, { id: companyId, name: companyName, timeZone });
        await insertPerson(handle, {
          id: personId,
          companyId,
          email,
          name,
          role: 'owner',
          passwordHash,
        });
        await writeActivity(handle, { companyId, id: personId, name }, now, {
          action: 'auth.signUp',
          entity: 'company',
          entityId: companyId,
          summary: `${name} started ${companyName}`,
          after: { companyName, timeZone, owner: { name, email } },
        });
        return startSession(handle, personId, now);
      });
      ctx.setSession(token);
    } catch (error) {
      // Two sign-ups with one address at the same moment: the database lets one through.
      if (isAddressTaken(error)) return fail(taken());
      throw error;
    }
    return ok({ next: routes.home() });
  },
});
