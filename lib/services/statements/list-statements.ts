import { listStatements as find, supplierChoices } from '../../../db/queries/statements';
import { listStatementsInput, listStatementsOutput } from '../../contracts/statements';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listStatements = defineVerb({
  name: 'statements.list',
  says: 'List statements with how far each is settled, a page at a time',
  kind: 'read',
  permission: 'statements.read',
  http: { method: 'GET', path: '/api/statements' },
  input: listStatementsInput,
  output: listStatementsOutput,
  async run({ scope }, { offset, limit, ...filter }) {
    const found = await find(scope, filter, { offset, limit });
    return ok({ ...found, suppliers: await supplierChoices(scope) });
  },
});
