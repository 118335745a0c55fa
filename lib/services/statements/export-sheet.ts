import { findStatement } from '../../../db/queries/statements';
import { fileAnswer } from '../../contracts/common';
import type { SheetRow } from '../../contracts/sheet';
import { statementRef } from '../../contracts/statements';
import { fail, ok } from '../../domain/result';
import { type CsvColumn, csvFile } from '../csv-file';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { sheetOf } from './get-sheet';

const delivered = (row: SheetRow, read: (one: SheetRow['deliveries'][number]) => string | null) =>
  row.deliveries.map((one) => read(one) ?? '').join(' ');

const COLUMNS: readonly CsvColumn<SheetRow>[] = [
  ['Order', (row) => row.ordered?.orderNumber ?? null],
  ['Job', (row) => row.ordered?.jobName ?? row.billed?.jobName ?? null],
  ['Ordered yd3', (row) => row.ordered?.quantityYd3 ?? null],
  ['Ticket', (row) => delivered(row, (one) => one.number)],
  ['Delivered on', (row) => delivered(row, (one) => one.date)],
  ['Delivered yd3', (row) => delivered(row, (one) => one.quantityYd3)],
  ['Bill line', (row) => row.billed?.position ?? null],
  ['Invoice', (row) => row.billed?.invoiceNumber ?? null],
  ['Billed ticket', (row) => row.billed?.ticketNumber ?? null],
  ['Description', (row) => row.billed?.description ?? null],
  ['Quantity', (row) => row.billed?.quantity ?? null],
  ['Unit', (row) => row.billed?.unit ?? null],
  ['Rate', (row) => row.billed?.unitPrice ?? null],
  ['Billed', (row) => row.billed?.amount ?? null],
  ['Expected', (row) => row.expected],
  ['Difference', (row) => row.difference],
  ['Finding', (row) => row.findings.map((finding) => finding.kind).join(' ')],
  ['Why', (row) => row.findings.map((finding) => finding.sentence).join(' ') || row.sentence],
  ['Settled', (row) => row.settled?.state ?? null],
  ['Reason', (row) => row.settled?.reason ?? null],
  ['By', (row) => row.settled?.by ?? null],
];

export const exportSheet = defineVerb({
  name: 'statements.exportSheet',
  says: 'A statement’s strike-off sheet as a CSV file',
  kind: 'read',
  permission: 'statements.read',
  http: { method: 'GET', path: '/api/statements/{statementId}/export' },
  input: statementRef,
  output: fileAnswer,
  async run(ctx, { statementId }) {
    const statement = await findStatement(ctx.scope, statementId);
    if (!statement) return fail(notFound('statement'));
    const { rows } = await sheetOf(ctx, statement);
    return ok(csvFile(ctx, `sheet-${statement.number}`, COLUMNS, rows));
  },
});
