import { listVariances } from '../../../db/queries/variances';
import { dayIn } from '../../clock';
import { fileAnswer } from '../../contracts/common';
import { exportVariancesInput, type VarianceRow } from '../../contracts/variances';
import { ok } from '../../domain/result';
import { type CsvColumn, csvFile } from '../csv-file';
import { defineVerb } from '../verb';

const COLUMNS: readonly CsvColumn<VarianceRow>[] = [
  ['Supplier', (row) => row.supplierName],
  ['Statement', (row) => row.statementNumber],
  ['Period ends', (row) => row.periodEnd],
  ['Age in days', (row) => row.ageDays],
  ['Finding', (row) => row.kind],
  ['Status', (row) => row.status],
  ['Job', (row) => row.jobName],
  ['Ticket', (row) => row.ticketNumber],
  ['Expected', (row) => row.expected],
  ['Billed', (row) => row.billed],
  ['Difference', (row) => row.difference],
  ['Why', (row) => row.sentence],
  ['Reason', (row) => row.reason],
  ['Decided by', (row) => row.decidedBy],
];

export const exportVariances = defineVerb({
  name: 'variances.export',
  says: 'All variances that the filters let through, as a CSV file',
  kind: 'read',
  permission: 'variances.read',
  http: { method: 'GET', path: '/api/variances/export' },
  input: exportVariancesInput,
  output: fileAnswer,
  async run(ctx, filter) {
    const today = dayIn(ctx.company.timeZone, ctx.clock.now());
    const rows = await listVariances(ctx.scope, filter, today, { offset: 0, limit: null });
    return ok(csvFile(ctx, 'variances', COLUMNS, rows));
  },
});
