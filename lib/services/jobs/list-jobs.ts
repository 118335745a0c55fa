import * as jobQueries from '../../../db/queries/jobs';
import { listJobsInput, listJobsOutput } from '../../contracts/jobs';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listJobs = defineVerb({
  name: 'jobs.list',
  says: 'List jobs, a page at a time',
  kind: 'read',
  permission: 'jobs.read',
  http: { method: 'GET', path: '/api/jobs' },
  input: listJobsInput,
  output: listJobsOutput,
  async run({ scope, actor }, { offset, limit, status, search }) {
    const crewMemberId = actor.seesAllJobs ? null : actor.personId;
    return ok(
      await jobQueries.listJobs(scope, { status, search, crewMemberId }, { offset, limit }),
    );
  },
});
