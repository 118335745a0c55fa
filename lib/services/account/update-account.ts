import { updateOwnPerson } from '../../../db/queries/people';
import { account, updateAccountInput } from '../../contracts/account';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { readAccount } from './get-account';
import { refuseKeys } from './people-only';

export const updateAccount = defineVerb({
  name: 'account.update',
  says: 'Change one’s own name and language',
  kind: 'write',
  permission: 'self.use',
  http: { method: 'PUT', path: '/api/account' },
  input: updateAccountInput,
  output: account,
  async run(ctx, values) {
    const refusal = refuseKeys(ctx.actor);
    if (refusal) return fail(refusal);
    const { name, locale } = ctx.actor;
    await updateOwnPerson(ctx.scope, ctx.actor.personId, values);
    const after = await readAccount(ctx);
    if (!after) return fail(notFound('account'));
    await ctx.record({
      action: 'account.update',
      entity: 'person',
      entityId: ctx.actor.personId,
      summary: `Changed the account of ${after.name}`,
      before: { name, locale },
      after: values,
    });
    return ok(after);
  },
});
