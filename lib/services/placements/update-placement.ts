import { findPlacementRow, updatePlacementRow } from '../../../db/queries/placements';
import { placementRow, updatePlacementInput } from '../../contracts/placements';
import { fail, ok } from '../../domain/result';
import { failure, notFound } from '../failure';
import { defineVerb } from '../verb';

export const updatePlacement = defineVerb({
  name: 'placements.update',
  says: 'Change a placement, or call it off',
  kind: 'write',
  permission: 'jobs.write',
  http: { method: 'PUT', path: '/api/placements/{placementId}' },
  input: updatePlacementInput,
  output: placementRow,
  async run(ctx, { placementId, ...values }) {
    const before = await findPlacementRow(ctx.scope, placementId, null);
    if (!before) return fail(notFound('placement'));
    if (values.status === 'cancelled' && before.status !== 'cancelled') {
      if (before.loads > 0 || before.orderedYd3 !== null) {
        const what = before.loads > 0 ? 'has loads' : 'is on order';
        return fail(
          failure(
            'conflict',
            `${before.name} ${what}. ${before.loads > 0 ? 'What was delivered can’t be called off.' : 'Cancel its orders first, so that dispatch is told.'}`,
            [{ path: 'status', message: what }],
          ),
        );
      }
    }
    await updatePlacementRow(ctx.scope, placementId, values);
    const after = await findPlacementRow(ctx.scope, placementId, null);
    if (!after) throw new Error('The placement just changed is missing');
    await ctx.record({
      action: 'placements.update',
      entity: 'placement',
      entityId: placementId,
      summary: `Changed placement ${after.name} of job ${after.jobNumber} ${after.jobName}`,
      before,
      after,
    });
    return ok(after);
  },
});
