import { and, asc, count, desc, eq, type SQL, sql } from 'drizzle-orm';
import type { PlacementRow } from '../../lib/contracts/placements';
import { jobs, placements } from '../schema/jobs';
import { orderLines, orders } from '../schema/orders';
import { tickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { inCrew } from './crew';
import { isWithSupplier } from './with-supplier';

/** Yards on the placement's orders that are with a supplier; null where there are none. */
const orderedOfPlacement = sql<string | null>`(select sum(l.quantity)::numeric(14,2)::text
  from ${orders} o join ${orderLines} l on l.company_id = o.company_id and l.order_id = o.id
  where o.company_id = ${placements.companyId} and o.placement_id = ${placements.id}
  and ${isWithSupplier('o')} and l.unit = 'yd³')`;
const deliveredOfPlacement = sql<string>`(select coalesce(sum(t.quantity_yd3), 0)::numeric(14,2)::text
  from ${tickets} t where t.company_id = ${placements.companyId}
  and t.placement_id = ${placements.id} and t.status <> 'rejected')`;
const loadsOfPlacement = sql<number>`(select count(*)::int from ${tickets} t
  where t.company_id = ${placements.companyId} and t.placement_id = ${placements.id}
  and t.status <> 'rejected')`;

function rowsWhere(scope: Scope, where: SQL | undefined, crewMemberId: string | null) {
  return scope.handle
    .select({
      id: placements.id,
      jobId: placements.jobId,
      jobNumber: jobs.number,
      jobName: jobs.name,
      name: placements.name,
      element: placements.element,
      subgrade: placements.subgrade,
      pourDate: placements.pourDate,
      firstTruckAt: placements.firstTruckAt,
      figuredYd3: placements.figuredYd3,
      areaFt2: placements.areaFt2,
      thicknessIn: placements.thicknessIn,
      wastePercent: placements.wastePercent,
      notes: placements.notes,
      status: placements.status,
      orderedYd3: orderedOfPlacement,
      deliveredYd3: deliveredOfPlacement,
      loads: loadsOfPlacement,
    })
    .from(placements)
    .innerJoin(jobs, and(eq(jobs.companyId, placements.companyId), eq(jobs.id, placements.jobId)))
    .where(
      and(
        eq(placements.companyId, scope.companyId),
        inCrew(scope, placements.jobId, crewMemberId),
        where,
      ),
    );
}

/** A job's placements, the latest pour first. */
export async function listPlacements(
  scope: Scope,
  jobId: string,
  crewMemberId: string | null,
  page: { offset: number; limit: number },
): Promise<{ rows: PlacementRow[]; total: number }> {
  const [counted] = await scope.handle
    .select({ total: count() })
    .from(placements)
    .where(
      and(
        eq(placements.companyId, scope.companyId),
        eq(placements.jobId, jobId),
        inCrew(scope, placements.jobId, crewMemberId),
      ),
    );
  const rows = await rowsWhere(scope, eq(placements.jobId, jobId), crewMemberId)
    .orderBy(desc(placements.pourDate), asc(placements.name), asc(placements.id))
    .limit(page.limit)
    .offset(page.offset);
  return { rows, total: counted?.total ?? 0 };
}

export async function findPlacementRow(
  scope: Scope,
  placementId: string,
  crewMemberId: string | null,
): Promise<PlacementRow | null> {
  const [row] = await rowsWhere(scope, eq(placements.id, placementId), crewMemberId);
  return row ?? null;
}

export type PlacementValues = Omit<
  PlacementRow,
  'id' | 'jobId' | 'jobNumber' | 'jobName' | 'orderedYd3' | 'deliveredYd3' | 'loads'
>;

export async function insertPlacement(
  scope: Scope,
  id: string,
  jobId: string,
  values: PlacementValues,
): Promise<void> {
  await scope.handle
    .insert(placements)
    .values({ ...values, id, jobId, companyId: scope.companyId });
}

export async function updatePlacementRow(
  scope: Scope,
  id: string,
  values: PlacementValues,
): Promise<void> {
  await scope.handle
    .update(placements)
    .set(values)
    .where(and(eq(placements.companyId, scope.companyId), eq(placements.id, id)));
}
