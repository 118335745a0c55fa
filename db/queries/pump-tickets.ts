import { and, asc, count, desc, eq, gte, ilike, lte, or, type SQL, sql } from 'drizzle-orm';
import type { PumpTicketFilters, PumpTicketRow } from '../../lib/contracts/pump-tickets';
import { jobs, placements } from '../schema/jobs';
import { suppliers } from '../schema/suppliers';
import { pumpTickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { inCrew } from './crew';
import { containing } from './jobs';

export type FoundPumpTicket = Omit<PumpTicketRow, 'revision'>;
export type PumpTicketValues = Omit<
  typeof pumpTickets.$inferInsert,
  'id' | 'companyId' | 'createdAt'
>;

export interface PumpTicketListFilter extends PumpTicketFilters {
  /** Only tickets of jobs in this person's crew; null for all of the company's. */
  readonly crewMemberId: string | null;
}

export async function listPumpTickets(
  scope: Scope,
  filter: PumpTicketListFilter,
  page: { offset: number; limit: number },
): Promise<{ rows: FoundPumpTicket[]; total: number }> {
  const where = and(
    eq(pumpTickets.companyId, scope.companyId),
    inCrew(scope, pumpTickets.jobId, filter.crewMemberId),
    filter.supplierId ? eq(pumpTickets.supplierId, filter.supplierId) : undefined,
    filter.jobId ? eq(pumpTickets.jobId, filter.jobId) : undefined,
    filter.placementId ? eq(pumpTickets.placementId, filter.placementId) : undefined,
    filter.from ? gte(pumpTickets.date, filter.from) : undefined,
    filter.to ? lte(pumpTickets.date, filter.to) : undefined,
    filter.search ? ilike(pumpTickets.number, containing(filter.search)) : undefined,
  );
  const [counted] = await scope.handle.select({ total: count() }).from(pumpTickets).where(where);
  const rows = await rowsWhere(scope, where)
    .orderBy(desc(pumpTickets.date), asc(pumpTickets.number), asc(pumpTickets.id))
    .limit(page.limit)
    .offset(page.offset);
  return { rows, total: counted?.total ?? 0 };
}

export async function findPumpTicket(
  scope: Scope,
  pumpTicketId: string,
  crewMemberId: string | null,
): Promise<FoundPumpTicket | null> {
  const [row] = await rowsWhere(
    scope,
    and(
      eq(pumpTickets.companyId, scope.companyId),
      eq(pumpTickets.id, pumpTicketId),
      inCrew(scope, pumpTickets.jobId, crewMemberId),
    ),
  );
  return row ?? null;
}

/** The pump tickets of a placement, and those of its job on its day that name no placement. */
export async function pumpTicketsOfPlacement(
  scope: Scope,
  placement: { id: string; jobId: string; pourDate: string },
): Promise<FoundPumpTicket[]> {
  return rowsWhere(
    scope,
    and(
      eq(pumpTickets.companyId, scope.companyId),
      or(
        eq(pumpTickets.placementId, placement.id),
        and(
          sql`${pumpTickets.placementId} is null`,
          eq(pumpTickets.jobId, placement.jobId),
          eq(pumpTickets.date, placement.pourDate),
        ),
      ),
    ),
  ).orderBy(asc(pumpTickets.number), asc(pumpTickets.id));
}

function rowsWhere(scope: Scope, where: SQL | undefined) {
  return scope.handle
    .select({
      id: pumpTickets.id,
      number: pumpTickets.number,
      date: pumpTickets.date,
      supplierId: pumpTickets.supplierId,
      supplierName: suppliers.name,
      jobId: pumpTickets.jobId,
      jobNumber: jobs.number,
      jobName: jobs.name,
      placementId: pumpTickets.placementId,
      placementName: placements.name,
      orderId: pumpTickets.orderId,
      leftYardAt: pumpTickets.leftYardAt,
      arrivedAt: pumpTickets.arrivedAt,
      finishedAt: pumpTickets.finishedAt,
      leftAt: pumpTickets.leftAt,
      backInYardAt: pumpTickets.backInYardAt,
      pumpedYd3: pumpTickets.pumpedYd3,
      setUps: pumpTickets.setUps,
      notes: pumpTickets.notes,
    })
    .from(pumpTickets)
    .innerJoin(
      suppliers,
      and(eq(suppliers.companyId, pumpTickets.companyId), eq(suppliers.id, pumpTickets.supplierId)),
    )
    .innerJoin(jobs, and(eq(jobs.companyId, pumpTickets.companyId), eq(jobs.id, pumpTickets.jobId)))
    .leftJoin(
      placements,
      and(
        eq(placements.companyId, pumpTickets.companyId),
        eq(placements.id, pumpTickets.placementId),
      ),
    )
    .where(where)
    .$dynamic();
}

/** Holds a pump ticket for this transaction, so that two changes of it come one after the other. */
export async function holdPumpTicket(scope: Scope, pumpTicketId: string): Promise<void> {
  await scope.handle
    .select({ id: pumpTickets.id })
    .from(pumpTickets)
    .where(and(eq(pumpTickets.companyId, scope.companyId), eq(pumpTickets.id, pumpTicketId)))
    .for('update');
}

/** Adds a pump ticket; false when that id or the supplier's number is taken. */
export async function insertPumpTicket(
  scope: Scope,
  id: string,
  values: PumpTicketValues,
): Promise<boolean> {
  const added = await scope.handle
    .insert(pumpTickets)
    .values({ ...values, id, companyId: scope.companyId })
    .onConflictDoNothing()
    .returning({ id: pumpTickets.id });
  return added.length === 1;
}

export async function updatePumpTicket(
  scope: Scope,
  pumpTicketId: string,
  values: PumpTicketValues,
): Promise<void> {
  await scope.handle
    .update(pumpTickets)
    .set(values)
    .where(and(eq(pumpTickets.companyId, scope.companyId), eq(pumpTickets.id, pumpTicketId)));
}

/** Whether another pump ticket of the supplier has the number. */
export async function isPumpNumberTaken(
  scope: Scope,
  supplierId: string,
  number: string,
  exceptId: string | null,
): Promise<boolean> {
  const rows = await scope.handle
    .select({ id: pumpTickets.id })
    .from(pumpTickets)
    .where(
      and(
        eq(pumpTickets.companyId, scope.companyId),
        eq(pumpTickets.supplierId, supplierId),
        eq(pumpTickets.number, number),
      ),
    );
  return rows.some((row) => row.id !== exceptId);
}
