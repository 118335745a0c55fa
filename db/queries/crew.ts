import { and, eq, exists, type SQL } from 'drizzle-orm';
import type { PgColumn } from 'drizzle-orm/pg-core';
import { jobCrew } from '../schema/jobs';
import type { Scope } from '../tx';

/**
 * The condition that a record's job has `crewMemberId` in its crew; no condition for null, which
 * stands for whoever sees all of the company's jobs.
 */
export function inCrew(
  scope: Scope,
  jobId: PgColumn,
  crewMemberId: string | null,
): SQL | undefined {
  if (crewMemberId === null) return undefined;
  return exists(
    scope.handle
      .select({ one: jobCrew.id })
      .from(jobCrew)
      .where(
        and(
          eq(jobCrew.companyId, scope.companyId),
          eq(jobCrew.jobId, jobId),
          eq(jobCrew.personId, crewMemberId),
        ),
      ),
  );
}
