import { and, asc, count, eq, ilike, type SQL, sql } from 'drizzle-orm';
import type { SupplierFilters, SupplierRow } from '../../lib/contracts/suppliers';
import { importLayouts, statements, variances } from '../schema/statements';
import { suppliers } from '../schema/suppliers';
import type { Scope } from '../tx';
import { containing } from './jobs';

// The table is named outright: a select from one table leaves columns' tables out.
const ROW = {
  id: suppliers.id,
  name: suppliers.name,
  kind: suppliers.kind,
  dispatchEmail: suppliers.dispatchEmail,
  creditEmail: suppliers.creditEmail,
  phone: suppliers.phone,
  accountNumber: suppliers.accountNumber,
  archived: suppliers.archived,
  statements: sql<number>`(select count(*)::int from ${statements} s
    where s.company_id = suppliers.company_id and s.supplier_id = suppliers.id)`,
  openAgainst: sql<string>`(select coalesce(sum(v.difference), 0)::numeric(14,2)::text
    from ${variances} v where v.company_id = suppliers.company_id
    and v.supplier_id = suppliers.id and v.status = 'open' and v.difference > 0)`,
};

function matching(scope: Scope, filter: SupplierFilters): SQL | undefined {
  return and(
    eq(suppliers.companyId, scope.companyId),
    filter.kind === 'all' ? undefined : eq(suppliers.kind, filter.kind),
    filter.archived === 'all' ? undefined : eq(suppliers.archived, filter.archived === 'yes'),
    filter.search ? ilike(suppliers.name, containing(filter.search)) : undefined,
  );
}

/** One page of suppliers by name. `limit` null means all of them. */
export async function listSuppliers(
  scope: Scope,
  filter: SupplierFilters,
  page: { offset: number; limit: number | null },
): Promise<{ rows: SupplierRow[]; total: number }> {
  const where = matching(scope, filter);
  const [counted] = await scope.handle.select({ total: count() }).from(suppliers).where(where);
  const found = scope.handle
    .select(ROW)
    .from(suppliers)
    .where(where)
    .orderBy(asc(suppliers.name), asc(suppliers.id))
    .offset(page.offset);
  const rows = await (page.limit === null ? found : found.limit(page.limit));
  return { rows, total: counted?.total ?? 0 };
}

export async function findSupplier(scope: Scope, supplierId: string): Promise<SupplierRow | null> {
  const [row] = await scope.handle
    .select(ROW)
    .from(suppliers)
    .where(and(eq(suppliers.companyId, scope.companyId), eq(suppliers.id, supplierId)));
  return row ?? null;
}

export async function countLayouts(scope: Scope, supplierId: string): Promise<number> {
  const [row] = await scope.handle
    .select({ total: count() })
    .from(importLayouts)
    .where(
      and(eq(importLayouts.companyId, scope.companyId), eq(importLayouts.supplierId, supplierId)),
    );
  return row?.total ?? 0;
}

export type SupplierValues = Omit<SupplierRow, 'id' | 'statements' | 'openAgainst'>;

/** Adds a supplier; false where the company has one of that name already. */
export async function insertSupplier(
  scope: Scope,
  id: string,
  values: SupplierValues,
): Promise<boolean> {
  const added = await scope.handle
    .insert(suppliers)
    .values({ ...values, id, companyId: scope.companyId })
    .onConflictDoNothing({ target: [suppliers.companyId, suppliers.name] })
    .returning({ id: suppliers.id });
  return added.length === 1;
}

export async function isSupplierNameTaken(
  scope: Scope,
  name: string,
  exceptId: string,
): Promise<boolean> {
  const rows = await scope.handle
    .select({ id: suppliers.id })
    .from(suppliers)
    .where(and(eq(suppliers.companyId, scope.companyId), eq(suppliers.name, name)));
  return rows.some((row) => row.id !== exceptId);
}

export async function updateSupplierRow(
  scope: Scope,
  id: string,
  values: SupplierValues,
): Promise<void> {
  await scope.handle
    .update(suppliers)
    .set(values)
    .where(and(eq(suppliers.companyId, scope.companyId), eq(suppliers.id, id)));
}
