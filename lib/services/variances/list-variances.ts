import {
  listVariances as find,
  varianceGroups,
  varianceTotals,
} from '../../../db/queries/variances';
import { dayIn } from '../../clock';
import { listVariancesInput, listVariancesOutput } from '../../contracts/variances';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listVariances = defineVerb({
  name: 'variances.list',
  says: 'List variances with their dollars, by supplier, kind and age',
  kind: 'read',
  permission: 'variances.read',
  http: { method: 'GET', path: '/api/variances' },
  input: listVariancesInput,
  output: listVariancesOutput,
  async run({ scope, clock, company }, { offset, limit, ...filter }) {
    const today = dayIn(company.timeZone, clock.now());
    const { total, ...totals } = await varianceTotals(scope, filter, today);
    return ok({
      rows: await find(scope, filter, today, { offset, limit }),
      total,
      totals,
      ...(await varianceGroups(scope, filter, today)),
    });
  },
});
