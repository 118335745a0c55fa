import { setTimeout as wait } from 'node:timers/promises';
import type { FoundAccount } from '../../../db/queries/accounts';
import { findAccount, replacePasswordReset } from '../../../db/queries/accounts';
import { inTx } from '../../../db/tx';
import { countAttempt } from '../../auth/rate-limit';
import { hashToken, newToken } from '../../auth/tokens';
import { forgotPasswordInput, forgotPasswordOutput } from '../../contracts/auth';
import { fail, ok } from '../../domain/result';
import { linkTo } from '../../mail/link';
import { passwordResetMail } from '../../mail/templates';
import { writeMail } from '../../mail/write-mail';
import { routes } from '../../routes';
import type { PublicCtx } from '../public-verb';
import { definePublicVerb } from '../public-verb';
import { writeActivity } from '../record';
import { refuseTooMany } from './limits';

const LINK_MINUTES = 60;
/** Writing a message takes a few milliseconds that an unknown address would not. */
const ANSWER_AFTER_MS = 300;

export const forgotPassword = definePublicVerb({
  name: 'auth.forgotPassword',
  says: 'Have a link to choose a new password sent',
  http: { method: 'POST', path: '/api/forgot-password' },
  input: forgotPasswordInput,
  output: forgotPasswordOutput,
  async run(ctx, { email }) {
    const refusal = await refuseTooMany(ctx.handle, 'requests', [['forgotAddress', ctx.address]]);
    if (refusal) return fail(refusal);
    // Over the account's own limit the answer is the same, and no further message is written.
    const isOver = (await countAttempt(ctx.handle, 'forgotAccount', email)) !== null;
    const answer = wait(ANSWER_AFTER_MS);
    const account = await findAccount(ctx.handle, email);
    if (account && !isOver) await sendLink(ctx, account);
    await answer;
    return ok({ done: true as const });
  },
});

async function sendLink(ctx: PublicCtx, account: FoundAccount): Promise<void> {
  const token = newToken();
  const now = ctx.clock.now();
  const expiresAt = new Date(now.getTime() + LINK_MINUTES * 60_000);
  const { companyId, personId, name, email } = account;
  await inTx({ companyId, handle: ctx.handle }, async (scope) => {
    await replacePasswordReset(scope.handle, personId, hashToken(token), expiresAt);
    const link = linkTo(routes.resetPassword(token));
    const mail = passwordResetMail({ name, link, minutes: LINK_MINUTES });
    await writeMail({ scope, clock: ctx.clock }, { ...mail, to: email });
    await writeActivity(scope.handle, { companyId, id: null, name: 'Sign-in page' }, now, {
      action: 'auth.forgotPassword',
      entity: 'person',
      entityId: personId,
      summary: `A link to choose a new password was sent to ${name}`,
    });
  });
}
