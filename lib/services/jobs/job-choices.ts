import { foremenOf } from '../../../db/queries/people';
import { jobChoicesInput, jobChoicesOutput } from '../../contracts/jobs';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const jobChoices = defineVerb({
  name: 'jobs.choices',
  says: 'List the foremen who can be put on a job',
  kind: 'read',
  permission: 'jobs.write',
  http: { method: 'GET', path: '/api/jobs/choices' },
  input: jobChoicesInput,
  output: jobChoicesOutput,
  async run({ scope }) {
    return ok({ foremen: await foremenOf(scope) });
  },
});
