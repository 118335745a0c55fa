import { and, eq, getTableColumns, ne, sql } from 'drizzle-orm';
import { jobs, placements } from '../schema/jobs';
import { orders } from '../schema/orders';
import { people } from '../schema/people';
import { suppliers } from '../schema/suppliers';
import { tickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { inCrew } from './crew';

export type StoredTicket = typeof tickets.$inferSelect;
export type TicketValues = Omit<
  typeof tickets.$inferInsert,
  'id' | 'companyId' | 'createdAt' | 'clientId' | 'version'
>;

export interface FoundTicket extends StoredTicket {
  readonly supplierName: string | null;
  readonly jobNumber: string;
  readonly jobName: string;
  readonly placementName: string | null;
  readonly orderNumber: string | null;
  readonly confirmedByName: string | null;
}

/** One ticket with the names of what it is tied to; null when it is missing or not theirs. */
export async function findTicket(
  scope: Scope,
  ticketId: string,
  crewMemberId: string | null,
): Promise<FoundTicket | null> {
  const [row] = await scope.handle
    .select({
      ...getTableColumns(tickets),
      supplierName: suppliers.name,
      jobNumber: jobs.number,
      jobName: jobs.name,
      placementName: placements.name,
      orderNumber: orders.number,
      confirmedByName: people.name,
    })
    .from(tickets)
    .innerJoin(jobs, and(eq(jobs.companyId, tickets.companyId), eq(jobs.id, tickets.jobId)))
    .leftJoin(
      suppliers,
      and(eq(suppliers.companyId, tickets.companyId), eq(suppliers.id, tickets.supplierId)),
    )
    .leftJoin(
      placements,
      and(eq(placements.companyId, tickets.companyId), eq(placements.id, tickets.placementId)),
    )
    .leftJoin(orders, and(eq(orders.companyId, tickets.companyId), eq(orders.id, tickets.orderId)))
    .leftJoin(
      people,
      and(eq(people.companyId, tickets.companyId), eq(people.id, tickets.confirmedBy)),
    )
    .where(
      and(
        eq(tickets.companyId, scope.companyId),
        eq(tickets.id, ticketId),
        inCrew(scope, tickets.jobId, crewMemberId),
      ),
    );
  return row ?? null;
}

/** The ticket that a device began under its own id, whoever asks. */
export async function findTicketByClient(
  scope: Scope,
  clientId: string,
): Promise<StoredTicket | null> {
  const [row] = await scope.handle
    .select()
    .from(tickets)
    .where(and(eq(tickets.companyId, scope.companyId), eq(tickets.clientId, clientId)));
  return row ?? null;
}

/** Adds a ticket; false when one with the same client id is there already. */
export async function insertTicket(
  scope: Scope,
  id: string,
  clientId: string,
  values: TicketValues,
): Promise<boolean> {
  const added = await scope.handle
    .insert(tickets)
    .values({ ...values, id, clientId, companyId: scope.companyId })
    .onConflictDoNothing({ target: [tickets.companyId, tickets.clientId] })
    .returning({ id: tickets.id });
  return added.length === 1;
}

/** Changes a ticket that still is at `version`; false when somebody changed it meanwhile. */
export async function updateTicket(
  scope: Scope,
  ticketId: string,
  version: number,
  values: Partial<TicketValues>,
): Promise<boolean> {
  const changed = await scope.handle
    .update(tickets)
    .set({ ...values, version: version + 1 })
    .where(
      and(
        eq(tickets.companyId, scope.companyId),
        eq(tickets.id, ticketId),
        eq(tickets.version, version),
      ),
    )
    .returning({ id: tickets.id });
  return changed.length === 1;
}

/**
 * Holds a supplier's ticket numbers until the transaction ends, so that two people who confirm
 * the same number at once do not both find it free. Null when there is no such supplier.
 */
export async function holdTicketNumbers(
  scope: Scope,
  supplierId: string,
): Promise<{ name: string; kind: 'readyMix' | 'pump' | 'material' } | null> {
  const [held] = await scope.handle
    .select({ name: suppliers.name, kind: suppliers.kind })
    .from(suppliers)
    .where(and(eq(suppliers.companyId, scope.companyId), eq(suppliers.id, supplierId)))
    .for('no key update');
  return held ?? null;
}

/** The supplier's ticket of that number which counts (not a rejected one), other than `exceptId`. */
export async function findTicketByNumber(
  scope: Scope,
  supplierId: string,
  number: string,
  exceptId: string | null,
): Promise<StoredTicket | null> {
  const [row] = await scope.handle
    .select()
    .from(tickets)
    .where(
      and(
        eq(tickets.companyId, scope.companyId),
        eq(tickets.supplierId, supplierId),
        sql`upper(${tickets.number}) = upper(${number})`,
        ne(tickets.status, 'rejected'),
        exceptId === null ? undefined : ne(tickets.id, exceptId),
      ),
    )
    .orderBy(tickets.createdAt, tickets.id)
    .limit(1);
  return row ?? null;
}
