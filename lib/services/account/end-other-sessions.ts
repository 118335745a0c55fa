import { endOtherSessions as storeEnds } from '../../auth/session';
import { endOtherSessionsInput, endOtherSessionsOutput } from '../../contracts/account';
import { fail, ok } from '../../domain/result';
import { defineVerb } from '../verb';
import { refuseKeys } from './people-only';

export const endOtherSessions = defineVerb({
  name: 'account.endOtherSessions',
  says: 'Sign out everywhere but here',
  kind: 'write',
  permission: 'self.use',
  http: { method: 'DELETE', path: '/api/account/other-sessions' },
  input: endOtherSessionsInput,
  output: endOtherSessionsOutput,
  async run(ctx) {
    const refusal = refuseKeys(ctx.actor);
    if (refusal) return fail(refusal);
    const { personId, name, sessionId } = ctx.actor;
    const endedSessions = await storeEnds(ctx.scope.handle, personId, sessionId ?? '');
    if (endedSessions === 0) ctx.unchanged();
    else {
      await ctx.record({
        action: 'account.endOtherSessions',
        entity: 'person',
        entityId: personId,
        summary: `${name} signed out on ${endedSessions} other devices`,
      });
    }
    return ok({ endedSessions });
  },
});
