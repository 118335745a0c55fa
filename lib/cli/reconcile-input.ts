import { z } from 'zod';
import type { BillLineFacts, OrderFacts, PumpTicketFacts, TicketFacts } from '../domain/facts';
import { clauseSchema, type RateSheetFacts } from '../domain/rating/clauses';
import { unrollPastMidnight } from '../domain/time/clock-minutes';
import {
  billRow,
  type InputProblem,
  orderRow,
  pumpRow,
  type Row,
  readTable,
  ticketRow,
} from './reconcile-tables';

/** A file as given on the command line. */
export interface InputFile {
  readonly name: string;
  readonly text: string;
}

export interface InputFiles {
  readonly rates: InputFile;
  readonly tickets: InputFile;
  readonly bill: InputFile;
  readonly orders: InputFile | null;
  readonly pump: InputFile | null;
}

export interface ReconcileFacts {
  readonly rateSheets: readonly RateSheetFacts[];
  readonly orders: readonly OrderFacts[];
  readonly tickets: readonly TicketFacts[];
  readonly pumpTickets: readonly PumpTicketFacts[];
  readonly billLines: readonly BillLineFacts[];
}

const day = z.string().regex(/^\d{4}-\d{2}-\d{2}$/, 'wants a day as YYYY-MM-DD');
const ratesSchema = z.strictObject({
  rateSheets: z
    .array(
      z.strictObject({
        supplier: z.string().min(1),
        job: z.string().min(1).nullable().default(null),
        name: z.string().min(1),
        version: z.number().int().positive().default(1),
        effectiveFrom: day,
        effectiveTo: day.nullable().default(null),
        clauses: z.array(clauseSchema),
      }),
    )
    .min(1),
});

/** Collects what is wrong; reading goes on, so that one run tells everything. */
class Reader {
  readonly problems: InputProblem[] = [];

  constructor(readonly suppliers: readonly string[]) {}

  table<Shape extends z.ZodRawShape>(file: InputFile, schema: z.ZodObject<Shape>) {
    const { rows, problems } = readTable(file.name, file.text, schema);
    this.problems.push(...problems);
    return rows;
  }

  /** A row's supplier; the column may be left out where the rates are one supplier's. */
  supplier(file: InputFile, row: number, named: string | null): string {
    const [only] = this.suppliers;
    if (named !== null) return named;
    if (only !== undefined && this.suppliers.length === 1) return only;
    this.problem(file, row, 'supplier', 'must be given where the rates are of several suppliers.');
    return '';
  }

  problem(file: InputFile, row: number, column: string, sentence: string) {
    this.problems.push({ file: file.name, row, column, sentence });
  }

  /** An id that says what it is, and a problem where a number comes twice. */
  idFor(
    file: InputFile,
    { row }: Row<unknown>,
    seen: Map<string, number>,
    supplier: string,
    number: string,
  ): string {
    const id = `${supplier}/${number}`;
    const earlier = seen.get(id);
    if (earlier === undefined) seen.set(id, row);
    else this.problem(file, row, 'number', `${number} is already on row ${earlier}.`);
    return id;
  }
}

function readRates(file: InputFile): {
  rateSheets: RateSheetFacts[];
  problems: InputProblem[];
} {
  let json: unknown;
  try {
    json = JSON.parse(file.text);
  } catch (error) {
    const said = error instanceof Error ? error.message : String(error);
    const sentence = `is not JSON (${said}).`;
    return { rateSheets: [], problems: [{ file: file.name, row: null, column: null, sentence }] };
  }
  const read = ratesSchema.safeParse(json);
  if (!read.success) {
    const problems = read.error.issues.map(({ path, message }) => ({
      file: file.name,
      row: null,
      column: null,
      sentence: `${path.join('.') || 'the whole file'}: ${message}.`,
    }));
    return { rateSheets: [], problems };
  }
  const rateSheets = read.data.rateSheets.map(({ supplier, job, clauses, ...sheet }, at) => ({
    ...sheet,
    id: `sheet-${at + 1}`,
    supplierId: supplier,
    jobId: job,
    clauses: clauses.map((clause, index) => ({ id: `sheet-${at + 1}.${index + 1}`, clause })),
  }));
  return { rateSheets, problems: [] };
}

function readTickets(file: InputFile, reader: Reader): TicketFacts[] {
  const seen = new Map<string, number>();
  return reader.table(file, ticketRow).map((row) => {
    const { supplier, order, job, load, ...ticket } = row.value;
    const supplierId = reader.supplier(file, row.row, supplier);
    const [batchedAt = null, arrivedAt = null, startedAt = null, finishedAt = null, leftAt = null] =
      unrollPastMidnight([
        ticket.batchedAt,
        ticket.arrivedAt,
        ticket.startedAt,
        ticket.finishedAt,
        ticket.leftAt,
      ]);
    return {
      ...ticket,
      id: reader.idFor(file, row, seen, supplierId, ticket.number),
      supplierId,
      orderId: order === null ? null : `${supplierId}/${order}`,
      jobId: job,
      jobName: job,
      loadNumber: load,
      batchedAt,
      arrivedAt,
      startedAt,
      finishedAt,
      leftAt,
    };
  });
}

function readPumpTickets(file: InputFile | null, reader: Reader): PumpTicketFacts[] {
  if (!file) return [];
  const seen = new Map<string, number>();
  return reader.table(file, pumpRow).map((row) => {
    const { supplier, order, job, setUps, ...ticket } = row.value;
    const supplierId = reader.supplier(file, row.row, supplier);
    return {
      ...ticket,
      id: reader.idFor(file, row, seen, supplierId, ticket.number),
      supplierId,
      orderId: order === null ? null : `${supplierId}/${order}`,
      jobId: job,
      jobName: job,
      setUps: setUps ?? 1,
    };
  });
}

function readOrders(file: InputFile | null, reader: Reader): OrderFacts[] {
  if (!file) return [];
  const seen = new Map<string, number>();
  return reader.table(file, orderRow).map((row) => {
    const { supplier, job, ...order } = row.value;
    const supplierId = reader.supplier(file, row.row, supplier);
    const id = reader.idFor(file, row, seen, supplierId, order.number);
    return { ...order, id, supplierId, jobId: job, jobName: job };
  });
}

function readBill(file: InputFile, reader: Reader): BillLineFacts[] {
  return reader.table(file, billRow).map(({ row, value }, at) => {
    const { supplier, invoice, ticket, job, charge, description, ...line } = value;
    return {
      ...line,
      id: `row-${row}`,
      supplierId: reader.supplier(file, row, supplier),
      position: at + 1,
      invoiceNumber: invoice,
      ticketNumber: ticket,
      jobName: job,
      chargeKind: charge,
      description: description ?? '',
    };
  });
}

/** All files as facts, or everything that is wrong with them. */
export function readInput(
  files: InputFiles,
):
  | { readonly ok: true; readonly facts: ReconcileFacts }
  | { readonly ok: false; readonly problems: InputProblem[] } {
  const { rateSheets, problems } = readRates(files.rates);
  if (problems.length > 0) return { ok: false, problems };
  const reader = new Reader([...new Set(rateSheets.map((sheet) => sheet.supplierId))]);
  const facts = {
    rateSheets,
    orders: readOrders(files.orders, reader),
    tickets: readTickets(files.tickets, reader),
    pumpTickets: readPumpTickets(files.pump, reader),
    billLines: readBill(files.bill, reader),
  };
  return reader.problems.length > 0
    ? { ok: false, problems: reader.problems }
    : { ok: true, facts };
}
