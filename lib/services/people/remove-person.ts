import { revokeKeysOf } from '../../../db/queries/keys';
import { countOtherOwners, findPerson, markRemoved } from '../../../db/queries/people';
import { endAllSessions } from '../../auth/session';
import { removePersonInput, removePersonOutput } from '../../contracts/people';
import type { PersonId } from '../../domain/ids';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { lastOwner } from './last-owner';

export const removePerson = defineVerb({
  name: 'people.remove',
  says: 'Remove someone; what the person did stays recorded',
  kind: 'write',
  permission: 'people.manage',
  http: { method: 'DELETE', path: '/api/people/{personId}' },
  input: removePersonInput,
  output: removePersonOutput,
  async run(ctx, { personId }) {
    const otherOwners = await countOtherOwners(ctx.scope, personId);
    const before = await findPerson(ctx.scope, personId);
    if (!before) return fail(notFound('person'));
    if (before.role === 'owner' && otherOwners === 0) return fail(lastOwner(before.name));
    const now = ctx.clock.now();
    await markRemoved(ctx.scope, personId, now);
    await revokeKeysOf(ctx.scope, personId, now);
    await endAllSessions(ctx.scope.handle, personId as PersonId);
    await ctx.record({
      action: 'people.remove',
      entity: 'person',
      entityId: personId,
      summary: `Removed ${before.name} (${before.role})`,
      before,
    });
    return ok({ id: personId });
  },
});
