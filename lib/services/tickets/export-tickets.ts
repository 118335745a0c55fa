import { listTickets } from '../../../db/queries/ticket-list';
import { fileAnswer } from '../../contracts/common';
import type { TicketRow } from '../../contracts/tickets';
import { exportTicketsInput } from '../../contracts/tickets';
import { ok } from '../../domain/result';
import { clockText } from '../../domain/time/clock-minutes';
import { type CsvColumn, csvFile } from '../csv-file';
import { defineVerb } from '../verb';
import { crewLimit } from './internal';

const time = (minutes: number | null) => (minutes === null ? '' : clockText(minutes));

const COLUMNS: readonly CsvColumn<TicketRow>[] = [
  ['Date', (row) => row.date],
  ['Ticket', (row) => row.number],
  ['Supplier', (row) => row.supplierName],
  ['Job number', (row) => row.jobNumber],
  ['Job', (row) => row.jobName],
  ['Placement', (row) => row.placementName],
  ['Status', (row) => row.status],
  ['Load', (row) => row.loadNumber],
  ['Truck', (row) => row.truck],
  ['Plant', (row) => row.plant],
  ['Mix', (row) => row.mixCode],
  ['Yards', (row) => row.quantityYd3],
  ['Returned yards', (row) => row.returnedYd3],
  ['Batched', (row) => time(row.batchedAt)],
  ['Arrived', (row) => time(row.arrivedAt)],
  ['Started', (row) => time(row.startedAt)],
  ['Finished', (row) => time(row.finishedAt)],
  ['Left', (row) => time(row.leftAt)],
];

export const exportTickets = defineVerb({
  name: 'tickets.export',
  says: 'All tickets that the filters let through, as a CSV file',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/tickets/export' },
  input: exportTicketsInput,
  output: fileAnswer,
  async run({ scope, actor, clock, company }, filters) {
    const filter = { ...filters, crewMemberId: crewLimit(actor) };
    const { rows } = await listTickets(scope, filter, { offset: 0, limit: null });
    return ok(csvFile({ clock, company }, 'tickets', COLUMNS, rows));
  },
});
