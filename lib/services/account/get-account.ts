import { findPerson } from '../../../db/queries/people';
import { sessionsOf } from '../../auth/session';
import { account, getAccountInput } from '../../contracts/account';
import { fail, ok } from '../../domain/result';
import type { Ctx } from '../context';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { refuseKeys } from './people-only';

export const getAccount = defineVerb({
  name: 'account.get',
  says: 'Read one’s own account',
  kind: 'read',
  permission: 'self.use',
  http: { method: 'GET', path: '/api/account' },
  input: getAccountInput,
  output: account,
  async run(ctx) {
    const refusal = refuseKeys(ctx.actor);
    if (refusal) return fail(refusal);
    const own = await readAccount(ctx);
    return own ? ok(own) : fail(notFound('account'));
  },
});

/** The account of whoever asks, with the devices that are signed in. */
export async function readAccount({ scope, actor, company }: Ctx) {
  const person = await findPerson(scope, actor.personId);
  if (!person) return null;
  const sessions = await sessionsOf(scope.handle, actor.personId);
  return {
    personId: person.id,
    name: person.name,
    email: person.email,
    role: person.role,
    locale: person.locale,
    companyName: company.name,
    timeZone: company.timeZone,
    clock: company.clock,
    sessions: sessions.map((session) => ({
      startedAt: session.startedAt.toISOString(),
      expiresAt: session.expiresAt.toISOString(),
      isThisOne: session.id === actor.sessionId,
    })),
  };
}
