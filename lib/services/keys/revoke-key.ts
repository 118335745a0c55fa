import { findKey, revokeKey as storeRevocation } from '../../../db/queries/keys';
import { keyRow, revokeKeyInput } from '../../contracts/keys';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';

export const revokeKey = defineVerb({
  name: 'keys.revoke',
  says: 'Revoke an access key at once',
  kind: 'write',
  permission: 'keys.manage',
  http: { method: 'DELETE', path: '/api/keys/{keyId}' },
  input: revokeKeyInput,
  output: keyRow,
  async run(ctx, { keyId }) {
    const before = await findKey(ctx.scope, keyId);
    if (!before) return fail(notFound('access key'));
    if (before.revokedAt) {
      ctx.unchanged();
      return ok(before);
    }
    await storeRevocation(ctx.scope, keyId, ctx.clock.now());
    const after = await findKey(ctx.scope, keyId);
    if (!after) throw new Error('The key just revoked is missing');
    await ctx.record({
      action: 'keys.revoke',
      entity: 'accessKey',
      entityId: keyId,
      summary: `Revoked access key ${before.name}, ending in ${before.lastFour}`,
      before,
      after,
    });
    return ok(after);
  },
});
