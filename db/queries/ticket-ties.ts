import { and, asc, desc, eq, inArray } from 'drizzle-orm';
import type { TicketChoices, TicketDetail } from '../../lib/contracts/tickets';
import { activity } from '../schema/activity';
import { jobs, placements } from '../schema/jobs';
import { orderLines, orders } from '../schema/orders';
import { billLines, invoices, matches, statements } from '../schema/statements';
import { suppliers } from '../schema/suppliers';
import type { Scope } from '../tx';
import { inCrew } from './crew';
import { isWithSupplier } from './with-supplier';

/** A form's or a filter's list is long enough at this; the newest come first. */
const MAX_CHOICES = 500;

export async function findPlacement(
  scope: Scope,
  placementId: string,
  crewMemberId: string | null,
): Promise<typeof placements.$inferSelect | null> {
  const [row] = await scope.handle
    .select()
    .from(placements)
    .where(
      and(
        eq(placements.companyId, scope.companyId),
        eq(placements.id, placementId),
        inCrew(scope, placements.jobId, crewMemberId),
      ),
    );
  return row ?? null;
}

export async function isJobOf(
  scope: Scope,
  jobId: string,
  crewMemberId: string | null,
): Promise<boolean> {
  const rows = await scope.handle
    .select({ id: jobs.id })
    .from(jobs)
    .where(
      and(
        eq(jobs.companyId, scope.companyId),
        eq(jobs.id, jobId),
        inCrew(scope, jobs.id, crewMemberId),
      ),
    );
  return rows.length === 1;
}

export async function findOrderTie(
  scope: Scope,
  orderId: string,
): Promise<{ jobId: string; supplierId: string } | null> {
  const [row] = await scope.handle
    .select({ jobId: orders.jobId, supplierId: orders.supplierId })
    .from(orders)
    .where(and(eq(orders.companyId, scope.companyId), eq(orders.id, orderId)));
  return row ?? null;
}

export interface PlacementOrder {
  readonly id: string;
  readonly number: string;
  readonly supplierId: string;
  readonly supplierName: string;
  readonly supplierKind: 'readyMix' | 'pump' | 'material';
  readonly supplierReference: string;
  readonly status: 'draft' | 'sent' | 'confirmed' | 'cancelled';
  readonly lines: { code: string; quantity: string; unit: string }[];
}

/** What was ordered for placements, by placement: orders that are with a supplier. */
export async function ordersOfPlacements(
  scope: Scope,
  placementIds: string[],
): Promise<Map<string, PlacementOrder[]>> {
  const byPlacement = new Map<string, PlacementOrder[]>();
  if (placementIds.length === 0) return byPlacement;
  const rows = await scope.handle
    .select({
      placementId: orders.placementId,
      id: orders.id,
      number: orders.number,
      supplierId: orders.supplierId,
      supplierName: suppliers.name,
      supplierKind: suppliers.kind,
      supplierReference: orders.supplierReference,
      status: orders.status,
      code: orderLines.code,
      quantity: orderLines.quantity,
      unit: orderLines.unit,
    })
    .from(orders)
    .innerJoin(
      suppliers,
      and(eq(suppliers.companyId, orders.companyId), eq(suppliers.id, orders.supplierId)),
    )
    .leftJoin(
      orderLines,
      and(eq(orderLines.companyId, orders.companyId), eq(orderLines.orderId, orders.id)),
    )
    .where(
      and(
        eq(orders.companyId, scope.companyId),
        inArray(orders.placementId, placementIds),
        isWithSupplier('orders'),
      ),
    )
    .orderBy(asc(orders.number), asc(orders.id), asc(orderLines.position));
  for (const { placementId, code, quantity, unit, ...order } of rows) {
    if (placementId === null) continue;
    const known = byPlacement.get(placementId) ?? [];
    byPlacement.set(placementId, known);
    let entry = known.find((one) => one.id === order.id);
    if (!entry) {
      entry = { ...order, lines: [] };
      known.push(entry);
    }
    if (code !== null && quantity !== null && unit !== null) {
      entry.lines.push({ code, quantity, unit });
    }
  }
  return byPlacement;
}

/** The company's suppliers by name, the archived ones left out. */
export async function supplierNames(scope: Scope): Promise<TicketChoices['suppliers']> {
  return scope.handle
    .select({ id: suppliers.id, name: suppliers.name, kind: suppliers.kind })
    .from(suppliers)
    .where(and(eq(suppliers.companyId, scope.companyId), eq(suppliers.archived, false)))
    .orderBy(asc(suppliers.name));
}

export async function ticketChoices(
  scope: Scope,
  crewMemberId: string | null,
  jobId: string | null,
): Promise<TicketChoices> {
  const jobRows = await scope.handle
    .select({ id: jobs.id, number: jobs.number, name: jobs.name })
    .from(jobs)
    .where(and(eq(jobs.companyId, scope.companyId), inCrew(scope, jobs.id, crewMemberId)))
    .orderBy(asc(jobs.number), asc(jobs.id))
    .limit(MAX_CHOICES);
  const placementRows = await scope.handle
    .select({
      id: placements.id,
      name: placements.name,
      jobId: placements.jobId,
      jobName: jobs.name,
      pourDate: placements.pourDate,
    })
    .from(placements)
    .innerJoin(jobs, and(eq(jobs.companyId, placements.companyId), eq(jobs.id, placements.jobId)))
    .where(
      and(
        eq(placements.companyId, scope.companyId),
        jobId === null ? undefined : eq(placements.jobId, jobId),
        inCrew(scope, placements.jobId, crewMemberId),
      ),
    )
    .orderBy(desc(placements.pourDate), asc(placements.name), asc(placements.id))
    .limit(MAX_CHOICES);
  const orderRows = await scope.handle
    .select({
      id: orders.id,
      number: orders.number,
      supplierId: orders.supplierId,
      jobId: orders.jobId,
      placementId: orders.placementId,
    })
    .from(orders)
    .where(
      and(
        eq(orders.companyId, scope.companyId),
        jobId === null ? undefined : eq(orders.jobId, jobId),
        inCrew(scope, orders.jobId, crewMemberId),
      ),
    )
    .orderBy(desc(orders.pourDate), asc(orders.number), asc(orders.id))
    .limit(MAX_CHOICES);
  return {
    suppliers: await supplierNames(scope),
    jobs: jobRows,
    placements: placementRows,
    orders: orderRows,
  };
}

/** The billed lines that a ticket was matched to. No amounts: who may see them looks there. */
export async function billedTicket(
  scope: Scope,
  ticketId: string,
): Promise<TicketDetail['billed']> {
  const rows = await scope.handle
    .select({
      statementId: statements.id,
      statementNumber: statements.number,
      invoiceNumber: invoices.number,
      position: billLines.position,
      status: statements.status,
    })
    .from(matches)
    .innerJoin(
      billLines,
      and(eq(billLines.companyId, matches.companyId), eq(billLines.id, matches.billLineId)),
    )
    .innerJoin(
      statements,
      and(eq(statements.companyId, billLines.companyId), eq(statements.id, billLines.statementId)),
    )
    .leftJoin(
      invoices,
      and(eq(invoices.companyId, billLines.companyId), eq(invoices.id, billLines.invoiceId)),
    )
    .where(and(eq(matches.companyId, scope.companyId), eq(matches.ticketId, ticketId)))
    .orderBy(asc(statements.periodEnd), asc(statements.id), asc(billLines.position));
  return rows.map(({ status, ...row }) => ({ ...row, closed: status === 'closed' }));
}

export interface TicketEvent {
  readonly id: string;
  readonly at: Date;
  readonly actorName: string;
  readonly summary: string;
  readonly before: unknown;
  readonly after: unknown;
}

/** What happened to a record, newest first. */
export async function eventsOf(
  scope: Scope,
  entity: string,
  entityId: string,
): Promise<TicketEvent[]> {
  return scope.handle
    .select({
      id: activity.id,
      at: activity.at,
      actorName: activity.actorName,
      summary: activity.summary,
      before: activity.before,
      after: activity.after,
    })
    .from(activity)
    .where(
      and(
        eq(activity.companyId, scope.companyId),
        eq(activity.entity, entity),
        eq(activity.entityId, entityId),
      ),
    )
    .orderBy(desc(activity.at), desc(activity.createdAt), desc(activity.id))
    .limit(200);
}
