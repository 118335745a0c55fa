import { findSupplier, insertSupplier } from '../../../db/queries/suppliers';
import { createSupplierInput, supplierRow } from '../../contracts/suppliers';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { defineVerb } from '../verb';
import { supplierNameTaken } from './name-taken';

export const createSupplier = defineVerb({
  name: 'suppliers.create',
  says: 'Add a supplier',
  kind: 'write',
  permission: 'suppliers.write',
  http: { method: 'POST', path: '/api/suppliers' },
  input: createSupplierInput,
  output: supplierRow,
  async run(ctx, values) {
    const id = newId<'supplier'>();
    if (!(await insertSupplier(ctx.scope, id, { ...values, archived: false }))) {
      return fail(supplierNameTaken(values.name));
    }
    const made = await findSupplier(ctx.scope, id);
    if (!made) throw new Error('The supplier just added is missing');
    await ctx.record({
      action: 'suppliers.create',
      entity: 'supplier',
      entityId: id,
      summary: `Added supplier ${made.name}`,
      after: made,
    });
    return ok(made);
  },
});
