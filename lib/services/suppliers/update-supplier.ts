import {
  findSupplier,
  isSupplierNameTaken,
  updateSupplierRow,
} from '../../../db/queries/suppliers';
import { supplierRow, updateSupplierInput } from '../../contracts/suppliers';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { supplierNameTaken } from './name-taken';

export const updateSupplier = defineVerb({
  name: 'suppliers.update',
  says: 'Change a supplier, or put it away',
  kind: 'write',
  permission: 'suppliers.write',
  http: { method: 'PUT', path: '/api/suppliers/{supplierId}' },
  input: updateSupplierInput,
  output: supplierRow,
  async run(ctx, { supplierId, ...values }) {
    const before = await findSupplier(ctx.scope, supplierId);
    if (!before) return fail(notFound('supplier'));
    if (await isSupplierNameTaken(ctx.scope, values.name, supplierId)) {
      return fail(supplierNameTaken(values.name));
    }
    await updateSupplierRow(ctx.scope, supplierId, values);
    const after = await findSupplier(ctx.scope, supplierId);
    if (!after) throw new Error('The supplier just changed is missing');
    await ctx.record({
      action: 'suppliers.update',
      entity: 'supplier',
      entityId: supplierId,
      summary: `Changed supplier ${after.name}`,
      before,
      after,
    });
    return ok(after);
  },
});
