import { findKey, insertKey } from '../../../db/queries/keys';
import { hashToken, newToken } from '../../auth/tokens';
import { issueKeyInput, issueKeyOutput } from '../../contracts/keys';
import { ok } from '../../domain/result';
import { newId } from '../../ids';
import { defineVerb } from '../verb';

export const issueKey = defineVerb({
  name: 'keys.issue',
  says: 'Issue an access key for a script; it is shown this once',
  kind: 'write',
  permission: 'keys.manage',
  http: { method: 'POST', path: '/api/keys' },
  input: issueKeyInput,
  output: issueKeyOutput,
  async run(ctx, { name }) {
    const id = newId<'accessKey'>();
    const key = newToken();
    await insertKey(ctx.scope, {
      id,
      name,
      tokenHash: hashToken(key),
      lastFour: key.slice(-4),
      createdBy: ctx.actor.personId,
      createdAt: ctx.clock.now(),
    });
    const row = await findKey(ctx.scope, id);
    if (!row) throw new Error('The key just issued is missing');
    await ctx.record({
      action: 'keys.issue',
      entity: 'accessKey',
      entityId: id,
      summary: `Issued access key ${name}, ending in ${row.lastFour}`,
      after: row,
    });
    return ok({ key, row });
  },
});
