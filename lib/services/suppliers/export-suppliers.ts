import { listSuppliers } from '../../../db/queries/suppliers';
import { fileAnswer } from '../../contracts/common';
import { exportSuppliersInput, type SupplierRow } from '../../contracts/suppliers';
import { ok } from '../../domain/result';
import { type CsvColumn, csvFile } from '../csv-file';
import { defineVerb } from '../verb';

const COLUMNS: readonly CsvColumn<SupplierRow>[] = [
  ['Name', (row) => row.name],
  ['Kind', (row) => row.kind],
  ['Account', (row) => row.accountNumber],
  ['Dispatch', (row) => row.dispatchEmail],
  ['Credit desk', (row) => row.creditEmail],
  ['Phone', (row) => row.phone],
  ['Statements', (row) => row.statements],
  ['Open against us', (row) => row.openAgainst],
];

export const exportSuppliers = defineVerb({
  name: 'suppliers.export',
  says: 'All suppliers that the filters let through, as a CSV file',
  kind: 'read',
  permission: 'suppliers.read',
  http: { method: 'GET', path: '/api/suppliers/export' },
  input: exportSuppliersInput,
  output: fileAnswer,
  async run(ctx, filter) {
    const { rows } = await listSuppliers(ctx.scope, filter, { offset: 0, limit: null });
    return ok(csvFile(ctx, 'suppliers', COLUMNS, rows));
  },
});
