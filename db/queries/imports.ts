import { createHash } from 'node:crypto';
import { and, desc, eq, inArray, sql } from 'drizzle-orm';
import type { ImportLayout } from '../../importers/core/layout';
import type { PendingImport } from '../../lib/contracts/imports';
import { newId } from '../../lib/ids';
import { people } from '../schema/people';
import { importLayouts, imports, statements } from '../schema/statements';
import { suppliers } from '../schema/suppliers';
import type { Scope } from '../tx';

export type StoredImport = typeof imports.$inferSelect & {
  readonly supplierName: string;
  readonly statementNumber: string | null;
};

const ofSupplier = and(
  eq(suppliers.companyId, imports.companyId),
  eq(suppliers.id, imports.supplierId),
);
const ofStatement = and(
  eq(statements.companyId, imports.companyId),
  eq(statements.id, imports.statementId),
);

/** An upload; locked until the transaction ends when `forChange`. */
export async function findImport(
  scope: Scope,
  importId: string,
  forChange = false,
): Promise<StoredImport | null> {
  const own = and(eq(imports.companyId, scope.companyId), eq(imports.id, importId));
  if (forChange) {
    await scope.handle.select({ id: imports.id }).from(imports).where(own).for('update');
  }
  const [row] = await scope.handle
    .select({ one: imports, supplierName: suppliers.name, statementNumber: statements.number })
    .from(imports)
    .innerJoin(suppliers, ofSupplier)
    .leftJoin(statements, ofStatement)
    .where(own);
  return row
    ? { ...row.one, supplierName: row.supplierName, statementNumber: row.statementNumber }
    : null;
}

/** The same file uploaded before for the supplier and not discarded, the accepted one first. */
export async function findSameFile(
  scope: Scope,
  supplierId: string,
  sha256: string,
): Promise<StoredImport | null> {
  const rows = await scope.handle
    .select({ id: imports.id, status: imports.status })
    .from(imports)
    .where(
      and(
        eq(imports.companyId, scope.companyId),
        eq(imports.supplierId, supplierId),
        eq(imports.sha256, sha256),
        inArray(imports.status, ['preview', 'accepted']),
      ),
    );
  const best = rows.find((row) => row.status === 'accepted') ?? rows[0];
  return best ? findImport(scope, best.id) : null;
}

export async function insertImport(
  scope: Scope,
  values: Omit<typeof imports.$inferInsert, 'companyId' | 'createdAt'>,
): Promise<void> {
  await scope.handle.insert(imports).values({ ...values, companyId: scope.companyId });
}

export async function updateImport(
  scope: Scope,
  importId: string,
  change: Partial<
    Pick<typeof imports.$inferInsert, 'status' | 'layout' | 'statementId' | 'acceptedAt'>
  >,
): Promise<void> {
  await scope.handle
    .update(imports)
    .set(change)
    .where(and(eq(imports.companyId, scope.companyId), eq(imports.id, importId)));
}

/** Files that wait for their preview to be accepted, newest first. */
export async function pendingImports(scope: Scope): Promise<PendingImport[]> {
  const rows = await scope.handle
    .select({
      id: imports.id,
      fileName: imports.fileName,
      supplierId: imports.supplierId,
      supplierName: suppliers.name,
      sizeBytes: imports.sizeBytes,
      uploadedAt: imports.createdAt,
      uploadedBy: people.name,
    })
    .from(imports)
    .innerJoin(suppliers, ofSupplier)
    .leftJoin(
      people,
      and(eq(people.companyId, imports.companyId), eq(people.id, imports.uploadedBy)),
    )
    .where(and(eq(imports.companyId, scope.companyId), eq(imports.status, 'preview')))
    .orderBy(desc(imports.createdAt), desc(imports.id))
    .limit(100);
  return rows.map((row) => ({ ...row, uploadedAt: row.uploadedAt.toISOString() }));
}

const hashOf = (signature: string) => createHash('sha256').update(signature).digest('hex');

/** Layouts confirmed for the supplier's files, the latest first. */
export async function rememberedLayouts(scope: Scope, supplierId: string): Promise<unknown[]> {
  const rows = await scope.handle
    .select({ layout: importLayouts.layout })
    .from(importLayouts)
    .where(
      and(eq(importLayouts.companyId, scope.companyId), eq(importLayouts.supplierId, supplierId)),
    )
    .orderBy(desc(importLayouts.createdAt), desc(importLayouts.id))
    .limit(20);
  return rows.map((row) => row.layout);
}

/** Keeps how a file was read, under its titles; files without titles share one place. */
export async function rememberLayout(
  scope: Scope,
  supplierId: string,
  layout: ImportLayout,
): Promise<void> {
  await scope.handle
    .insert(importLayouts)
    .values({
      companyId: scope.companyId,
      id: newId<'importLayout'>(),
      supplierId,
      headerSignature: hashOf(layout.headerSignature ?? ''),
      layout,
    })
    .onConflictDoUpdate({
      target: [importLayouts.companyId, importLayouts.supplierId, importLayouts.headerSignature],
      set: { layout, createdAt: sql`now()` },
    });
}
