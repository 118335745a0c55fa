import {
  countPeople,
  findJob,
  isJobNumberTaken,
  setCrew,
  updateJob as storeJob,
} from '../../../db/queries/jobs';
import { jobRow, updateJobInput } from '../../contracts/jobs';
import { fail, ok } from '../../domain/result';
import { failure, notFound } from '../failure';
import { defineVerb } from '../verb';

export const updateJob = defineVerb({
  name: 'jobs.update',
  says: 'Change a job',
  kind: 'write',
  permission: 'jobs.write',
  http: { method: 'PUT', path: '/api/jobs/{jobId}' },
  input: updateJobInput,
  output: jobRow,
  async run(ctx, { jobId, crewIds, ...values }) {
    const before = await findJob(ctx.scope, jobId, null);
    if (!before) return fail(notFound('job'));
    if (await isJobNumberTaken(ctx.scope, values.number, jobId)) {
      return fail(
        failure('conflict', `Job number ${values.number} is taken. Give this job another.`, [
          { path: 'number', message: 'already used by another job' },
        ]),
      );
    }
    if ((await countPeople(ctx.scope, crewIds)) !== crewIds.length) return fail(notFound('person'));
    await storeJob(ctx.scope, jobId, values);
    await setCrew(ctx.scope, jobId, crewIds);
    const after = await findJob(ctx.scope, jobId, null);
    if (!after) throw new Error('The job just changed is missing');
    await ctx.record({
      action: 'jobs.update',
      entity: 'job',
      entityId: jobId,
      summary: `Changed job ${after.number} ${after.name}`,
      before,
      after,
    });
    return ok(after);
  },
});
