import {
  and,
  asc,
  count,
  desc,
  eq,
  exists,
  gte,
  ilike,
  inArray,
  lte,
  or,
  type SQL,
  sql,
} from 'drizzle-orm';
import type { TicketFilters, TicketRow } from '../../lib/contracts/tickets';
import { jobs, placements } from '../schema/jobs';
import { suppliers } from '../schema/suppliers';
import { photos, readings, tickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { inCrew } from './crew';
import { containing } from './jobs';

export interface TicketListFilter extends TicketFilters {
  /** Only tickets of jobs in this person's crew; null for all of the company's. */
  readonly crewMemberId: string | null;
}

/** A reading's field as text, without leaving SQL. */
function readText(field: string): SQL<string | null> {
  return sql<
    string | null
  >`jsonb_extract_path_text(${readings.fields}, 'fields', ${field}, 'value')`;
}

function matching(scope: Scope, filter: TicketListFilter): SQL | undefined {
  const pattern = containing(filter.search);
  const readNumber = scope.handle
    .select({ one: photos.id })
    .from(photos)
    .innerJoin(
      readings,
      and(eq(readings.companyId, photos.companyId), eq(readings.photoId, photos.id)),
    )
    .where(
      and(
        eq(photos.companyId, scope.companyId),
        eq(photos.ticketId, tickets.id),
        eq(tickets.status, 'toCheck'),
        ilike(readText('ticketNumber'), pattern),
      ),
    );
  return and(
    eq(tickets.companyId, scope.companyId),
    inCrew(scope, tickets.jobId, filter.crewMemberId),
    filter.status === 'all' ? undefined : eq(tickets.status, filter.status),
    filter.supplierId ? eq(tickets.supplierId, filter.supplierId) : undefined,
    filter.jobId ? eq(tickets.jobId, filter.jobId) : undefined,
    filter.placementId ? eq(tickets.placementId, filter.placementId) : undefined,
    filter.from ? gte(tickets.date, filter.from) : undefined,
    filter.to ? lte(tickets.date, filter.to) : undefined,
    filter.search
      ? or(
          ilike(tickets.number, pattern),
          ilike(tickets.truck, pattern),
          ilike(tickets.mixCode, pattern),
          exists(readNumber),
        )
      : undefined,
  );
}

const SORT_COLUMNS = {
  date: tickets.date,
  number: tickets.number,
  supplier: suppliers.name,
  job: jobs.number,
  quantity: tickets.quantityYd3,
  status: tickets.status,
} as const;

/** One page of tickets, in a total order. `limit` null means all of them. */
export async function listTickets(
  scope: Scope,
  filter: TicketListFilter,
  page: { offset: number; limit: number | null },
): Promise<{ rows: TicketRow[]; total: number }> {
  const where = matching(scope, filter);
  const [counted] = await scope.handle.select({ total: count() }).from(tickets).where(where);
  const way = filter.direction === 'up' ? asc : desc;
  const sorted = SORT_COLUMNS[filter.sort];
  const found = rowsWhere(scope, where)
    .orderBy(
      sql`${sorted} is null`,
      way(sorted),
      way(tickets.date),
      way(sql`coalesce(${tickets.arrivedAt}, ${tickets.batchedAt}, 0)`),
      asc(tickets.number),
      asc(tickets.id),
    )
    .offset(page.offset);
  const rows = await (page.limit === null ? found : found.limit(page.limit));
  return { total: counted?.total ?? 0, rows: await withReadings(scope, rows) };
}

/** The loads of a placement, oldest first: rejected tickets are left out. */
export async function loadsOfPlacement(scope: Scope, placementId: string): Promise<TicketRow[]> {
  const rows = await rowsWhere(
    scope,
    and(
      eq(tickets.companyId, scope.companyId),
      eq(tickets.placementId, placementId),
      inArray(tickets.status, ['toCheck', 'confirmed']),
    ),
  ).orderBy(
    asc(tickets.date),
    sql`coalesce(${tickets.arrivedAt}, ${tickets.batchedAt}, 9999)`,
    sql`coalesce(${tickets.loadNumber}, 9999)`,
    asc(tickets.createdAt),
    asc(tickets.id),
  );
  return withReadings(scope, rows);
}

type BareRow = Omit<TicketRow, 'hasPhoto' | 'reading'>;

function rowsWhere(scope: Scope, where: SQL | undefined) {
  return scope.handle
    .select({
      id: tickets.id,
      status: tickets.status,
      number: tickets.number,
      date: tickets.date,
      supplierName: suppliers.name,
      jobId: tickets.jobId,
      jobNumber: jobs.number,
      jobName: jobs.name,
      placementName: placements.name,
      mixCode: tickets.mixCode,
      quantityYd3: tickets.quantityYd3,
      returnedYd3: tickets.returnedYd3,
      truck: tickets.truck,
      plant: tickets.plant,
      loadNumber: tickets.loadNumber,
      batchedAt: tickets.batchedAt,
      arrivedAt: tickets.arrivedAt,
      startedAt: tickets.startedAt,
      finishedAt: tickets.finishedAt,
      leftAt: tickets.leftAt,
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
    .where(where)
    .$dynamic();
}

async function withReadings(scope: Scope, rows: BareRow[]): Promise<TicketRow[]> {
  if (rows.length === 0) return [];
  const found = await scope.handle
    .select({
      ticketId: photos.ticketId,
      state: readings.state,
      number: readText('ticketNumber'),
      quantityYd3: readText('quantityYd3'),
      truck: readText('truck'),
      doubtful: sql<string>`(
        select count(*)::text
        from jsonb_each(coalesce(${readings.fields} -> 'fields', '{}'::jsonb)) as field
        where (field.value ->> 'doubtful')::boolean
      )`,
    })
    .from(photos)
    .leftJoin(
      readings,
      and(eq(readings.companyId, photos.companyId), eq(readings.photoId, photos.id)),
    )
    .where(
      and(
        eq(photos.companyId, scope.companyId),
        inArray(
          photos.ticketId,
          rows.map((row) => row.id),
        ),
      ),
    )
    .orderBy(asc(photos.createdAt), asc(photos.id));
  // The last photo of a ticket is the one that counts: an earlier one may have been too blurred.
  const byTicket = new Map(found.map((one) => [one.ticketId, one]));
  return rows.map((row) => {
    const reading = byTicket.get(row.id);
    return {
      ...row,
      hasPhoto: reading !== undefined,
      reading:
        row.status === 'toCheck' && reading?.state
          ? {
              state: reading.state,
              number: reading.number,
              quantityYd3: reading.quantityYd3,
              truck: reading.truck,
              doubtful: Number(reading.doubtful),
            }
          : null,
    };
  });
}
