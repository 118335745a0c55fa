import { and, asc, eq, inArray, ne, sql } from 'drizzle-orm';
import { jobs, placements } from '../schema/jobs';
import { tickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { inCrew } from './crew';

const HEAD = {
  id: placements.id,
  name: placements.name,
  element: placements.element,
  pourDate: placements.pourDate,
  firstTruckAt: placements.firstTruckAt,
  status: placements.status,
  jobId: placements.jobId,
  jobNumber: jobs.number,
  jobName: jobs.name,
  address: jobs.address,
  figuredYd3: placements.figuredYd3,
  notes: placements.notes,
};

/** A day's placements, in the order in which their first trucks come. */
export async function placementsOn(scope: Scope, day: string, crewMemberId: string | null) {
  return scope.handle
    .select(HEAD)
    .from(placements)
    .innerJoin(jobs, and(eq(jobs.companyId, placements.companyId), eq(jobs.id, placements.jobId)))
    .where(
      and(
        eq(placements.companyId, scope.companyId),
        eq(placements.pourDate, day),
        ne(placements.status, 'cancelled'),
        inCrew(scope, placements.jobId, crewMemberId),
      ),
    )
    .orderBy(
      sql`coalesce(${placements.firstTruckAt}, 9999)`,
      asc(jobs.number),
      asc(placements.name),
      asc(placements.id),
    );
}

export async function placementHead(
  scope: Scope,
  placementId: string,
  crewMemberId: string | null,
) {
  const [row] = await scope.handle
    .select(HEAD)
    .from(placements)
    .innerJoin(jobs, and(eq(jobs.companyId, placements.companyId), eq(jobs.id, placements.jobId)))
    .where(
      and(
        eq(placements.companyId, scope.companyId),
        eq(placements.id, placementId),
        inCrew(scope, placements.jobId, crewMemberId),
      ),
    );
  return row ?? null;
}

/** The nearest days before and after `day` on which the person has a pour. */
export async function neighbouringDays(
  scope: Scope,
  day: string,
  crewMemberId: string | null,
): Promise<{ before: string | null; after: string | null }> {
  const [row] = await scope.handle
    .select({
      before: sql<string | null>`max(${placements.pourDate})
        filter (where ${placements.pourDate} < ${day}::date)::text`,
      after: sql<string | null>`min(${placements.pourDate})
        filter (where ${placements.pourDate} > ${day}::date)::text`,
    })
    .from(placements)
    .where(
      and(
        eq(placements.companyId, scope.companyId),
        ne(placements.status, 'cancelled'),
        inCrew(scope, placements.jobId, crewMemberId),
      ),
    );
  return { before: row?.before ?? null, after: row?.after ?? null };
}

/** Yards and loads of confirmed tickets by placement, what went back taken off. */
export async function deliveredTo(
  scope: Scope,
  placementIds: string[],
): Promise<Map<string, { inYd3: string; loadsIn: number }>> {
  if (placementIds.length === 0) return new Map();
  const rows = await scope.handle
    .select({
      placementId: tickets.placementId,
      inYd3: sql<string>`sum(${tickets.quantityYd3} - coalesce(${tickets.returnedYd3}, 0))::text`,
      loadsIn: sql<string>`count(*)::text`,
    })
    .from(tickets)
    .where(
      and(
        eq(tickets.companyId, scope.companyId),
        inArray(tickets.placementId, placementIds),
        eq(tickets.status, 'confirmed'),
      ),
    )
    .groupBy(tickets.placementId);
  return new Map(
    rows.flatMap(({ placementId, inYd3, loadsIn }) =>
      placementId ? [[placementId, { inYd3: inYd3 ?? '0.00', loadsIn: Number(loadsIn) }]] : [],
    ),
  );
}
