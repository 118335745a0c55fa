import { findJob } from '../../../db/queries/jobs';
import { listPlacements as find } from '../../../db/queries/placements';
import { listPlacementsInput, listPlacementsOutput } from '../../contracts/placements';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';

export const listPlacements = defineVerb({
  name: 'placements.list',
  says: 'List a job’s placements with their yards',
  kind: 'read',
  permission: 'jobs.read',
  http: { method: 'GET', path: '/api/jobs/{jobId}/placements' },
  input: listPlacementsInput,
  output: listPlacementsOutput,
  async run({ scope, actor }, { jobId, offset, limit }) {
    const crewMemberId = crewLimit(actor);
    if (!(await findJob(scope, jobId, crewMemberId))) return fail(notFound('job'));
    return ok(await find(scope, jobId, crewMemberId, { offset, limit }));
  },
});
