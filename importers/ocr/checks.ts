import Decimal from 'decimal.js';
import { parseClock, unrollPastMidnight } from '../../lib/domain/time/clock-minutes';
import { READING_NOTES, type ReadContext, type ReadingNote, type TicketField } from './reading';
import { knownName } from './supplier';

/** What the fields say about one another, and what the ledger says about them. */
export interface CheckResult {
  /** Something besides the engine says that the value is right. */
  readonly confirmed: ReadonlySet<TicketField>;
  /** Something says that the value may be wrong. */
  readonly disputed: ReadonlySet<TicketField>;
  readonly notes: readonly ReadingNote[];
}

export type FieldValues = ReadonlyMap<TicketField, string>;

class Findings {
  readonly confirmed = new Set<TicketField>();
  readonly disputed = new Set<TicketField>();
  readonly notes: ReadingNote[] = [];

  confirm(...fields: TicketField[]): void {
    for (const field of fields) this.confirmed.add(field);
  }

  dispute(...fields: TicketField[]): void {
    for (const field of fields) this.disputed.add(field);
  }

  note(code: keyof typeof READING_NOTES): void {
    this.notes.push({ code, sentence: READING_NOTES[code] });
  }
}

/** More than any mixer carries, in cubic yards. */
const MOST_LOAD_YD3 = 16;
/** A load's whole way, from batching to leaving, is a matter of a few hours. */
const LONGEST_STEP_MINUTES = 240;
const FARTHEST_DAYS = 120;

function yards(values: FieldValues, field: TicketField): Decimal | null {
  const text = values.get(field);
  return text === undefined ? null : new Decimal(text);
}

function checkYards(values: FieldValues, findings: Findings): void {
  const load = yards(values, 'quantityYd3');
  const toDate = yards(values, 'toDateYd3');
  const ordered = yards(values, 'orderedYd3');
  const number = Number(values.get('loadNumber') ?? 0);
  if (load && (load.gt(MOST_LOAD_YD3) || load.lt('0.25'))) findings.dispute('quantityYd3');
  if (load && ordered && load.gt(ordered.times('1.25').plus(1))) {
    findings.dispute('quantityYd3', 'orderedYd3');
  }
  if (!load || !toDate) return;
  if (toDate.lt(load)) {
    findings.dispute('quantityYd3', 'toDateYd3');
    findings.note('toDateDiffers');
  }
  if (ordered && toDate.gt(ordered.times('1.5').plus(10))) findings.dispute('toDateYd3');
  if (number === 0) return;
  if (number === 1 && toDate.eq(load)) findings.confirm('quantityYd3', 'toDateYd3', 'loadNumber');
  else if ((number === 1) !== toDate.eq(load)) {
    findings.dispute('quantityYd3', 'toDateYd3', 'loadNumber');
  } else {
    checkEarlierLoads(toDate.minus(load), number - 1, load, findings);
  }
}

/** The loads before this one must each have been of a size that a truck can carry. */
function checkEarlierLoads(
  before: Decimal,
  loads: number,
  load: Decimal,
  findings: Findings,
): void {
  const each = before.dividedBy(loads);
  if (each.gt(MOST_LOAD_YD3) || each.lt(1)) {
    findings.dispute('quantityYd3', 'toDateYd3', 'loadNumber');
  } else if (each.eq(load)) {
    // Full loads throughout: three fields agree on one product.
    findings.confirm('quantityYd3', 'toDateYd3', 'loadNumber');
  }
}

const TIMES = ['batchedAt', 'arrivedAt', 'startedAt', 'finishedAt', 'leftAt'] as const;

function checkTimes(values: FieldValues, findings: Findings): void {
  const known = TIMES.filter((field) => values.has(field));
  const minutes = unrollPastMidnight(known.map((field) => parseClock(values.get(field) ?? '')));
  let disorder = false;
  known.forEach((field, index) => {
    const before = known[index - 1];
    const step = (minutes[index] ?? 0) - (minutes[index - 1] ?? 0);
    if (!before || (step >= 0 && step <= LONGEST_STEP_MINUTES)) return;
    findings.dispute(before, field);
    disorder = true;
  });
  if (disorder) findings.note('timesOutOfOrder');
}

function daysApart(a: string, b: string): number {
  return Math.abs(Date.parse(`${a}T00:00:00Z`) - Date.parse(`${b}T00:00:00Z`)) / 86_400_000;
}

function checkDate(values: FieldValues, context: ReadContext, findings: Findings): void {
  const date = values.get('date');
  if (!date || !context.today) return;
  if (date > context.today || daysApart(date, context.today) > FARTHEST_DAYS) {
    findings.dispute('date');
  } else if (date === context.today) findings.confirm('date');
}

function checkAgainstOrder(values: FieldValues, context: ReadContext, findings: Findings): void {
  const order = context.orders?.find((one) => one.number === values.get('orderNumber'));
  if (!order) return;
  findings.confirm('orderNumber');
  const mix = values.get('mixCode');
  if (order.mixCode && mix === order.mixCode) findings.confirm('mixCode');
  const ordered = yards(values, 'orderedYd3');
  if (order.orderedYd3 && ordered?.eq(order.orderedYd3)) findings.confirm('orderedYd3');
  if (order.date && order.date === values.get('date')) findings.confirm('date');
}

function checkNames(values: FieldValues, context: ReadContext, findings: Findings): void {
  const supplierName = values.get('supplierName');
  const supplier = context.suppliers?.find((one) => one.name === supplierName);
  if (supplier) findings.confirm('supplierName');
  const mix = values.get('mixCode');
  if (supplier && mix) {
    if (supplier.mixCodes.includes(mix)) findings.confirm('mixCode');
    else if (supplier.mixCodes.length > 0) findings.dispute('mixCode');
  }
  const job = values.get('jobName');
  if (job && knownName(job, context.jobs ?? []) === job) findings.confirm('jobName');
}

/** Checks the fields of one ticket against each other and against what is known. */
export function checkFields(values: FieldValues, context: ReadContext): CheckResult {
  const findings = new Findings();
  checkYards(values, findings);
  checkTimes(values, findings);
  checkDate(values, context, findings);
  checkAgainstOrder(values, context, findings);
  checkNames(values, context, findings);
  return findings;
}
