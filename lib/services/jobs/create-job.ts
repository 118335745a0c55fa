import {
  countPeople,
  findJob,
  insertJob,
  isJobNumberTaken,
  setCrew,
} from '../../../db/queries/jobs';
import { createJobInput, jobRow } from '../../contracts/jobs';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { failure, notFound } from '../failure';
import { defineVerb } from '../verb';

export const createJob = defineVerb({
  name: 'jobs.create',
  says: 'Add a job',
  kind: 'write',
  permission: 'jobs.write',
  http: { method: 'POST', path: '/api/jobs' },
  input: createJobInput,
  output: jobRow,
  async run(ctx, { crewIds, ...values }) {
    if (await isJobNumberTaken(ctx.scope, values.number, null)) {
      return fail(
        failure('conflict', `Job number ${values.number} is taken. Give this job another.`, [
          { path: 'number', message: 'already used by another job' },
        ]),
      );
    }
    if ((await countPeople(ctx.scope, crewIds)) !== crewIds.length) return fail(notFound('person'));
    const id = newId<'job'>();
    await insertJob(ctx.scope, id, { ...values, status: 'open' });
    await setCrew(ctx.scope, id, crewIds);
    const job = await findJob(ctx.scope, id, null);
    if (!job) throw new Error('The job just added is missing');
    await ctx.record({
      action: 'jobs.create',
      entity: 'job',
      entityId: id,
      summary: `Added job ${job.number} ${job.name}`,
      after: job,
    });
    return ok(job);
  },
});
