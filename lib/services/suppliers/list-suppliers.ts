import { listSuppliers as find } from '../../../db/queries/suppliers';
import { listSuppliersInput, listSuppliersOutput } from '../../contracts/suppliers';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listSuppliers = defineVerb({
  name: 'suppliers.list',
  says: 'List suppliers, a page at a time',
  kind: 'read',
  permission: 'suppliers.read',
  http: { method: 'GET', path: '/api/suppliers' },
  input: listSuppliersInput,
  output: listSuppliersOutput,
  async run({ scope }, { offset, limit, ...filter }) {
    return ok(await find(scope, filter, { offset, limit }));
  },
});
