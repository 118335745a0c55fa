import { findJob } from '../../../db/queries/jobs';
import { findPlacementRow, insertPlacement } from '../../../db/queries/placements';
import { createPlacementInput, placementRow } from '../../contracts/placements';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { notFound } from '../failure';
import { defineVerb } from '../verb';

export const createPlacement = defineVerb({
  name: 'placements.create',
  says: 'Add a placement to a job',
  kind: 'write',
  permission: 'jobs.write',
  http: { method: 'POST', path: '/api/jobs/{jobId}/placements' },
  input: createPlacementInput,
  output: placementRow,
  async run(ctx, { jobId, ...values }) {
    if (!(await findJob(ctx.scope, jobId, null))) return fail(notFound('job'));
    const id = newId<'placement'>();
    await insertPlacement(ctx.scope, id, jobId, { ...values, status: 'planned' });
    const made = await findPlacementRow(ctx.scope, id, null);
    if (!made) throw new Error('The placement just added is missing');
    await ctx.record({
      action: 'placements.create',
      entity: 'placement',
      entityId: id,
      summary: `Added placement ${made.name} to job ${made.jobNumber} ${made.jobName}`,
      after: made,
    });
    return ok(made);
  },
});
