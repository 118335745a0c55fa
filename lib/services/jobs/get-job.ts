import { findJob } from '../../../db/queries/jobs';
import { getJobInput, jobRow } from '../../contracts/jobs';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';

export const getJob = defineVerb({
  name: 'jobs.get',
  says: 'Read one job',
  kind: 'read',
  permission: 'jobs.read',
  http: { method: 'GET', path: '/api/jobs/{jobId}' },
  input: getJobInput,
  output: jobRow,
  async run({ scope, actor }, { jobId }) {
    const job = await findJob(scope, jobId, actor.seesAllJobs ? null : actor.personId);
    return job ? ok(job) : fail(notFound('job'));
  },
});
