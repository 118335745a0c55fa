import { and, asc, count, desc, eq, gte, ilike, lt, or } from 'drizzle-orm';
import type { ActivityRow } from '../../lib/contracts/activity';
import { activity } from '../schema/activity';
import type { Scope } from '../tx';
import { containing } from './jobs';

export interface ActivityFilter {
  readonly actorId?: string | undefined;
  readonly entity?: string | undefined;
  readonly entityId?: string | undefined;
  readonly from: Date | null;
  /** Excluded. */
  readonly until: Date | null;
  readonly search: string;
}

function matching(scope: Scope, filter: ActivityFilter) {
  return and(
    eq(activity.companyId, scope.companyId),
    filter.actorId ? eq(activity.actorId, filter.actorId) : undefined,
    filter.entity ? eq(activity.entity, filter.entity) : undefined,
    filter.entityId ? eq(activity.entityId, filter.entityId) : undefined,
    filter.from ? gte(activity.at, filter.from) : undefined,
    filter.until ? lt(activity.at, filter.until) : undefined,
    filter.search
      ? or(
          ilike(activity.summary, containing(filter.search)),
          ilike(activity.actorName, containing(filter.search)),
        )
      : undefined,
  );
}

/** Newest first. */
export async function listActivity(
  scope: Scope,
  filter: ActivityFilter,
  page: { readonly offset: number; readonly limit: number },
): Promise<{ rows: ActivityRow[]; total: number }> {
  const where = matching(scope, filter);
  const [counted] = await scope.handle.select({ total: count() }).from(activity).where(where);
  const rows = await scope.handle
    .select({
      id: activity.id,
      at: activity.at,
      actorId: activity.actorId,
      actorName: activity.actorName,
      action: activity.action,
      entity: activity.entity,
      entityId: activity.entityId,
      summary: activity.summary,
      before: activity.before,
      after: activity.after,
    })
    .from(activity)
    .where(where)
    .orderBy(desc(activity.at), desc(activity.createdAt), desc(activity.id))
    .limit(page.limit)
    .offset(page.offset);
  return {
    total: counted?.total ?? 0,
    rows: rows.map((row) => ({ ...row, at: row.at.toISOString() })),
  };
}

/** The kinds of records that the company's activity speaks of. */
export async function listActivityEntities(scope: Scope): Promise<string[]> {
  const rows = await scope.handle
    .selectDistinct({ entity: activity.entity })
    .from(activity)
    .where(eq(activity.companyId, scope.companyId))
    .orderBy(asc(activity.entity));
  return rows.map((row) => row.entity);
}
