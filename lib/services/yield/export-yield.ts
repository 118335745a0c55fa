import { fileAnswer } from '../../contracts/common';
import { listYieldInput, type YieldFigures } from '../../contracts/yield';
import { ok } from '../../domain/result';
import { type CsvColumn, csvFile } from '../csv-file';
import { defineVerb } from '../verb';
import { workOutYield } from './list-yield';

interface ExportRow extends YieldFigures {
  readonly jobNumber: string;
  readonly jobName: string;
  readonly placement: string;
  readonly pourDate: string;
}

const COLUMNS: readonly CsvColumn<ExportRow>[] = [
  ['Job number', (row) => row.jobNumber],
  ['Job', (row) => row.jobName],
  ['Placement', (row) => row.placement],
  ['Poured', (row) => row.pourDate],
  ['Loads', (row) => row.loads],
  ['Figured yd3', (row) => row.figuredYd3],
  ['Ordered yd3', (row) => row.orderedYd3],
  ['Delivered yd3', (row) => row.deliveredYd3],
  ['Returned yd3', (row) => row.returnedYd3],
  ['Billed yd3', (row) => row.billedYd3],
  ['Overrun yd3', (row) => row.overrunYd3],
  ['Overrun share', (row) => row.overrunShare],
  ['Planned thickness in', (row) => row.plannedThicknessIn],
  ['Implied thickness in', (row) => row.impliedThicknessIn],
  ['Minutes on site', (row) => row.onSiteMinutes],
  ['Minutes per load', (row) => row.minutesPerLoad],
  ['Minutes per yd3', (row) => row.minutesPerYd3],
  ['Cost', (row) => row.cost],
  ['Cost per yd3', (row) => row.costPerYd3],
  ['Cost from', (row) => row.costFrom],
  ['Deliveries without a price', (row) => row.unpriced],
];

export const exportYield = defineVerb({
  name: 'yield.export',
  says: 'Yield by placement as a CSV file',
  kind: 'read',
  permission: 'yield.read',
  http: { method: 'GET', path: '/api/yield/export' },
  input: listYieldInput,
  output: fileAnswer,
  async run(ctx, filter) {
    const { rows } = await workOutYield(ctx, filter);
    const lines = rows.flatMap(({ jobNumber, jobName, placements }) =>
      placements.map(({ name, ...figures }) => ({
        ...figures,
        jobNumber,
        jobName,
        placement: name,
      })),
    );
    return ok(csvFile(ctx, 'yield', COLUMNS, lines));
  },
});
