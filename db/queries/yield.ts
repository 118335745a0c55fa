import { and, asc, eq, gte, inArray, lte, or, type SQL, sql } from 'drizzle-orm';
import type { ChargeKind, PumpTicketFacts, TicketFacts } from '../../lib/domain/facts';
import { jobs, placements } from '../schema/jobs';
import { orderLines, orders } from '../schema/orders';
import { billLines, matches } from '../schema/statements';
import { suppliers } from '../schema/suppliers';
import { pumpTickets, tickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { pumpTicketFactsOf, ticketFactsOf } from './sheet-facts';
import { isWithSupplier } from './with-supplier';

export interface PouredPlacement {
  readonly id: string;
  readonly jobId: string;
  readonly jobNumber: string;
  readonly jobName: string;
  readonly name: string;
  readonly status: 'planned' | 'poured' | 'cancelled';
  readonly pourDate: string;
  readonly figuredYd3: string;
  readonly areaFt2: string | null;
  readonly thicknessIn: string | null;
}

/** Placements of those days that were not called off, in the order of their jobs and days. */
export async function placementsBetween(
  scope: Scope,
  filter: {
    readonly from?: string | undefined;
    readonly to?: string | undefined;
    readonly jobId?: string | undefined;
    readonly supplierId?: string | undefined;
  },
): Promise<PouredPlacement[]> {
  return scope.handle
    .select({
      id: placements.id,
      jobId: placements.jobId,
      jobNumber: jobs.number,
      jobName: jobs.name,
      name: placements.name,
      status: placements.status,
      pourDate: placements.pourDate,
      figuredYd3: placements.figuredYd3,
      areaFt2: placements.areaFt2,
      thicknessIn: placements.thicknessIn,
    })
    .from(placements)
    .innerJoin(jobs, and(eq(jobs.companyId, placements.companyId), eq(jobs.id, placements.jobId)))
    .where(
      and(
        eq(placements.companyId, scope.companyId),
        sql`${placements.status} <> 'cancelled'`,
        filter.from ? gte(placements.pourDate, filter.from) : undefined,
        filter.to ? lte(placements.pourDate, filter.to) : undefined,
        filter.jobId ? eq(placements.jobId, filter.jobId) : undefined,
        filter.supplierId ? deliveredBy(filter.supplierId) : undefined,
      ),
    )
    .orderBy(asc(jobs.number), asc(placements.pourDate), asc(placements.id));
}

/** Whether the supplier brought the placement concrete or a pump. */
function deliveredBy(supplierId: string): SQL {
  return sql`(exists (
      select 1 from ${tickets} load
      where load.company_id = ${placements.companyId} and load.placement_id = ${placements.id}
      and load.supplier_id = ${supplierId} and load.status = 'confirmed')
    or exists (
      select 1 from ${pumpTickets} pump
      where pump.company_id = ${placements.companyId} and pump.placement_id = ${placements.id}
      and pump.supplier_id = ${supplierId}))`;
}

type Placed<Facts> = { readonly placementId: string; readonly facts: Facts };

export async function placedTickets(
  scope: Scope,
  placementIds: readonly string[],
): Promise<Placed<TicketFacts>[]> {
  if (placementIds.length === 0) return [];
  const rows = await scope.handle
    .select({ ticket: tickets, jobName: jobs.name })
    .from(tickets)
    .innerJoin(jobs, and(eq(jobs.companyId, tickets.companyId), eq(jobs.id, tickets.jobId)))
    .where(
      and(
        eq(tickets.companyId, scope.companyId),
        eq(tickets.status, 'confirmed'),
        inArray(tickets.placementId, [...placementIds]),
      ),
    )
    .orderBy(asc(tickets.date), asc(tickets.number), asc(tickets.id));
  return rows.map(({ ticket, jobName }) => ({
    placementId: ticket.placementId ?? '',
    facts: ticketFactsOf(ticket, jobName),
  }));
}

export async function placedPumpTickets(
  scope: Scope,
  placementIds: readonly string[],
): Promise<Placed<PumpTicketFacts>[]> {
  if (placementIds.length === 0) return [];
  const rows = await scope.handle
    .select({ pump: pumpTickets, jobName: jobs.name })
    .from(pumpTickets)
    .innerJoin(jobs, and(eq(jobs.companyId, pumpTickets.companyId), eq(jobs.id, pumpTickets.jobId)))
    .where(
      and(
        eq(pumpTickets.companyId, scope.companyId),
        inArray(pumpTickets.placementId, [...placementIds]),
      ),
    )
    .orderBy(asc(pumpTickets.date), asc(pumpTickets.number), asc(pumpTickets.id));
  return rows.map(({ pump, jobName }) => ({
    placementId: pump.placementId ?? '',
    facts: pumpTicketFactsOf(pump, jobName),
  }));
}

/** Yards ordered for each placement, by orders that are with a supplier. */
export async function orderedYards(
  scope: Scope,
  placementIds: readonly string[],
): Promise<Map<string, string>> {
  if (placementIds.length === 0) return new Map();
  const rows = await scope.handle
    .select({
      placementId: orders.placementId,
      yards: sql<string>`sum(${orderLines.quantity})::numeric(14,2)::text`,
    })
    .from(orders)
    .innerJoin(
      orderLines,
      and(eq(orderLines.companyId, orders.companyId), eq(orderLines.orderId, orders.id)),
    )
    .where(
      and(
        eq(orders.companyId, scope.companyId),
        inArray(orders.placementId, [...placementIds]),
        eq(orderLines.unit, 'yd³'),
        isWithSupplier('orders'),
      ),
    )
    .groupBy(orders.placementId);
  return new Map(rows.map((row) => [row.placementId ?? '', row.yards]));
}

/** One billed charge with one of the deliveries that it stands on. */
export interface BilledTie {
  readonly lineId: string;
  readonly statementId: string;
  readonly invoiceId: string | null;
  readonly chargeKind: ChargeKind;
  readonly amount: string;
  readonly quantity: string | null;
  readonly deliveryId: string;
}

/** Every tie of a charge to a delivery, of the lines that stand on any of these placements. */
export async function billedTies(
  scope: Scope,
  placementIds: readonly string[],
): Promise<BilledTie[]> {
  if (placementIds.length === 0) return [];
  const placed = [...placementIds];
  const onThem = scope.handle
    .select({ lineId: matches.billLineId })
    .from(matches)
    .leftJoin(
      tickets,
      and(eq(tickets.companyId, matches.companyId), eq(tickets.id, matches.ticketId)),
    )
    .leftJoin(
      pumpTickets,
      and(eq(pumpTickets.companyId, matches.companyId), eq(pumpTickets.id, matches.pumpTicketId)),
    )
    .where(
      and(
        eq(matches.companyId, scope.companyId),
        or(inArray(tickets.placementId, placed), inArray(pumpTickets.placementId, placed)),
      ),
    );
  const rows = await scope.handle
    .select({
      lineId: billLines.id,
      statementId: billLines.statementId,
      invoiceId: billLines.invoiceId,
      chargeKind: billLines.chargeKind,
      amount: billLines.amount,
      quantity: billLines.quantity,
      ticketId: matches.ticketId,
      pumpTicketId: matches.pumpTicketId,
    })
    .from(billLines)
    .innerJoin(
      matches,
      and(eq(matches.companyId, billLines.companyId), eq(matches.billLineId, billLines.id)),
    )
    .where(
      and(
        eq(billLines.companyId, scope.companyId),
        eq(billLines.lineKind, 'charge'),
        inArray(billLines.id, onThem),
      ),
    )
    .orderBy(asc(billLines.id), asc(matches.id));
  return rows.flatMap(({ ticketId, pumpTicketId, ...row }) => {
    const deliveryId = ticketId ?? pumpTicketId;
    return deliveryId ? [{ ...row, deliveryId }] : [];
  });
}

/** What each invoice bills in charges and in tax. */
export async function invoiceSums(
  scope: Scope,
  invoiceIds: readonly string[],
): Promise<Map<string, { readonly charges: string; readonly tax: string }>> {
  if (invoiceIds.length === 0) return new Map();
  const sumOf = (kind: 'charge' | 'tax') =>
    sql<string>`coalesce(sum(${billLines.amount}) filter (where ${billLines.lineKind} = ${kind}), 0)::numeric(14,2)::text`;
  const rows = await scope.handle
    .select({ invoiceId: billLines.invoiceId, charges: sumOf('charge'), tax: sumOf('tax') })
    .from(billLines)
    .where(
      and(eq(billLines.companyId, scope.companyId), inArray(billLines.invoiceId, [...invoiceIds])),
    )
    .groupBy(billLines.invoiceId);
  return new Map(rows.map(({ invoiceId, charges, tax }) => [invoiceId ?? '', { charges, tax }]));
}

export async function jobChoices(
  scope: Scope,
): Promise<{ id: string; number: string; name: string }[]> {
  return scope.handle
    .select({ id: jobs.id, number: jobs.number, name: jobs.name })
    .from(jobs)
    .where(eq(jobs.companyId, scope.companyId))
    .orderBy(asc(jobs.number));
}

export async function supplierChoices(scope: Scope): Promise<{ id: string; name: string }[]> {
  return scope.handle
    .select({ id: suppliers.id, name: suppliers.name })
    .from(suppliers)
    .where(
      and(eq(suppliers.companyId, scope.companyId), inArray(suppliers.kind, ['readyMix', 'pump'])),
    )
    .orderBy(asc(suppliers.name));
}
