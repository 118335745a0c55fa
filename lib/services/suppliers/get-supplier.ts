import { rateSheetsOf } from '../../../db/queries/rate-sheets';
import { countLayouts, findSupplier } from '../../../db/queries/suppliers';
import { supplierDetail, supplierRef } from '../../contracts/suppliers';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';

export const getSupplier = defineVerb({
  name: 'suppliers.get',
  says: 'Read one supplier with its rate sheets',
  kind: 'read',
  permission: 'suppliers.read',
  http: { method: 'GET', path: '/api/suppliers/{supplierId}' },
  input: supplierRef,
  output: supplierDetail,
  async run({ scope }, { supplierId }) {
    const supplier = await findSupplier(scope, supplierId);
    if (!supplier) return fail(notFound('supplier'));
    return ok({
      ...supplier,
      rateSheets: await rateSheetsOf(scope, supplierId),
      rememberedLayouts: await countLayouts(scope, supplierId),
    });
  },
});
