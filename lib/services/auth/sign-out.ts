import { actorOfSession, endSession } from '../../auth/session';
import { nextPage, signOutInput } from '../../contracts/auth';
import { ok } from '../../domain/result';
import { routes } from '../../routes';
import { definePublicVerb } from '../public-verb';
import { writeActivity } from '../record';

export const signOut = definePublicVerb({
  name: 'auth.signOut',
  says: 'Sign out on this device',
  http: { method: 'POST', path: '/api/sign-out' },
  input: signOutInput,
  output: nextPage,
  async run(ctx) {
    ctx.clearSession();
    const token = ctx.sessionToken;
    const actor = token ? await actorOfSession(ctx.handle, token, ctx.clock.now()) : null;
    if (token && actor) {
      await endSession(ctx.handle, token);
      await writeActivity(
        ctx.handle,
        { companyId: actor.companyId, id: actor.personId, name: actor.name },
        ctx.clock.now(),
        {
          action: 'auth.signOut',
          entity: 'person',
          entityId: actor.personId,
          summary: `${actor.name} signed out`,
        },
      );
    }
    return ok({ next: routes.signIn() });
  },
});
