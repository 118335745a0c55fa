import { and, asc, count, desc, eq, gte, ilike, lte, or, type SQL, sql } from 'drizzle-orm';
import type { OrderFilters, OrderLine, OrderRow } from '../../lib/contracts/orders';
import { newId } from '../../lib/ids';
import { jobs, placements } from '../schema/jobs';
import { orderLines, orders, orderVersions } from '../schema/orders';
import { suppliers } from '../schema/suppliers';
import { tickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { inCrew } from './crew';
import { containing } from './jobs';

const orderedYards = sql<string | null>`(select sum(l.quantity)::numeric(14,2)::text
  from ${orderLines} l where l.company_id = ${orders.companyId} and l.order_id = ${orders.id}
  and l.unit = 'yd³')`;
const deliveredYards = sql<string>`(select coalesce(sum(t.quantity_yd3), 0)::numeric(14,2)::text
  from ${tickets} t where t.company_id = ${orders.companyId} and t.order_id = ${orders.id}
  and t.status <> 'rejected')`;
const loads = sql<number>`(select count(*)::int from ${tickets} t
  where t.company_id = ${orders.companyId} and t.order_id = ${orders.id}
  and t.status <> 'rejected')`;

const ROW = {
  id: orders.id,
  number: orders.number,
  status: orders.status,
  version: orders.version,
  supplierId: orders.supplierId,
  supplierName: suppliers.name,
  jobId: orders.jobId,
  jobNumber: jobs.number,
  jobName: jobs.name,
  placementId: orders.placementId,
  placementName: placements.name,
  pourDate: orders.pourDate,
  firstTruckAt: orders.firstTruckAt,
  spacingMinutes: orders.spacingMinutes,
  notes: orders.notes,
  supplierReference: orders.supplierReference,
  orderedYd3: orderedYards,
  deliveredYd3: deliveredYards,
  loads,
};

const ofSupplier = and(
  eq(suppliers.companyId, orders.companyId),
  eq(suppliers.id, orders.supplierId),
);
const ofJob = and(eq(jobs.companyId, orders.companyId), eq(jobs.id, orders.jobId));
const ofPlacement = and(
  eq(placements.companyId, orders.companyId),
  eq(placements.id, orders.placementId),
);

function matching(
  scope: Scope,
  filter: OrderFilters,
  crewMemberId: string | null,
): SQL | undefined {
  const pattern = containing(filter.search);
  return and(
    eq(orders.companyId, scope.companyId),
    inCrew(scope, orders.jobId, crewMemberId),
    filter.status === 'all' ? undefined : eq(orders.status, filter.status),
    filter.supplierId ? eq(orders.supplierId, filter.supplierId) : undefined,
    filter.jobId ? eq(orders.jobId, filter.jobId) : undefined,
    filter.placementId ? eq(orders.placementId, filter.placementId) : undefined,
    filter.from ? gte(orders.pourDate, filter.from) : undefined,
    filter.to ? lte(orders.pourDate, filter.to) : undefined,
    filter.search
      ? or(
          ilike(orders.number, pattern),
          ilike(orders.supplierReference, pattern),
          ilike(jobs.name, pattern),
        )
      : undefined,
  );
}

const SORTS = {
  day: orders.pourDate,
  number: orders.number,
  supplier: suppliers.name,
  job: jobs.number,
  status: orders.status,
} as const;

/** One page of orders. `limit` null means all of them. */
export async function listOrders(
  scope: Scope,
  filter: OrderFilters,
  crewMemberId: string | null,
  page: { offset: number; limit: number | null },
): Promise<{ rows: OrderRow[]; total: number }> {
  const where = matching(scope, filter, crewMemberId);
  const [counted] = await scope.handle
    .select({ total: count() })
    .from(orders)
    .innerJoin(jobs, ofJob)
    .where(where);
  const way = filter.direction === 'up' ? asc : desc;
  const found = scope.handle
    .select(ROW)
    .from(orders)
    .innerJoin(suppliers, ofSupplier)
    .innerJoin(jobs, ofJob)
    .leftJoin(placements, ofPlacement)
    .where(where)
    .orderBy(way(SORTS[filter.sort]), desc(orders.pourDate), asc(orders.number), asc(orders.id))
    .offset(page.offset);
  const rows = await (page.limit === null ? found : found.limit(page.limit));
  return { rows, total: counted?.total ?? 0 };
}

export interface StoredOrder extends OrderRow {
  readonly jobAddress: string;
  readonly dispatchEmail: string;
  readonly sentAt: Date | null;
  readonly confirmedAt: Date | null;
  readonly cancelledAt: Date | null;
}

/** An order; locked until the transaction ends when `forChange`. */
export async function findOrder(
  scope: Scope,
  orderId: string,
  crewMemberId: string | null,
  forChange = false,
): Promise<StoredOrder | null> {
  const own = and(eq(orders.companyId, scope.companyId), eq(orders.id, orderId));
  if (forChange) await scope.handle.select({ id: orders.id }).from(orders).where(own).for('update');
  const [row] = await scope.handle
    .select({
      ...ROW,
      jobAddress: jobs.address,
      dispatchEmail: suppliers.dispatchEmail,
      sentAt: orders.sentAt,
      confirmedAt: orders.confirmedAt,
      cancelledAt: orders.cancelledAt,
    })
    .from(orders)
    .innerJoin(suppliers, ofSupplier)
    .innerJoin(jobs, ofJob)
    .leftJoin(placements, ofPlacement)
    .where(and(own, inCrew(scope, orders.jobId, crewMemberId)));
  return row ?? null;
}

export async function orderLinesOf(
  scope: Scope,
  orderId: string,
): Promise<{ code: string; description: string; quantity: string; unit: string }[]> {
  return scope.handle
    .select({
      code: orderLines.code,
      description: orderLines.description,
      quantity: orderLines.quantity,
      unit: orderLines.unit,
    })
    .from(orderLines)
    .where(and(eq(orderLines.companyId, scope.companyId), eq(orderLines.orderId, orderId)))
    .orderBy(asc(orderLines.position));
}

export async function orderVersionsOf(
  scope: Scope,
  orderId: string,
): Promise<{ version: number; snapshot: unknown; createdAt: Date }[]> {
  return scope.handle
    .select({
      version: orderVersions.version,
      snapshot: orderVersions.snapshot,
      createdAt: orderVersions.createdAt,
    })
    .from(orderVersions)
    .where(and(eq(orderVersions.companyId, scope.companyId), eq(orderVersions.orderId, orderId)))
    .orderBy(desc(orderVersions.version));
}

export async function orderNumbers(scope: Scope): Promise<string[]> {
  const rows = await scope.handle
    .select({ number: orders.number })
    .from(orders)
    .where(eq(orders.companyId, scope.companyId));
  return rows.map((row) => row.number);
}

export type NewOrder = Omit<typeof orders.$inferInsert, 'companyId' | 'createdAt'>;

/** Adds the order; false where its number or its id is there already. */
export async function insertOrder(scope: Scope, values: NewOrder): Promise<boolean> {
  const added = await scope.handle
    .insert(orders)
    .values({ ...values, companyId: scope.companyId })
    .onConflictDoNothing()
    .returning({ id: orders.id });
  return added.length === 1;
}

export async function updateOrderRow(
  scope: Scope,
  orderId: string,
  values: Partial<NewOrder>,
): Promise<void> {
  await scope.handle
    .update(orders)
    .set(values)
    .where(and(eq(orders.companyId, scope.companyId), eq(orders.id, orderId)));
}

export async function setOrderLines(
  scope: Scope,
  orderId: string,
  lines: readonly OrderLine[],
): Promise<void> {
  await scope.handle
    .delete(orderLines)
    .where(and(eq(orderLines.companyId, scope.companyId), eq(orderLines.orderId, orderId)));
  await scope.handle.insert(orderLines).values(
    lines.map((line, position) => ({
      ...line,
      companyId: scope.companyId,
      id: newId<'orderLine'>(),
      orderId,
      position,
    })),
  );
}

/** Keeps what was sent; the same version again is the same sending. */
export async function keepOrderVersion(
  scope: Scope,
  orderId: string,
  version: number,
  snapshot: unknown,
): Promise<void> {
  await scope.handle
    .insert(orderVersions)
    .values({ companyId: scope.companyId, id: newId<'orderVersion'>(), orderId, version, snapshot })
    .onConflictDoNothing();
}

/** Whether the supplier, job and placement of an order are the company's own and fit together. */
export async function orderTiesHold(
  scope: Scope,
  ties: {
    readonly supplierId: string;
    readonly jobId: string;
    readonly placementId: string | null;
  },
  crewMemberId: string | null,
): Promise<boolean> {
  const [supplier] = await scope.handle
    .select({ id: suppliers.id })
    .from(suppliers)
    .where(and(eq(suppliers.companyId, scope.companyId), eq(suppliers.id, ties.supplierId)));
  const [job] = await scope.handle
    .select({ id: jobs.id })
    .from(jobs)
    .where(
      and(
        eq(jobs.companyId, scope.companyId),
        eq(jobs.id, ties.jobId),
        inCrew(scope, jobs.id, crewMemberId),
      ),
    );
  if (!supplier || !job) return false;
  if (ties.placementId === null) return true;
  const [placement] = await scope.handle
    .select({ id: placements.id })
    .from(placements)
    .where(
      and(
        eq(placements.companyId, scope.companyId),
        eq(placements.id, ties.placementId),
        eq(placements.jobId, ties.jobId),
      ),
    );
  return placement !== undefined;
}
