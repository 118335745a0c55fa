import { and, asc, desc, eq, isNull, type SQL, sql } from 'drizzle-orm';
import type { RateSheetRow, SupplierRow } from '../../lib/contracts/suppliers';
import type { Clause } from '../../lib/domain/rating/clauses';
import { newId } from '../../lib/ids';
import { jobs } from '../schema/jobs';
import { people } from '../schema/people';
import { rateClauses, rateSheets, suppliers } from '../schema/suppliers';
import type { Scope } from '../tx';

export interface StoredRateSheet extends RateSheetRow {
  readonly supplierId: string;
  readonly supplierName: string;
  readonly supplierKind: SupplierRow['kind'];
  readonly approvedAt: Date | null;
}

function sheetsWhere(scope: Scope, where: SQL | undefined) {
  return scope.handle
    .select({
      id: rateSheets.id,
      name: rateSheets.name,
      version: rateSheets.version,
      status: rateSheets.status,
      jobId: rateSheets.jobId,
      jobName: jobs.name,
      effectiveFrom: rateSheets.effectiveFrom,
      effectiveTo: rateSheets.effectiveTo,
      approvedBy: people.name,
      approvedAt: rateSheets.approvedAt,
      supplierId: rateSheets.supplierId,
      supplierName: suppliers.name,
      supplierKind: suppliers.kind,
      clauses: sql<number>`(select count(*)::int from ${rateClauses} c
        where c.company_id = ${rateSheets.companyId} and c.rate_sheet_id = ${rateSheets.id})`,
    })
    .from(rateSheets)
    .innerJoin(
      suppliers,
      and(eq(suppliers.companyId, rateSheets.companyId), eq(suppliers.id, rateSheets.supplierId)),
    )
    .leftJoin(jobs, and(eq(jobs.companyId, rateSheets.companyId), eq(jobs.id, rateSheets.jobId)))
    .leftJoin(
      people,
      and(eq(people.companyId, rateSheets.companyId), eq(people.id, rateSheets.approvedBy)),
    )
    .where(and(eq(rateSheets.companyId, scope.companyId), where));
}

/** A supplier's sheets, the general ones first, the latest version first. */
export async function rateSheetsOf(scope: Scope, supplierId: string): Promise<StoredRateSheet[]> {
  return sheetsWhere(scope, eq(rateSheets.supplierId, supplierId)).orderBy(
    sql`${rateSheets.jobId} is not null`,
    asc(jobs.name),
    desc(rateSheets.version),
    asc(rateSheets.id),
  );
}

/** A sheet; locked until the transaction ends when `forChange`. */
export async function findRateSheet(
  scope: Scope,
  rateSheetId: string,
  forChange = false,
): Promise<StoredRateSheet | null> {
  if (forChange) {
    await scope.handle
      .select({ id: rateSheets.id })
      .from(rateSheets)
      .where(and(eq(rateSheets.companyId, scope.companyId), eq(rateSheets.id, rateSheetId)))
      .for('update');
  }
  const [row] = await sheetsWhere(scope, eq(rateSheets.id, rateSheetId));
  return row ?? null;
}

export async function clausesOf(
  scope: Scope,
  rateSheetId: string,
): Promise<{ id: string; clause: Clause }[]> {
  return scope.handle
    .select({ id: rateClauses.id, clause: rateClauses.clause })
    .from(rateClauses)
    .where(
      and(eq(rateClauses.companyId, scope.companyId), eq(rateClauses.rateSheetId, rateSheetId)),
    )
    .orderBy(asc(rateClauses.position));
}

export async function setClauses(
  scope: Scope,
  rateSheetId: string,
  clauses: readonly Clause[],
): Promise<void> {
  await scope.handle
    .delete(rateClauses)
    .where(
      and(eq(rateClauses.companyId, scope.companyId), eq(rateClauses.rateSheetId, rateSheetId)),
    );
  if (clauses.length === 0) return;
  await scope.handle.insert(rateClauses).values(
    clauses.map((clause, position) => ({
      companyId: scope.companyId,
      id: newId<'clause'>(),
      rateSheetId,
      position,
      clause,
    })),
  );
}

export type NewRateSheet = Omit<typeof rateSheets.$inferInsert, 'companyId' | 'createdAt'>;

export async function insertRateSheet(scope: Scope, values: NewRateSheet): Promise<void> {
  await scope.handle.insert(rateSheets).values({ ...values, companyId: scope.companyId });
}

export async function updateRateSheetRow(
  scope: Scope,
  id: string,
  values: Partial<NewRateSheet>,
): Promise<void> {
  await scope.handle
    .update(rateSheets)
    .set(values)
    .where(and(eq(rateSheets.companyId, scope.companyId), eq(rateSheets.id, id)));
}

export async function deleteRateSheetRow(scope: Scope, id: string): Promise<void> {
  await setClauses(scope, id, []);
  await scope.handle
    .delete(rateSheets)
    .where(and(eq(rateSheets.companyId, scope.companyId), eq(rateSheets.id, id)));
}

/** Ends the open-ended approved sheets for the same deliveries that began before `from`. */
export async function endEarlierSheets(
  scope: Scope,
  sheet: Pick<StoredRateSheet, 'id' | 'supplierId' | 'jobId'>,
  from: string,
  lastDay: string,
): Promise<void> {
  await scope.handle
    .update(rateSheets)
    .set({ effectiveTo: lastDay })
    .where(
      and(
        eq(rateSheets.companyId, scope.companyId),
        eq(rateSheets.supplierId, sheet.supplierId),
        sheet.jobId === null ? isNull(rateSheets.jobId) : eq(rateSheets.jobId, sheet.jobId),
        eq(rateSheets.status, 'approved'),
        isNull(rateSheets.effectiveTo),
        sql`${rateSheets.id} <> ${sheet.id}`,
        sql`${rateSheets.effectiveFrom} < ${from}`,
      ),
    );
}
