import { findPasswordReset, setPassword, spendPasswordReset } from '../../../db/queries/accounts';
import { inTx } from '../../../db/tx';
import { hashPassword } from '../../auth/password';
import { forgetAttempts } from '../../auth/rate-limit';
import { endAllSessions, startSession } from '../../auth/session';
import { hashToken } from '../../auth/tokens';
import { nextPage, resetPasswordInput } from '../../contracts/auth';
import { fail, ok } from '../../domain/result';
import { routes } from '../../routes';
import { failure } from '../failure';
import { definePublicVerb } from '../public-verb';
import { writeActivity } from '../record';
import { refuseTooMany } from './limits';
import { refuseObvious } from './password-rules';

const over = () =>
  failure('notFound', 'This link is used up or too old. Ask for a new one on the sign-in page.');

export const resetPassword = definePublicVerb({
  name: 'auth.resetPassword',
  says: 'Choose a new password with the link from a message',
  http: { method: 'POST', path: '/api/reset-password' },
  input: resetPasswordInput,
  output: nextPage,
  async run(ctx, { token, password }) {
    const refusal = await refuseTooMany(ctx.handle, 'attempts', [['linkAddress', ctx.address]]);
    if (refusal) return fail(refusal);
    const now = ctx.clock.now();
    const account = await findPasswordReset(ctx.handle, hashToken(token), now);
    if (!account) return fail(over());
    const { personId, companyId, name, email } = account;
    const obvious = refuseObvious(password, [email, name, account.companyName], 'password');
    if (obvious) return fail(obvious);
    const passwordHash = await hashPassword(password);
    const started = await inTx({ companyId, handle: ctx.handle }, async ({ handle }) => {
      if (!(await spendPasswordReset(handle, hashToken(token), now))) return null;
      await setPassword(handle, personId, passwordHash);
      await endAllSessions(handle, personId);
      await writeActivity(handle, { companyId, id: personId, name }, now, {
        action: 'auth.resetPassword',
        entity: 'person',
        entityId: personId,
        summary: `${name} chose a new password with a link; all devices were signed out`,
      });
      return startSession(handle, personId, now);
    });
    if (!started) return fail(over());
    await forgetAttempts(ctx.handle, 'signInAccount', email);
    await forgetAttempts(ctx.handle, 'signInAccountAndAddress', email, ctx.address);
    ctx.setSession(started);
    return ok({ next: routes.home() });
  },
});
