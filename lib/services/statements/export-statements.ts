import { listStatements } from '../../../db/queries/statements';
import { fileAnswer } from '../../contracts/common';
import { exportStatementsInput, type StatementRow } from '../../contracts/statements';
import { ok } from '../../domain/result';
import { type CsvColumn, csvFile } from '../csv-file';
import { defineVerb } from '../verb';

const COLUMNS: readonly CsvColumn<StatementRow>[] = [
  ['Supplier', (row) => row.supplierName],
  ['Number', (row) => row.number],
  ['From', (row) => row.periodStart],
  ['To', (row) => row.periodEnd],
  ['Status', (row) => row.status],
  ['Lines', (row) => row.lines],
  ['Settled lines', (row) => row.settled],
  ['Billed', (row) => row.billed],
  ['Open against us', (row) => row.against],
  ['Opening balance', (row) => row.openingBalance],
  ['Closing balance', (row) => row.closingBalance],
];

export const exportStatements = defineVerb({
  name: 'statements.export',
  says: 'All statements that the filters let through, as a CSV file',
  kind: 'read',
  permission: 'statements.read',
  http: { method: 'GET', path: '/api/statements/export' },
  input: exportStatementsInput,
  output: fileAnswer,
  async run(ctx, filter) {
    const { rows } = await listStatements(ctx.scope, filter, { offset: 0, limit: null });
    return ok(csvFile(ctx, 'statements', COLUMNS, rows));
  },
});
