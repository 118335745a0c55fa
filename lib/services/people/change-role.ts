import { revokeKeysOf } from '../../../db/queries/keys';
import { countOtherOwners, findPerson, setRole } from '../../../db/queries/people';
import { endAllSessions } from '../../auth/session';
import { changeRoleInput, personRow } from '../../contracts/people';
import type { PersonId } from '../../domain/ids';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { lastOwner } from './last-owner';

export const changeRole = defineVerb({
  name: 'people.changeRole',
  says: 'Change someone’s role; the person signs in again',
  kind: 'write',
  permission: 'people.manage',
  http: { method: 'PUT', path: '/api/people/{personId}/role' },
  input: changeRoleInput,
  output: personRow,
  async run(ctx, { personId, role }) {
    const otherOwners = await countOtherOwners(ctx.scope, personId);
    const before = await findPerson(ctx.scope, personId);
    if (!before) return fail(notFound('person'));
    const isYou = personId === ctx.actor.personId;
    if (before.role === role) {
      ctx.unchanged();
      return ok({ ...before, isYou });
    }
    if (before.role === 'owner' && otherOwners === 0) return fail(lastOwner(before.name));
    await setRole(ctx.scope, personId, role);
    if (before.role === 'owner') await revokeKeysOf(ctx.scope, personId, ctx.clock.now());
    await endAllSessions(ctx.scope.handle, personId as PersonId);
    await ctx.record({
      action: 'people.changeRole',
      entity: 'person',
      entityId: personId,
      summary: `Made ${before.name} ${role}, was ${before.role}`,
      before: { role: before.role },
      after: { role },
    });
    return ok({ ...before, role, isYou });
  },
});
