import type { OrderFacts, PumpTicketFacts, TicketFacts } from '../facts';
import { extend, roundCents, sumMoney } from '../money/money';
import { day } from '../words';
import type { Clause, RateSheetFacts } from './clauses';
import {
  CHARGE_KIND_OF,
  isLoadClause,
  isPumpClause,
  rateLoad,
  ratePump,
} from './clauses-by-kind/registry';
import type { Rated } from './clauses-by-kind/rule';
import { taxRule } from './clauses-by-kind/tax';
import type { ExpectedBill, ExpectedLine, UnratedDelivery } from './expected-line';
import { indexOrders, type OrderIndex } from './order-index';
import { indexSheets, type PreparedSheet, type SheetIndex, type TaxClause } from './sheet-index';

export interface RatingInput {
  readonly rateSheets: readonly RateSheetFacts[];
  readonly orders: readonly OrderFacts[];
  readonly tickets: readonly TicketFacts[];
  readonly pumpTickets: readonly PumpTicketFacts[];
  /**
   * The invoice that bills a delivery, by ticket or pump ticket id, where it is known: tax is
   * then expected once per invoice, else once for all deliveries together.
   */
  readonly invoiceOf?: ReadonlyMap<string, string>;
}

type Delivery = TicketFacts | PumpTicketFacts;

interface Collected {
  readonly owed: ExpectedLine[];
  readonly notOwed: ExpectedLine[];
  readonly unrated: UnratedDelivery[];
  /** Taxable amounts by tax clause and invoice. */
  readonly tax: Map<string, TaxGroup>;
}

interface TaxGroup {
  readonly tax: TaxClause;
  readonly sheet: PreparedSheet;
  readonly invoice: string | null;
  readonly lines: ExpectedLine[];
}

/** A rated clause as a line; the amount is quantity × rate to the cent, here and nowhere else. */
function toLine(
  rated: Rated,
  sheet: PreparedSheet,
  clause: { readonly id: string; readonly clause: Clause },
  delivery: Delivery,
  kind: 'ticket' | 'pumpTicket',
): ExpectedLine {
  const base = {
    key: `${clause.id}:${delivery.id}`,
    chargeKind: CHARGE_KIND_OF[clause.clause.kind],
    clauseId: clause.id,
    rateSheetId: sheet.sheet.id,
    supplierId: delivery.supplierId,
    label: rated.label,
    date: delivery.date,
    ticketIds: kind === 'ticket' ? [delivery.id] : [],
    pumpTicketIds: kind === 'pumpTicket' ? [delivery.id] : [],
    orderId: delivery.orderId,
    jobId: delivery.jobId,
    explanation: rated.explanation,
  };
  if (rated.status === 'notProvable') {
    const { missing, lowest, highest } = rated;
    return {
      ...base,
      status: 'notProvable',
      missing,
      lowest: roundCents(lowest),
      highest: highest && roundCents(highest),
    };
  }
  const { quantity, unit, rate } = rated;
  const amount = roundCents(extend(quantity, rate));
  return { ...base, status: 'owed', quantity, unit, rate, amount };
}

function noSheet(delivery: Delivery): string {
  return `No rate sheet is in effect on ${day(delivery.date)} for the supplier of ${delivery.number}.`;
}

function collect(
  into: Collected,
  line: ExpectedLine,
  clause: Clause,
  sheet: PreparedSheet,
  exempt: boolean,
  invoice: string | null,
): void {
  const nothing = line.status === 'owed' && line.amount.isZero();
  (nothing ? into.notOwed : into.owed).push(line);
  const { tax } = sheet;
  if (!tax || exempt || line.status !== 'owed' || clause.kind === 'tax') return;
  if (!tax.clause.taxes.includes(clause.kind)) return;
  const key = JSON.stringify([tax.id, invoice]);
  const group = into.tax.get(key) ?? { tax, sheet, invoice, lines: [] };
  group.lines.push(line);
  into.tax.set(key, group);
}

interface Context {
  readonly sheets: SheetIndex;
  readonly orders: OrderIndex;
  readonly invoiceOf: ReadonlyMap<string, string>;
}

function rateTicket(ticket: TicketFacts, context: Context, into: Collected): void {
  const sheet = context.sheets.sheetFor(ticket.supplierId, ticket.jobId, ticket.date);
  if (!sheet) {
    into.unrated.push({ ticketId: ticket.id, pumpTicketId: null, reason: noSheet(ticket) });
    return;
  }
  const mixPrice = sheet.priceOf(ticket.mixCode);
  if (!mixPrice) {
    const reason = `${sheet.sheet.name} has no price for mix ${ticket.mixCode} of load ${ticket.number}.`;
    into.unrated.push({ ticketId: ticket.id, pumpTicketId: null, reason });
  }
  const load = { ticket, isBalanceLoad: context.orders.isBalanceLoad(ticket) };
  const exempt = context.orders.isExempt(ticket);
  const invoice = context.invoiceOf.get(ticket.id) ?? null;
  for (const clause of mixPrice ? [mixPrice, ...sheet.others] : sheet.others) {
    if (!isLoadClause(clause.clause)) continue;
    const line = toLine(rateLoad(clause.clause, load), sheet, clause, ticket, 'ticket');
    collect(into, line, clause.clause, sheet, exempt, invoice);
  }
}

function ratePumpTicket(ticket: PumpTicketFacts, context: Context, into: Collected): void {
  const sheet = context.sheets.sheetFor(ticket.supplierId, ticket.jobId, ticket.date);
  if (!sheet) {
    into.unrated.push({ ticketId: null, pumpTicketId: ticket.id, reason: noSheet(ticket) });
    return;
  }
  const clauses = sheet.others.filter(({ clause }) => isPumpClause(clause));
  if (clauses.length === 0) {
    const reason = `${sheet.sheet.name} has no price for a pump (pump ticket ${ticket.number}).`;
    into.unrated.push({ ticketId: null, pumpTicketId: ticket.id, reason });
  }
  const exempt = context.orders.isExempt(ticket);
  const invoice = context.invoiceOf.get(ticket.id) ?? null;
  for (const clause of clauses) {
    if (!isPumpClause(clause.clause)) continue;
    const line = toLine(ratePump(clause.clause, ticket), sheet, clause, ticket, 'pumpTicket');
    collect(into, line, clause.clause, sheet, exempt, invoice);
  }
}

function taxLine({ tax, sheet, invoice, lines }: TaxGroup): ExpectedLine {
  const taxable = sumMoney(
    lines.map((line) => (line.status === 'owed' ? line.amount : line.lowest)),
  );
  const name = invoice === null ? 'these deliveries' : `invoice ${invoice}`;
  const rated = taxRule.rate(tax.clause, { taxable, name });
  if (rated.status !== 'owed') throw new Error('tax is always provable from its base');
  return {
    key: `${tax.id}:${invoice ?? 'all'}`,
    chargeKind: 'tax',
    clauseId: tax.id,
    rateSheetId: sheet.sheet.id,
    supplierId: sheet.sheet.supplierId,
    label: rated.label,
    date:
      lines
        .map((line) => line.date)
        .sort()
        .at(-1) ?? '',
    ticketIds: [...new Set(lines.flatMap((line) => line.ticketIds))],
    pumpTicketIds: [...new Set(lines.flatMap((line) => line.pumpTicketIds))],
    orderId: null,
    jobId: null,
    explanation: rated.explanation,
    status: 'owed',
    quantity: rated.quantity,
    unit: rated.unit,
    rate: rated.rate,
    amount: roundCents(extend(rated.quantity, rated.rate)),
  };
}

/** Deliveries in a fixed order, whatever order they come in. */
function inOrder<D extends Delivery>(deliveries: readonly D[]): D[] {
  const key = ({ date, number, id }: D) => [date, number, id];
  return [...deliveries].sort((one, other) => {
    const [first, second] = [key(one), key(other)];
    const at = first.findIndex((part, index) => part !== second[index]);
    return at < 0 ? 0 : (first[at] ?? '') < (second[at] ?? '') ? -1 : 1;
  });
}

/**
 * What the rate sheets say these deliveries should cost: a line per ticket and clause, then tax.
 * Lines whose clause comes to nothing are in `notOwed` with the reason; a delivery that no sheet
 * or price covers is in `unrated`; a line with a missing fact is `notProvable` with its range and
 * is not in the tax base. The result does not depend on the order of the input.
 */
export function expectedBill(input: RatingInput): ExpectedBill {
  const context: Context = {
    sheets: indexSheets(input.rateSheets),
    orders: indexOrders(input.orders, input.tickets),
    invoiceOf: input.invoiceOf ?? new Map(),
  };
  const into: Collected = { owed: [], notOwed: [], unrated: [], tax: new Map() };
  for (const ticket of inOrder(input.tickets)) rateTicket(ticket, context, into);
  for (const ticket of inOrder(input.pumpTickets)) ratePumpTicket(ticket, context, into);
  const taxes = [...into.tax.values()].map(taxLine);
  return {
    lines: [...into.owed, ...taxes],
    notOwed: into.notOwed,
    unrated: into.unrated,
  };
}
