import Decimal from 'decimal.js';
import type { OrderFacts, PumpTicketFacts, TicketFacts } from '../facts';
import { count, money, roundCents, sumMoney } from '../money/money';
import type { Charge, ClauseOf } from './clause-module';
import type { Clause, ClauseKind, IdentifiedClause, RateSheetFacts } from './clauses';
import type { ExpectedBill, ExpectedLine, UnratedDelivery } from './expected-line';
import { moduleOf } from './registry';
import { sheetFor } from './select-sheet';
import { dollars } from './words';

export interface RatingInput {
  readonly rateSheets: readonly RateSheetFacts[];
  readonly orders: readonly OrderFacts[];
  readonly tickets: readonly TicketFacts[];
  readonly pumpTickets: readonly PumpTicketFacts[];
}

/**
 * What the suppliers should charge for these deliveries: for each, the clauses of the sheet in
 * force on its day (a job's own before the supplier's), line by line with the arithmetic; then
 * tax per order, or per day where a delivery has none. A missing fact makes a line
 * `notProvable` with its range; a delivery that no sheet covers is listed as unrated.
 * The result does not depend on the order of the input. Source of the rules: domain.md §3.
 */
export function expectedBill(input: RatingInput): ExpectedBill {
  const lines: ExpectedLine[] = [];
  const unrated: UnratedDelivery[] = [];
  const balanceLoads = findBalanceLoads(input.tickets);
  for (const load of sortedById(input.tickets)) {
    const sheet = sheetFor(input.rateSheets, load);
    if (!sheet) {
      unrated.push(unratedLoad(load, 'no rate sheet is in force for its supplier on that day'));
      continue;
    }
    const before = lines.length;
    for (const one of clausesFor(sheet, load)) {
      const context = { isBalanceLoad: balanceLoads.has(load.id) };
      const charge = moduleOf(one.clause as ClauseOf<ClauseKind>).rateLoad?.(
        one.clause as never,
        load,
        context,
      );
      if (charge) lines.push(lineOf(charge, one, sheet, load, { ticketIds: [load.id] }));
    }
    if (!lines.slice(before).some((line) => line.chargeKind === 'mix')) {
      unrated.push(
        unratedLoad(load, `the sheet ${sheet.name} has no price for mix ${load.mixCode}`),
      );
    }
  }
  for (const pump of sortedById(input.pumpTickets)) {
    const sheet = sheetFor(input.rateSheets, pump);
    if (!sheet) {
      unrated.push({
        ticketId: null,
        pumpTicketId: pump.id,
        reason: `Pump ticket ${pump.number}: no rate sheet is in force for its supplier on that day.`,
      });
      continue;
    }
    for (const one of sheet.clauses) {
      const charge = moduleOf(one.clause as ClauseOf<ClauseKind>).ratePumpTicket?.(
        one.clause as never,
        pump,
      );
      if (charge) lines.push(lineOf(charge, one, sheet, pump, { pumpTicketIds: [pump.id] }));
    }
  }
  return { lines: [...lines, ...taxLines(input, lines)], unrated };
}

function sortedById<T extends { readonly id: string }>(rows: readonly T[]): T[] {
  return [...rows].sort((a, b) => (a.id < b.id ? -1 : 1));
}

function unratedLoad(load: TicketFacts, why: string): UnratedDelivery {
  return { ticketId: load.id, pumpTicketId: null, reason: `Load ${load.number}: ${why}.` };
}

/** The last load of every order of several loads. */
function findBalanceLoads(tickets: readonly TicketFacts[]): ReadonlySet<string> {
  const byOrder = new Map<string, TicketFacts[]>();
  for (const load of tickets) {
    if (load.orderId) byOrder.set(load.orderId, [...(byOrder.get(load.orderId) ?? []), load]);
  }
  const last = new Set<string>();
  for (const loads of byOrder.values()) {
    if (loads.length < 2) continue;
    const inOrder = [...loads].sort(
      (a, b) =>
        a.date.localeCompare(b.date) ||
        (a.loadNumber ?? 0) - (b.loadNumber ?? 0) ||
        (a.batchedAt ?? 0) - (b.batchedAt ?? 0) ||
        (a.id < b.id ? -1 : 1),
    );
    const final = inOrder.at(-1);
    if (final) last.add(final.id);
  }
  return last;
}

/** A sheet's clauses for one load: of its mix prices only the one for the load's mix. */
function clausesFor(sheet: RateSheetFacts, load: TicketFacts): IdentifiedClause[] {
  const mixes = sheet.clauses.filter((one) => one.clause.kind === 'mixPrice');
  const code = (one: IdentifiedClause) => (one.clause as ClauseOf<'mixPrice'>).mixCode;
  const fitting =
    mixes.find((one) => code(one)?.toUpperCase() === load.mixCode.toUpperCase()) ??
    mixes.find((one) => code(one) === null);
  return sheet.clauses.filter((one) => one.clause.kind !== 'mixPrice' || one === fitting);
}

function lineOf(
  charge: Charge,
  one: IdentifiedClause,
  sheet: RateSheetFacts,
  delivery: TicketFacts | PumpTicketFacts,
  ids: { ticketIds?: string[]; pumpTicketIds?: string[] },
): ExpectedLine {
  return {
    ...charge,
    key: `${one.id}:${delivery.id}`,
    chargeKind: moduleOf(one.clause as ClauseOf<ClauseKind>).chargeKind,
    clauseId: one.id,
    rateSheetId: sheet.id,
    supplierId: delivery.supplierId,
    date: delivery.date,
    ticketIds: ids.ticketIds ?? [],
    pumpTicketIds: ids.pumpTicketIds ?? [],
    orderId: delivery.orderId,
    jobId: delivery.jobId,
  };
}

/** The tax clause of a sheet, where it has one. */
export function taxClauseOf(
  sheet: RateSheetFacts,
): { id: string; clause: Extract<Clause, { kind: 'tax' }> } | null {
  for (const one of sheet.clauses) {
    if (one.clause.kind === 'tax') return { id: one.id, clause: one.clause };
  }
  return null;
}

const TAXED_AS = {
  mix: 'mixPrice',
  shortLoad: 'shortLoad',
  waiting: 'waiting',
  perLoadFee: 'perLoadFee',
  perYardFee: 'perYardFee',
  pumpTime: 'pumpTime',
  pumpMinimum: 'pumpTime',
  pumpYards: 'pumpYards',
  pumpSetUp: 'pumpSetUp',
  tax: null,
  other: null,
} as const;

/** Whether `clause` taxes lines of this kind. */
export function isTaxed(
  clause: Extract<Clause, { kind: 'tax' }>,
  chargeKind: keyof typeof TAXED_AS,
): boolean {
  const kind = TAXED_AS[chargeKind];
  return kind !== null && clause.taxes.includes(kind);
}

/** One tax line an order (or supplier and day), rounded once on its sum. */
function taxLines(input: RatingInput, lines: readonly ExpectedLine[]): ExpectedLine[] {
  const sheets = new Map(input.rateSheets.map((sheet) => [sheet.id, sheet]));
  const exempt = new Set(input.orders.filter((order) => !order.taxable).map((order) => order.id));
  const groups = new Map<string, ExpectedLine[]>();
  for (const line of lines) {
    if (line.orderId && exempt.has(line.orderId)) continue;
    const key = `${line.rateSheetId}:${line.orderId ?? `${line.supplierId}:${line.date}`}`;
    groups.set(key, [...(groups.get(key) ?? []), line]);
  }
  return [...groups].flatMap(([key, group]): ExpectedLine[] => {
    const [first] = group;
    const sheet = first ? sheets.get(first.rateSheetId) : undefined;
    const tax = sheet ? taxClauseOf(sheet) : null;
    if (!first || !tax) return [];
    const taxed = group.flatMap((line) =>
      line.status === 'owed' && isTaxed(tax.clause, line.chargeKind) ? [line.amount] : [],
    );
    if (taxed.length === 0) return [];
    const base = sumMoney(taxed);
    const amount = roundCents(base.times(tax.clause.ratePercent).div(100));
    const sum = `${dollars(base)} × ${new Decimal(tax.clause.ratePercent).toString()} %`;
    return [
      {
        status: 'owed',
        key: `${tax.id}:${key}`,
        chargeKind: 'tax',
        clauseId: tax.id,
        rateSheetId: first.rateSheetId,
        supplierId: first.supplierId,
        label: 'Sales tax',
        date: first.date,
        ticketIds: [...new Set(group.flatMap((line) => line.ticketIds))],
        pumpTicketIds: [...new Set(group.flatMap((line) => line.pumpTicketIds))],
        orderId: first.orderId,
        jobId: first.jobId,
        quantity: count(1),
        unit: 'order',
        rate: money(amount),
        amount,
        explanation: {
          sentence: `Sales tax on ${dollars(base)} taxable: ${sum} = ${dollars(amount)}.`,
          steps: [
            { label: 'Taxable', value: dollars(base) },
            { label: sum, value: dollars(amount) },
          ],
        },
      },
    ];
  });
}
