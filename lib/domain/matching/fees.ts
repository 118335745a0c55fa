import type { BillLineFacts } from '../facts';
import { sumQuantity } from '../money/money';
import type { MatchBook } from './book';
import { byDay, onDay } from './by-score';
import { type Delivery, deliveryKindsOf, isMainCharge, sameJob, sameTruck } from './delivery';

/** A run of fee lines printed under the main charge that they belong to. */
interface Run {
  readonly main: BillLineFacts;
  /** Charges that occur more than once in the run: those are for more than the one delivery. */
  readonly repeated: ReadonlySet<string>;
}

const chargeKey = ({ chargeKind, description }: BillLineFacts) =>
  JSON.stringify([chargeKind, description.toLowerCase()]);

/** For each fee line without a number: the run it stands in, by the document's order. */
function runsOf(lines: readonly BillLineFacts[]): Map<string, Run> {
  const runs = new Map<string, Run>();
  let main: BillLineFacts | null = null;
  let fees: BillLineFacts[] = [];
  const close = () => {
    if (main === null) return;
    const seen = new Set<string>();
    const repeated = new Set<string>();
    for (const key of fees.map(chargeKey)) (seen.has(key) ? repeated : seen).add(key);
    for (const fee of fees) runs.set(fee.id, { main, repeated });
  };
  for (const line of lines) {
    if (isMainCharge(line.chargeKind)) {
      close();
      main = line;
      fees = [];
    } else if (line.chargeKind !== 'tax') fees.push(line);
  }
  close();
  return runs;
}

function quantityFits(
  fee: BillLineFacts,
  main: BillLineFacts,
  under: readonly Delivery[],
): boolean {
  if (fee.quantity === null) return true;
  if (fee.chargeKind === 'perLoadFee') return fee.quantity.eq(under.length);
  if (fee.chargeKind !== 'perYardFee') return true;
  const delivered = sumQuantity(under.flatMap((load) => load.quantityYd3 ?? []));
  return fee.quantity.eq(delivered) || (main.quantity !== null && fee.quantity.eq(main.quantity));
}

type Above = 'belongs' | 'belongsToNone' | 'unrelated';

/** Whether a fee belongs to the main charge printed above it. */
function relationToRun(fee: BillLineFacts, run: Run | undefined, book: MatchBook): Above {
  if (!run || run.repeated.has(chargeKey(fee))) return 'unrelated';
  const { main } = run;
  const sameInvoice = fee.invoiceNumber === main.invoiceNumber;
  const sameDate = fee.date === null || main.date === null || fee.date === main.date;
  if (!sameInvoice || !sameDate || sameTruck(fee.truck, main.truck) === false) return 'unrelated';
  const under = book.deliveriesOf(main.id);
  if (under.length === 0) return 'belongsToNone';
  if (!under.every(({ kind }) => deliveryKindsOf(fee.chargeKind).includes(kind))) {
    return 'unrelated';
  }
  return quantityFits(fee, main, under) ? 'belongs' : 'unrelated';
}

interface Places {
  readonly days: ReadonlyMap<string, Delivery[]>;
  /** Deliveries whose main charge stands on an invoice. */
  readonly invoices: ReadonlyMap<string, ReadonlySet<Delivery>>;
}

const invoiceKey = (line: BillLineFacts) => JSON.stringify([line.supplierId, line.invoiceNumber]);

function deliveriesByInvoice(book: MatchBook): Map<string, Set<Delivery>> {
  const invoices = new Map<string, Set<Delivery>>();
  for (const line of book.lines) {
    if (line.invoiceNumber === null || !isMainCharge(line.chargeKind)) continue;
    const onInvoice = invoices.get(invoiceKey(line)) ?? new Set();
    for (const delivery of book.deliveriesOf(line.id)) onInvoice.add(delivery);
    invoices.set(invoiceKey(line), onInvoice);
  }
  return invoices;
}

/** The deliveries of a fee's day (and its invoice, job and truck where printed). */
function deliveriesOfDay(fee: BillLineFacts, { days, invoices }: Places): readonly Delivery[] {
  const kinds = deliveryKindsOf(fee.chargeKind);
  const onInvoice = fee.invoiceNumber === null ? undefined : invoices.get(invoiceKey(fee));
  const ofDay = fee.date === null ? [...(onInvoice ?? [])] : onDay(days, fee.supplierId, fee.date);
  let found = ofDay.filter(({ kind }) => kinds.includes(kind));
  const narrowings = [
    (delivery: Delivery) => onInvoice?.has(delivery) ?? false,
    (delivery: Delivery) => sameJob(fee.jobName, delivery.jobName) === true,
    (delivery: Delivery) => sameTruck(fee.truck, delivery.truck) === true,
  ];
  for (const narrowing of narrowings) {
    const narrower = found.filter(narrowing);
    if (narrower.length > 0) found = narrower;
  }
  return found.filter(
    (delivery) =>
      sameJob(fee.jobName, delivery.jobName) !== false &&
      sameTruck(fee.truck, delivery.truck) !== false,
  );
}

/** Deliveries by the number that a matched line prints, right or mistyped. */
function byPrintedNumber(book: MatchBook): Map<string, readonly Delivery[]> {
  const numbers = new Map<string, readonly Delivery[]>();
  for (const line of book.lines) {
    if (line.ticketNumber === null || !book.isSettled(line)) continue;
    const key = JSON.stringify([line.supplierId, line.ticketNumber]);
    const deliveries = book.deliveriesOf(line.id);
    if (deliveries.length > 0 && !numbers.has(key)) numbers.set(key, deliveries);
  }
  return numbers;
}

/**
 * Step 5: charges that name no delivery follow the line whose number they repeat, else the main
 * charge printed above them, else the deliveries of their day. A fee printed under a load that
 * was never delivered has no delivery either; so has one whose number is nobody's.
 */
export function matchFees(book: MatchBook): void {
  const open = book.lines.filter((line) => line.chargeKind !== 'tax' && !book.isSettled(line));
  const fees = open.filter((line) => line.chargeKind !== 'mix');
  if (fees.length === 0) return;
  const runs = runsOf(book.lines);
  const numbers = byPrintedNumber(book);
  const places = { days: byDay(book.deliveries), invoices: deliveriesByInvoice(book) };
  for (const fee of fees) {
    if (fee.ticketNumber) {
      const same = numbers.get(JSON.stringify([fee.supplierId, fee.ticketNumber]));
      if (same) {
        const reason = `Same printed number ${fee.ticketNumber} as the line that bills the delivery.`;
        book.settle(fee, same, { method: 'followsTicket', confidence: 0.85, reason });
      }
      continue;
    }
    const run = runs.get(fee.id);
    const relation = relationToRun(fee, run, book);
    if (relation === 'belongsToNone') continue;
    if (relation === 'belongs' && run) {
      const under = book.deliveriesOf(run.main.id);
      const reason = `Stands under line ${run.main.position}, which bills the delivery.`;
      book.settle(fee, under, { method: 'followsTicket', confidence: 0.85, reason });
      continue;
    }
    const ofDay = deliveriesOfDay(fee, places);
    if (ofDay.length === 0) continue;
    const reason = fee.date
      ? `No number; the deliveries of ${fee.date}.`
      : `No number or date; the deliveries of invoice ${fee.invoiceNumber}.`;
    book.settle(fee, ofDay, { method: 'followsDay', confidence: 0.6, reason });
  }
}
