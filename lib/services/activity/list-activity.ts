import * as activityQueries from '../../../db/queries/activity';
import { startOfDay } from '../../clock';
import { listActivityInput, listActivityOutput } from '../../contracts/activity';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listActivity = defineVerb({
  name: 'activity.list',
  says: 'Read the activity record, newest first',
  kind: 'read',
  permission: 'activity.read',
  http: { method: 'GET', path: '/api/activity' },
  input: listActivityInput,
  output: listActivityOutput,
  async run({ scope, company }, { offset, limit, from, to, ...filter }) {
    const listed = await activityQueries.listActivity(
      scope,
      {
        ...filter,
        from: from ? startOfDay(company.timeZone, from) : null,
        until: to ? startOfDay(company.timeZone, to, 1) : null,
      },
      { offset, limit },
    );
    return ok({ ...listed, entities: await activityQueries.listActivityEntities(scope) });
  },
});
