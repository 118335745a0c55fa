import { and, asc, count, desc, eq, gt, lt, type SQL, sql } from 'drizzle-orm';
import type { AGES, VarianceFilters, VarianceRow } from '../../lib/contracts/variances';
import { jobs } from '../schema/jobs';
import { people } from '../schema/people';
import { billLines, statements, variances } from '../schema/statements';
import { suppliers } from '../schema/suppliers';
import { pumpTickets, tickets } from '../schema/tickets';
import type { Scope } from '../tx';

type Age = (typeof AGES)[number];
const AGE_DAYS: Record<Age, { readonly from: number; readonly to: number | null }> = {
  '0-30': { from: -100_000, to: 30 },
  '31-60': { from: 31, to: 60 },
  '61-90': { from: 61, to: 90 },
  over90: { from: 91, to: null },
};

/** Days from the end of the statement's period to `today`. */
const ageDays = (today: string) => sql<number>`(${today}::date - ${statements.periodEnd})::int`;

function matching(scope: Scope, filter: VarianceFilters, today: string): SQL | undefined {
  const { status, supplierId, statementId, kind, age } = filter;
  const days = age ? AGE_DAYS[age] : null;
  return and(
    eq(variances.companyId, scope.companyId),
    status === 'all'
      ? undefined
      : status === 'unsettled'
        ? sql`${variances.status} in ('open', 'claimed')`
        : eq(variances.status, status),
    supplierId ? eq(variances.supplierId, supplierId) : undefined,
    statementId ? eq(variances.statementId, statementId) : undefined,
    kind ? eq(variances.kind, kind) : undefined,
    days ? sql`${ageDays(today)} >= ${days.from}` : undefined,
    days && days.to !== null ? sql`${ageDays(today)} <= ${days.to}` : undefined,
  );
}

const onStatement = and(
  eq(statements.companyId, variances.companyId),
  eq(statements.id, variances.statementId),
);
const ofSupplier = and(
  eq(suppliers.companyId, variances.companyId),
  eq(suppliers.id, variances.supplierId),
);

function sortBy(filter: VarianceFilters, today: string): SQL {
  switch (filter.sort) {
    case 'difference':
      return sql`${variances.difference}`;
    case 'age':
      return ageDays(today);
    case 'supplier':
      return sql`${suppliers.name}`;
    case 'kind':
      return sql`${variances.kind}`;
    case 'statement':
      return sql`${statements.number}`;
  }
}

/** One page of variances. `limit` null means all of them. */
export async function listVariances(
  scope: Scope,
  filter: VarianceFilters,
  today: string,
  page: { offset: number; limit: number | null },
): Promise<VarianceRow[]> {
  const way = filter.direction === 'up' ? asc : desc;
  const found = scope.handle
    .select({
      id: variances.id,
      kind: variances.kind,
      status: variances.status,
      supplierId: variances.supplierId,
      supplierName: suppliers.name,
      statementId: variances.statementId,
      statementNumber: statements.number,
      statementStatus: statements.status,
      periodEnd: statements.periodEnd,
      ageDays: ageDays(today),
      rowKey: variances.rowKey,
      ticketNumber: sql<
        string | null
      >`coalesce(${tickets.number}, ${pumpTickets.number}, ${billLines.ticketNumber})`,
      jobName: sql<string | null>`coalesce(${jobs.name}, ${billLines.jobName})`,
      expected: variances.expected,
      billed: variances.billed,
      difference: variances.difference,
      sentence: variances.sentence,
      reason: variances.reason,
      decidedBy: people.name,
      decidedAt: variances.decidedAt,
    })
    .from(variances)
    .innerJoin(statements, onStatement)
    .innerJoin(suppliers, ofSupplier)
    .leftJoin(
      tickets,
      and(eq(tickets.companyId, variances.companyId), eq(tickets.id, variances.ticketId)),
    )
    .leftJoin(
      pumpTickets,
      and(
        eq(pumpTickets.companyId, variances.companyId),
        eq(pumpTickets.id, variances.pumpTicketId),
      ),
    )
    .leftJoin(
      billLines,
      and(eq(billLines.companyId, variances.companyId), eq(billLines.id, variances.billLineId)),
    )
    .leftJoin(
      jobs,
      and(
        eq(jobs.companyId, variances.companyId),
        eq(jobs.id, sql`coalesce(${tickets.jobId}, ${pumpTickets.jobId})`),
      ),
    )
    .leftJoin(
      people,
      and(eq(people.companyId, variances.companyId), eq(people.id, variances.decidedBy)),
    )
    .where(matching(scope, filter, today))
    .orderBy(way(sortBy(filter, today)), desc(variances.difference), asc(variances.id))
    .offset(page.offset);
  const rows = await (page.limit === null ? found : found.limit(page.limit));
  return rows.map(({ statementStatus, decidedAt, ...row }) => ({
    ...row,
    statementClosed: statementStatus === 'closed',
    decidedAt: decidedAt?.toISOString() ?? null,
  }));
}

const dollarsOf = (which: SQL) =>
  sql<string>`coalesce(sum(${variances.difference}) filter (where ${which}), 0)::numeric(14,2)::text`;
const against = dollarsOf(sql`${gt(variances.difference, '0')}`);
const inOurFavour = dollarsOf(sql`${lt(variances.difference, '0')}`);

/** Of everything that the filters let through. */
export async function varianceTotals(scope: Scope, filter: VarianceFilters, today: string) {
  const [row] = await scope.handle
    .select({ total: count(), against, inOurFavour })
    .from(variances)
    .innerJoin(statements, onStatement)
    .where(matching(scope, filter, today));
  return row ?? { total: 0, against: '0.00', inOurFavour: '0.00' };
}

/** Dollars and numbers by supplier, by kind and by age, each with its own filter lifted. */
export async function varianceGroups(scope: Scope, filter: VarianceFilters, today: string) {
  const { supplierId: _supplier, ...anySupplier } = filter;
  const { kind: _kind, ...anyKind } = filter;
  const { age: _age, ...anyAge } = filter;
  const bySupplier = await scope.handle
    .select({ id: suppliers.id, name: suppliers.name, against, count: count() })
    .from(variances)
    .innerJoin(statements, onStatement)
    .innerJoin(suppliers, ofSupplier)
    .where(matching(scope, anySupplier, today))
    .groupBy(suppliers.id, suppliers.name)
    .orderBy(asc(suppliers.name));
  const byKind = await scope.handle
    .select({ kind: variances.kind, against, count: count() })
    .from(variances)
    .innerJoin(statements, onStatement)
    .where(matching(scope, anyKind, today))
    .groupBy(variances.kind)
    .orderBy(asc(variances.kind));
  const days = ageDays(today);
  const age = sql<Age>`case when ${days} <= 30 then '0-30' when ${days} <= 60 then '31-60'
    when ${days} <= 90 then '61-90' else 'over90' end`.as('age');
  const aged = scope.handle.$with('aged').as(
    scope.handle
      .select({ age, difference: variances.difference })
      .from(variances)
      .innerJoin(statements, onStatement)
      .where(matching(scope, anyAge, today)),
  );
  const byAge = await scope.handle
    .with(aged)
    .select({
      age: aged.age,
      against: sql<string>`coalesce(sum(${aged.difference}) filter (where ${aged.difference} > 0), 0)::numeric(14,2)::text`,
      count: count(),
    })
    .from(aged)
    .groupBy(aged.age)
    .orderBy(asc(aged.age));
  return { suppliers: bySupplier, kinds: byKind, ages: byAge };
}
