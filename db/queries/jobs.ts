import {
  and,
  asc,
  count,
  eq,
  exists,
  getTableColumns,
  ilike,
  inArray,
  or,
  type SQL,
  sql,
} from 'drizzle-orm';
import type { JobRow } from '../../lib/contracts/jobs';
import { newId } from '../../lib/ids';
import { jobCrew, jobs, placements } from '../schema/jobs';
import { orderLines, orders } from '../schema/orders';
import { people } from '../schema/people';
import { tickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { isWithSupplier } from './with-supplier';

export interface JobFilter {
  readonly status: 'open' | 'finished' | 'all';
  readonly search: string;
  /** Only jobs in this person's crew; null for all of the company's. */
  readonly crewMemberId: string | null;
}

// The table is named outright: a select from one table leaves columns' tables out.
const ROW = {
  ...getTableColumns(jobs),
  figuredYd3: sql<string | null>`(select sum(p.figured_yd3)::numeric(14,2)::text
    from ${placements} p where p.company_id = jobs.company_id and p.job_id = jobs.id
    and p.status <> 'cancelled')`,
  orderedYd3: sql<string | null>`(select sum(l.quantity)::numeric(14,2)::text
    from ${orders} o join ${orderLines} l on l.company_id = o.company_id and l.order_id = o.id
    where o.company_id = jobs.company_id and o.job_id = jobs.id
    and ${isWithSupplier('o')} and l.unit = 'yd³')`,
  deliveredYd3: sql<string>`(select coalesce(sum(t.quantity_yd3), 0)::numeric(14,2)::text
    from ${tickets} t where t.company_id = jobs.company_id and t.job_id = jobs.id
    and t.status <> 'rejected')`,
};

/** `search` as a pattern that matches it literally anywhere. */
export function containing(search: string): string {
  return `%${search.replace(/[\\%_]/g, '\\$&')}%`;
}

function matching(scope: Scope, filter: JobFilter): SQL | undefined {
  const crew = scope.handle
    .select({ one: jobCrew.id })
    .from(jobCrew)
    .where(
      and(
        eq(jobCrew.companyId, scope.companyId),
        eq(jobCrew.jobId, jobs.id),
        eq(jobCrew.personId, filter.crewMemberId ?? ''),
      ),
    );
  return and(
    eq(jobs.companyId, scope.companyId),
    filter.status === 'all' ? undefined : eq(jobs.status, filter.status),
    filter.search
      ? or(
          ilike(jobs.name, containing(filter.search)),
          ilike(jobs.number, containing(filter.search)),
        )
      : undefined,
    filter.crewMemberId === null ? undefined : exists(crew),
  );
}

export async function listJobs(
  scope: Scope,
  filter: JobFilter,
  page: { offset: number; limit: number },
): Promise<{ rows: JobRow[]; total: number }> {
  const where = matching(scope, filter);
  const [counted] = await scope.handle.select({ total: count() }).from(jobs).where(where);
  const rows = await scope.handle
    .select(ROW)
    .from(jobs)
    .where(where)
    .orderBy(asc(jobs.number), asc(jobs.id))
    .limit(page.limit)
    .offset(page.offset);
  const crews = await crewOf(
    scope,
    rows.map((row) => row.id),
  );
  return {
    total: counted?.total ?? 0,
    rows: rows.map((row) => ({ ...row, crew: crews.get(row.id) ?? [] })),
  };
}

export async function findJob(
  scope: Scope,
  jobId: string,
  crewMemberId: string | null,
): Promise<JobRow | null> {
  const [row] = await scope.handle
    .select(ROW)
    .from(jobs)
    .where(and(matching(scope, { status: 'all', search: '', crewMemberId }), eq(jobs.id, jobId)));
  if (!row) return null;
  const crews = await crewOf(scope, [row.id]);
  return { ...row, crew: crews.get(row.id) ?? [] };
}

async function crewOf(scope: Scope, jobIds: string[]): Promise<Map<string, JobRow['crew']>> {
  const crews = new Map<string, JobRow['crew']>();
  if (jobIds.length === 0) return crews;
  const rows = await scope.handle
    .select({ jobId: jobCrew.jobId, id: people.id, name: people.name })
    .from(jobCrew)
    .innerJoin(
      people,
      and(eq(people.companyId, jobCrew.companyId), eq(people.id, jobCrew.personId)),
    )
    .where(and(eq(jobCrew.companyId, scope.companyId), inArray(jobCrew.jobId, jobIds)))
    .orderBy(asc(people.name));
  for (const row of rows) {
    crews.set(row.jobId, [...(crews.get(row.jobId) ?? []), { id: row.id, name: row.name }]);
  }
  return crews;
}

export type JobValues = Omit<JobRow, 'id' | 'crew' | 'figuredYd3' | 'orderedYd3' | 'deliveredYd3'>;

export async function insertJob(scope: Scope, id: string, values: JobValues): Promise<void> {
  await scope.handle.insert(jobs).values({ ...values, id, companyId: scope.companyId });
}

export async function updateJob(scope: Scope, id: string, values: JobValues): Promise<void> {
  await scope.handle
    .update(jobs)
    .set(values)
    .where(and(eq(jobs.companyId, scope.companyId), eq(jobs.id, id)));
}

export async function isJobNumberTaken(
  scope: Scope,
  number: string,
  exceptId: string | null,
): Promise<boolean> {
  const rows = await scope.handle
    .select({ id: jobs.id })
    .from(jobs)
    .where(and(eq(jobs.companyId, scope.companyId), eq(jobs.number, number)));
  return rows.some((row) => row.id !== exceptId);
}

/** Makes `personIds` the job's crew. People of another company are refused by the database. */
export async function setCrew(scope: Scope, jobId: string, personIds: string[]): Promise<void> {
  await scope.handle
    .delete(jobCrew)
    .where(and(eq(jobCrew.companyId, scope.companyId), eq(jobCrew.jobId, jobId)));
  if (personIds.length === 0) return;
  await scope.handle
    .insert(jobCrew)
    .values(
      personIds.map((personId) => ({ companyId: scope.companyId, id: newId(), jobId, personId })),
    );
}

/** How many of `personIds` work in the company: the check before `setCrew`. */
export async function countPeople(scope: Scope, personIds: string[]): Promise<number> {
  if (personIds.length === 0) return 0;
  const [row] = await scope.handle
    .select({ total: count() })
    .from(people)
    .where(and(eq(people.companyId, scope.companyId), inArray(people.id, personIds)));
  return row?.total ?? 0;
}
