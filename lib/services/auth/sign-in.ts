import { findAccount } from '../../../db/queries/accounts';
import { checkPassword } from '../../auth/password';
import { forgetAttempts, giveAttemptBack } from '../../auth/rate-limit';
import { endSession, startSession } from '../../auth/session';
import { nextPage, signInInput } from '../../contracts/auth';
import { fail, ok } from '../../domain/result';
import { log } from '../../log';
import { routes } from '../../routes';
import { failure } from '../failure';
import { definePublicVerb } from '../public-verb';
import { writeActivity } from '../record';
import { refuseTooMany } from './limits';

export const signIn = definePublicVerb({
  name: 'auth.signIn',
  says: 'Sign in with address and password',
  http: { method: 'POST', path: '/api/sign-in' },
  input: signInInput,
  output: nextPage,
  async run(ctx, { email, password }) {
    // Counted before the password is looked at, which costs 20 MB and 50 ms a time.
    const refusal = await refuseTooMany(ctx.handle, 'attempts to sign in', [
      ['signInAddress', ctx.address],
      ['signInAccountAndAddress', email, ctx.address],
      ['signInAccount', email],
    ]);
    if (refusal) {
      log.warn({ event: 'signInLimited', address: ctx.address }, refusal.message);
      return fail(refusal);
    }
    const account = await findAccount(ctx.handle, email);
    // The same work for an address that nobody has, so that the time taken tells nothing.
    const isRight = await checkPassword(account?.passwordHash ?? null, password);
    if (!account || !isRight) {
      log.warn({ event: 'signInRefused', address: ctx.address }, 'wrong address or password');
      return fail(failure('notSignedIn', 'This address and password do not belong together.'));
    }
    await forgetAttempts(ctx.handle, 'signInAccountAndAddress', email, ctx.address);
    await forgetAttempts(ctx.handle, 'signInAccount', email);
    await giveAttemptBack(ctx.handle, 'signInAddress', ctx.address);
    if (ctx.sessionToken) await endSession(ctx.handle, ctx.sessionToken);
    ctx.setSession(await startSession(ctx.handle, account.personId, ctx.clock.now()));
    await writeActivity(
      ctx.handle,
      { companyId: account.companyId, id: account.personId, name: account.name },
      ctx.clock.now(),
      {
        action: 'auth.signIn',
        entity: 'person',
        entityId: account.personId,
        summary: `${account.name} signed in`,
      },
    );
    return ok({ next: routes.home() });
  },
});
