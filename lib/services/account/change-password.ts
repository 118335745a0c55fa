import { openStore } from '../../../db/client';
import { setPassword } from '../../../db/queries/accounts';
import { findPasswordHash } from '../../../db/queries/people';
import { checkPassword, hashPassword } from '../../auth/password';
import { forgetAttempts } from '../../auth/rate-limit';
import { endOtherSessions } from '../../auth/session';
import { changePasswordInput, changePasswordOutput } from '../../contracts/account';
import { fail, ok } from '../../domain/result';
import { refuseTooMany } from '../auth/limits';
import { refuseObvious } from '../auth/password-rules';
import { failure } from '../failure';
import { defineVerb } from '../verb';
import { refuseKeys } from './people-only';

const wrong = () =>
  failure('invalid', 'The current password is not right.', [
    { path: 'currentPassword', message: 'not right' },
  ]);

export const changePassword = defineVerb({
  name: 'account.changePassword',
  says: 'Change one’s own password; other devices are signed out',
  kind: 'write',
  permission: 'self.use',
  http: { method: 'PUT', path: '/api/account/password' },
  input: changePasswordInput,
  output: changePasswordOutput,
  /** Hashing takes 100 ms in all, which no transaction should wait for. */
  async prepare(input, actor) {
    const { handle } = await openStore();
    const refusal =
      refuseKeys(actor) ??
      (await refuseTooMany(handle, 'attempts', [['currentPassword', actor.personId]])) ??
      refuseObvious(input.newPassword, [actor.email, actor.name], 'newPassword');
    if (refusal) return fail(refusal);
    const oldHash = await findPasswordHash({ companyId: actor.companyId, handle }, actor.personId);
    if (!(await checkPassword(oldHash, input.currentPassword))) return fail(wrong());
    await forgetAttempts(handle, 'currentPassword', actor.personId);
    return ok({ ...input, oldHash, newHash: await hashPassword(input.newPassword) });
  },
  async run(ctx, { oldHash, newHash }) {
    const { personId, name, sessionId } = ctx.actor;
    // Changed meanwhile on another device: what was checked is no longer the current password.
    if ((await findPasswordHash(ctx.scope, personId)) !== oldHash) return fail(wrong());
    await setPassword(ctx.scope.handle, personId, newHash);
    const endedSessions = await endOtherSessions(ctx.scope.handle, personId, sessionId ?? '');
    await ctx.record({
      action: 'account.changePassword',
      entity: 'person',
      entityId: personId,
      summary: `${name} changed the password; other devices were signed out`,
    });
    return ok({ endedSessions });
  },
});
