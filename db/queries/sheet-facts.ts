import { and, asc, eq, gte, inArray, isNull, lte, or, sql } from 'drizzle-orm';
import type {
  BillLineFacts,
  OrderFacts,
  PumpTicketFacts,
  TicketFacts,
} from '../../lib/domain/facts';
import { money, quantity, sumQuantity } from '../../lib/domain/money/money';
import type { RateSheetFacts } from '../../lib/domain/rating/clauses';
import type { EarlierLine } from '../../lib/domain/variance/line-case';
import { jobs } from '../schema/jobs';
import { orderLines, orders } from '../schema/orders';
import { billLines, invoices, matches, statements } from '../schema/statements';
import { rateClauses, rateSheets } from '../schema/suppliers';
import { pumpTickets, tickets } from '../schema/tickets';
import type { Scope } from '../tx';

/** A supplier's deliveries and orders of some days: what a bill is held against. */
export interface SupplierWindow {
  readonly supplierId: string;
  /** Both days count. */
  readonly from: string;
  readonly to: string;
}

const orNull = (text: string | null) => (text === null ? null : quantity(text));

/** The supplier's checked tickets; what nobody has checked proves nothing. */
export async function ticketFacts(scope: Scope, window: SupplierWindow): Promise<TicketFacts[]> {
  const rows = await scope.handle
    .select({ ticket: tickets, jobName: jobs.name })
    .from(tickets)
    .innerJoin(jobs, and(eq(jobs.companyId, tickets.companyId), eq(jobs.id, tickets.jobId)))
    .where(
      and(
        eq(tickets.companyId, scope.companyId),
        eq(tickets.supplierId, window.supplierId),
        eq(tickets.status, 'confirmed'),
        gte(tickets.date, window.from),
        lte(tickets.date, window.to),
      ),
    );
  return rows.map(({ ticket, jobName }) => ticketFactsOf(ticket, jobName));
}

/** A stored load as the core takes it. */
export function ticketFactsOf(
  ticket: typeof tickets.$inferSelect,
  jobName: string | null,
): TicketFacts {
  return {
    id: ticket.id,
    number: ticket.number,
    supplierId: ticket.supplierId ?? '',
    orderId: ticket.orderId,
    jobId: ticket.jobId,
    jobName,
    date: ticket.date,
    plant: ticket.plant,
    truck: ticket.truck,
    loadNumber: ticket.loadNumber,
    mixCode: ticket.mixCode,
    quantityYd3: quantity(ticket.quantityYd3 ?? '0'),
    returnedYd3: orNull(ticket.returnedYd3),
    batchedAt: ticket.batchedAt,
    arrivedAt: ticket.arrivedAt,
    startedAt: ticket.startedAt,
    finishedAt: ticket.finishedAt,
    leftAt: ticket.leftAt,
  };
}

export async function pumpTicketFacts(
  scope: Scope,
  window: SupplierWindow,
): Promise<PumpTicketFacts[]> {
  const rows = await scope.handle
    .select({ pump: pumpTickets, jobName: jobs.name })
    .from(pumpTickets)
    .innerJoin(jobs, and(eq(jobs.companyId, pumpTickets.companyId), eq(jobs.id, pumpTickets.jobId)))
    .where(
      and(
        eq(pumpTickets.companyId, scope.companyId),
        eq(pumpTickets.supplierId, window.supplierId),
        gte(pumpTickets.date, window.from),
        lte(pumpTickets.date, window.to),
      ),
    );
  return rows.map(({ pump, jobName }) => pumpTicketFactsOf(pump, jobName));
}

/** A stored day of a pump as the core takes it. */
export function pumpTicketFactsOf(
  pump: typeof pumpTickets.$inferSelect,
  jobName: string | null,
): PumpTicketFacts {
  return {
    id: pump.id,
    number: pump.number,
    supplierId: pump.supplierId,
    orderId: pump.orderId,
    jobId: pump.jobId,
    jobName,
    date: pump.date,
    leftYardAt: pump.leftYardAt,
    arrivedAt: pump.arrivedAt,
    finishedAt: pump.finishedAt,
    leftAt: pump.leftAt,
    backInYardAt: pump.backInYardAt,
    pumpedYd3: quantity(pump.pumpedYd3),
    setUps: pump.setUps,
  };
}

/** How many of the supplier's tickets of these days still wait to be checked. */
export async function countUnchecked(scope: Scope, window: SupplierWindow): Promise<number> {
  const [row] = await scope.handle
    .select({ total: sql<number>`count(*)::int` })
    .from(tickets)
    .where(
      and(
        eq(tickets.companyId, scope.companyId),
        or(eq(tickets.supplierId, window.supplierId), isNull(tickets.supplierId)),
        eq(tickets.status, 'toCheck'),
        gte(tickets.date, window.from),
        lte(tickets.date, window.to),
      ),
    );
  return row?.total ?? 0;
}

export async function orderFacts(scope: Scope, orderIds: readonly string[]): Promise<OrderFacts[]> {
  if (orderIds.length === 0) return [];
  const rows = await scope.handle
    .select({ order: orders, jobName: jobs.name, taxable: jobs.taxable })
    .from(orders)
    .innerJoin(jobs, and(eq(jobs.companyId, orders.companyId), eq(jobs.id, orders.jobId)))
    .where(and(eq(orders.companyId, scope.companyId), inArray(orders.id, [...orderIds])));
  const lines = await scope.handle
    .select()
    .from(orderLines)
    .where(
      and(eq(orderLines.companyId, scope.companyId), inArray(orderLines.orderId, [...orderIds])),
    )
    .orderBy(asc(orderLines.orderId), asc(orderLines.position));
  return rows.map(({ order, jobName, taxable }) => {
    const own = lines.filter((line) => line.orderId === order.id);
    const yards = own.filter((line) => line.unit === 'yd³');
    return {
      id: order.id,
      number: order.number,
      supplierId: order.supplierId,
      jobId: order.jobId,
      jobName,
      date: order.pourDate,
      mixCode: own[0]?.code ?? null,
      orderedYd3: sumQuantity(yards.map((line) => quantity(line.quantity))),
      firstTruckAt: order.firstTruckAt,
      spacingMinutes: order.spacingMinutes,
      taxable,
    };
  });
}

/**
 * Every approved sheet of a supplier, or of all (null), whatever its days: rating picks by each
 * delivery's own day.
 */
export async function rateSheetFacts(
  scope: Scope,
  supplierId: string | null,
): Promise<RateSheetFacts[]> {
  const sheets = await scope.handle
    .select()
    .from(rateSheets)
    .where(
      and(
        eq(rateSheets.companyId, scope.companyId),
        supplierId === null ? undefined : eq(rateSheets.supplierId, supplierId),
        eq(rateSheets.status, 'approved'),
      ),
    );
  if (sheets.length === 0) return [];
  const clauses = await scope.handle
    .select()
    .from(rateClauses)
    .where(
      and(
        eq(rateClauses.companyId, scope.companyId),
        inArray(
          rateClauses.rateSheetId,
          sheets.map((sheet) => sheet.id),
        ),
      ),
    )
    .orderBy(asc(rateClauses.position));
  return sheets.map((sheet) => ({
    id: sheet.id,
    supplierId: sheet.supplierId,
    jobId: sheet.jobId,
    name: sheet.name,
    version: sheet.version,
    effectiveFrom: sheet.effectiveFrom,
    effectiveTo: sheet.effectiveTo,
    clauses: clauses
      .filter((row) => row.rateSheetId === sheet.id)
      .map(({ id, clause }) => ({ id, clause })),
  }));
}

type BillLineRecord = typeof billLines.$inferSelect;

/** A statement's line as stored, with its invoice's number. */
export type StoredBillLine = BillLineRecord & { readonly invoiceNumber: string | null };

export async function billLinesOf(scope: Scope, statementId: string): Promise<StoredBillLine[]> {
  const rows = await scope.handle
    .select({ line: billLines, invoiceNumber: invoices.number })
    .from(billLines)
    .leftJoin(
      invoices,
      and(eq(invoices.companyId, billLines.companyId), eq(invoices.id, billLines.invoiceId)),
    )
    .where(and(eq(billLines.companyId, scope.companyId), eq(billLines.statementId, statementId)))
    .orderBy(asc(billLines.position));
  return rows.map(({ line, invoiceNumber }) => ({ ...line, invoiceNumber }));
}

/** A stored charge or tax line as the engine takes it. */
export function billLineFacts(line: StoredBillLine): BillLineFacts {
  return {
    id: line.id,
    supplierId: line.supplierId,
    position: line.position,
    invoiceNumber: line.invoiceNumber,
    date: line.date,
    ticketNumber: line.ticketNumber,
    jobName: line.jobName,
    truck: line.truck,
    chargeKind: line.chargeKind,
    description: line.description,
    mixCode: line.mixCode,
    quantity: orNull(line.quantity),
    unit: line.unit,
    unitPrice: line.unitPrice === null ? null : money(line.unitPrice),
    amount: money(line.amount),
  };
}

/**
 * The charges of the supplier's earlier documents that stand on deliveries of these days: what
 * can be billed a second time. Earlier is by the period's end, then by when it was brought in.
 */
export async function earlierLines(
  scope: Scope,
  window: SupplierWindow,
  statementId: string,
): Promise<EarlierLine[]> {
  const rows = await scope.handle
    .select({
      line: billLines,
      invoiceNumber: invoices.number,
      ticketId: matches.ticketId,
      pumpTicketId: matches.pumpTicketId,
    })
    .from(billLines)
    .innerJoin(
      statements,
      and(eq(statements.companyId, billLines.companyId), eq(statements.id, billLines.statementId)),
    )
    .innerJoin(
      matches,
      and(eq(matches.companyId, billLines.companyId), eq(matches.billLineId, billLines.id)),
    )
    .leftJoin(
      tickets,
      and(eq(tickets.companyId, matches.companyId), eq(tickets.id, matches.ticketId)),
    )
    .leftJoin(
      pumpTickets,
      and(eq(pumpTickets.companyId, matches.companyId), eq(pumpTickets.id, matches.pumpTicketId)),
    )
    .leftJoin(
      invoices,
      and(eq(invoices.companyId, billLines.companyId), eq(invoices.id, billLines.invoiceId)),
    )
    .where(
      and(
        eq(billLines.companyId, scope.companyId),
        eq(billLines.supplierId, window.supplierId),
        eq(billLines.lineKind, 'charge'),
        sql`(${statements.periodEnd}, ${statements.createdAt}, ${statements.id}) < (
          select own.period_end, own.created_at, own.id from ${statements} own
          where own.company_id = ${scope.companyId} and own.id = ${statementId})`,
        gte(sql`coalesce(${tickets.date}, ${pumpTickets.date})`, window.from),
      ),
    )
    .orderBy(asc(statements.periodEnd), asc(statements.id), asc(billLines.position));
  const byLine = new Map<string, EarlierLine>();
  for (const { line, invoiceNumber, ticketId, pumpTicketId } of rows) {
    const before = byLine.get(line.id);
    byLine.set(line.id, {
      ...(before ?? billLineFacts({ ...line, invoiceNumber })),
      ticketIds: [...(before?.ticketIds ?? []), ...(ticketId ? [ticketId] : [])],
      pumpTicketIds: [...(before?.pumpTicketIds ?? []), ...(pumpTicketId ? [pumpTicketId] : [])],
    });
  }
  return [...byLine.values()];
}
