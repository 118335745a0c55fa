import { listOrders } from '../../../db/queries/orders';
import { fileAnswer } from '../../contracts/common';
import { exportOrdersInput, type OrderRow } from '../../contracts/orders';
import { ok } from '../../domain/result';
import { clockText } from '../../domain/time/clock-minutes';
import { type CsvColumn, csvFile } from '../csv-file';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';

const COLUMNS: readonly CsvColumn<OrderRow>[] = [
  ['Number', (row) => row.number],
  ['Status', (row) => row.status],
  ['Version', (row) => row.version],
  ['Supplier', (row) => row.supplierName],
  ['Their number', (row) => row.supplierReference],
  ['Job number', (row) => row.jobNumber],
  ['Job', (row) => row.jobName],
  ['Placement', (row) => row.placementName],
  ['Day', (row) => row.pourDate],
  ['First truck', (row) => (row.firstTruckAt === null ? '' : clockText(row.firstTruckAt))],
  ['Ordered yd3', (row) => row.orderedYd3],
  ['Delivered yd3', (row) => row.deliveredYd3],
  ['Loads', (row) => row.loads],
];

export const exportOrders = defineVerb({
  name: 'orders.export',
  says: 'All orders that the filters let through, as a CSV file',
  kind: 'read',
  permission: 'orders.read',
  http: { method: 'GET', path: '/api/orders/export' },
  input: exportOrdersInput,
  output: fileAnswer,
  async run(ctx, filter) {
    const page = { offset: 0, limit: null };
    const { rows } = await listOrders(ctx.scope, filter, crewLimit(ctx.actor), page);
    return ok(csvFile(ctx, 'orders', COLUMNS, rows));
  },
});
