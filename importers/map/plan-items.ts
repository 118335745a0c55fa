import type { DiagnosticCollector } from '../core/diagnostic';
import type { BillLineValues, ImportItem, RowKind } from '../core/plan';
import { readChargeKind } from './charge-kind';
import type { RowReading } from './read-row';
import { lineFingerprint, OccurrenceCounter, rawFingerprint } from './row-key';

/** A record of the file with what was read from it; no reading where it is broken. */
export interface PlannedRow {
  readonly line: number;
  readonly raw: string;
  readonly reading: RowReading | null;
}

const BILLED_KINDS: ReadonlySet<RowKind> = new Set(['line', 'tax', 'credit', 'payment']);
const UNREAD: BillLineValues = {
  date: null,
  ticketNumber: null,
  invoiceNumber: null,
  jobName: null,
  truck: null,
  description: '',
  mixCode: null,
  itemCode: null,
  quantity: null,
  unit: null,
  unitPrice: null,
  amount: null,
};

function hasError(reading: RowReading): boolean {
  return reading.observations.some((found) => found.severity === 'error');
}

/** Yards of mix on each ticket, by which a fee per yard is told from a fee per load. */
function yardsByTicket(rows: readonly PlannedRow[]): Map<string, string> {
  const yards = new Map<string, string>();
  for (const { reading } of rows) {
    if (reading === null || reading.rowKind !== 'line') continue;
    const { ticketNumber, quantity } = reading.values;
    if (ticketNumber === null || quantity === null || yards.has(ticketNumber)) continue;
    if (chargeOf(reading, null).kind === 'mix') yards.set(ticketNumber, quantity);
  }
  return yards;
}

function chargeOf(reading: RowReading, ticketYards: string | null) {
  const { rowKind, values } = reading;
  if (rowKind === 'tax') return { kind: 'tax' as const, reason: 'says “tax”', sure: true };
  if (rowKind === 'payment') {
    return { kind: 'other' as const, reason: 'a payment, no charge', sure: true };
  }
  const { description, itemCode, unit, quantity, ticketNumber } = values;
  return readChargeKind({ description, itemCode, unit, quantity, ticketNumber, ticketYards });
}

/** "Job: Harbor Lofts" between the lines names the job of those that follow. */
function jobHeading(reading: RowReading): string | null {
  const found = /^(?:job(?: name| site)?|project|deliver(?:ed)? to|site)\s*[:#-]\s*(\S.*)$/i.exec(
    reading.values.description,
  );
  return found?.[1] ?? null;
}

/** Turns readings into plan items in the order of the file. */
class Planner {
  private readonly items: ImportItem[] = [];
  private readonly occurrences = new OccurrenceCounter();
  private heading: string | null = null;

  constructor(
    private readonly existing: ReadonlySet<string>,
    private readonly yards: ReadonlyMap<string, string>,
    private readonly collector: DiagnosticCollector,
  ) {}

  plan(rows: readonly PlannedRow[]): ImportItem[] {
    for (const row of rows) {
      if (row.reading === null) this.addFailed(row, UNREAD, 'line');
      else if (hasError(row.reading)) {
        this.addFailed(row, row.reading.values, row.reading.rowKind);
      } else if (BILLED_KINDS.has(row.reading.rowKind)) this.addLine(row, row.reading);
      else this.addPassedOver(row, row.reading);
    }
    return this.items;
  }

  private addFailed(row: PlannedRow, values: BillLineValues, rowKind: RowKind): void {
    this.items.push({
      rowKey: this.occurrences.next(rawFingerprint(row.raw), row.line).key,
      sourceLine: row.line,
      raw: row.raw,
      rowKind,
      values,
      chargeKind: 'other',
      chargeReason: 'not read',
      action: 'error',
      skipReason: null,
    });
  }

  private addPassedOver(row: PlannedRow, reading: RowReading): void {
    const { rowKind } = reading;
    if (rowKind === 'line' || rowKind === 'tax' || rowKind === 'credit' || rowKind === 'payment') {
      throw new Error(`a ${rowKind} is not passed over`);
    }
    if (rowKind === 'note') this.readNote(row, reading);
    this.items.push({
      rowKey: this.occurrences.next(lineFingerprint(rowKind, reading.values), row.line).key,
      sourceLine: row.line,
      raw: row.raw,
      rowKind,
      values: reading.values,
      chargeKind: 'other',
      chargeReason: 'not a charge',
      action: 'skip',
      skipReason: rowKind,
    });
  }

  private readNote(row: PlannedRow, reading: RowReading): void {
    const job = jobHeading(reading);
    if (job !== null) this.heading = job;
    this.collector.add({
      code: 'row.note',
      severity: 'guess',
      line: row.line,
      raw: row.raw,
      sentence:
        job === null
          ? `Line ${row.line} has words only and is passed over.`
          : `Line ${row.line} is taken as the job of the lines below it: ${job}.`,
    });
  }

  private addLine(row: PlannedRow, reading: RowReading): void {
    const jobName = reading.values.jobName ?? this.heading;
    const ticket = reading.values.ticketNumber;
    const charge = chargeOf(reading, ticket === null ? null : (this.yards.get(ticket) ?? null));
    const mixCode = charge.kind === 'mix' ? reading.values.itemCode : null;
    const values = { ...reading.values, jobName, mixCode };
    if (!charge.sure && reading.rowKind === 'line') this.observeUnknown(row, values, charge.reason);
    this.add(row, reading.rowKind, values, charge.kind, charge.reason);
    if (reading.taxAmount !== null) this.addTaxOfLine(row, values, reading.taxAmount);
  }

  private addTaxOfLine(row: PlannedRow, line: BillLineValues, amount: string): void {
    const values: BillLineValues = {
      ...line,
      description: `Tax on ${line.description}`.trim(),
      mixCode: null,
      quantity: null,
      unit: null,
      unitPrice: null,
      amount,
    };
    this.add(row, 'tax', values, 'tax', 'stands in the tax column');
  }

  private add(
    row: PlannedRow,
    rowKind: RowKind,
    values: BillLineValues,
    chargeKind: ImportItem['chargeKind'],
    chargeReason: string,
  ): void {
    const occurrence = this.occurrences.next(lineFingerprint(rowKind, values), row.line);
    if (occurrence.count > 1) this.observeRepeated(row, occurrence.firstLine);
    const already = this.existing.has(occurrence.key);
    this.items.push({
      rowKey: occurrence.key,
      sourceLine: row.line,
      raw: row.raw,
      rowKind,
      values,
      chargeKind,
      chargeReason,
      action: already ? 'skip' : 'create',
      skipReason: already ? 'alreadyImported' : null,
    });
  }

  private observeRepeated(row: PlannedRow, firstLine: number): void {
    this.collector.add({
      code: 'row.repeated',
      severity: 'warning',
      line: row.line,
      alsoLine: firstLine,
      raw: row.raw,
      sentence: `Line ${row.line} says the same as line ${firstLine}; both are kept.`,
      hint: 'If the supplier billed it twice, the strike-off sheet will show it.',
    });
  }

  private observeUnknown(row: PlannedRow, values: BillLineValues, reason: string): void {
    const named =
      values.description === '' ? 'without a description' : `“${values.description.slice(0, 60)}”`;
    this.collector.add({
      code: 'row.chargeUnknown',
      severity: 'guess',
      line: row.line,
      raw: row.raw,
      got: values.description,
      sentence: `Line ${row.line} ${named}: what it charges for is not certain (${reason}).`,
      hint: 'Choose what it charges for on the preview.',
    });
  }
}

/** The plan for all rows: which lines are new, already in the ledger, passed over or broken. */
export function planItems(
  rows: readonly PlannedRow[],
  existing: ReadonlySet<string>,
  collector: DiagnosticCollector,
): ImportItem[] {
  return new Planner(existing, yardsByTicket(rows), collector).plan(rows);
}
