import { and, asc, count, desc, eq, ilike, ne, or, type SQL, sql } from 'drizzle-orm';
import type { z } from 'zod';
import type { listStatementsInput, StatementRow } from '../../lib/contracts/statements';
import { newId } from '../../lib/ids';
import { people } from '../schema/people';
import { billLines, invoices, statements, strikes, variances } from '../schema/statements';
import { suppliers } from '../schema/suppliers';
import type { Scope } from '../tx';
import { containing } from './jobs';

type Filter = Omit<z.output<typeof listStatementsInput>, 'offset' | 'limit'>;

const lineCount = sql<number>`(select count(*)::int from ${billLines} l
  where l.company_id = ${statements.companyId} and l.statement_id = ${statements.id})`;
const billedSum = sql<string>`(select coalesce(sum(l.amount), 0)::numeric(14,2)::text
  from ${billLines} l where l.company_id = ${statements.companyId}
  and l.statement_id = ${statements.id} and l.line_kind in ('charge', 'tax'))`;
/** Struck rows that are lines of the bill: deliveries it leaves out are not lines. */
const settledCount = sql<number>`(select count(*)::int from ${strikes} s
  join ${billLines} l on l.company_id = s.company_id and l.statement_id = s.statement_id
  and l.id::text = s.row_key
  where s.company_id = ${statements.companyId} and s.statement_id = ${statements.id})`;
const againstSum = sql<string>`(select coalesce(sum(v.difference), 0)::numeric(14,2)::text
  from ${variances} v where v.company_id = ${statements.companyId}
  and v.statement_id = ${statements.id} and v.status = 'open' and v.difference > 0)`;

const SORTS: Record<Filter['sort'], SQL | typeof statements.number> = {
  period: sql`${statements.periodEnd}`,
  supplier: sql`${suppliers.name}`,
  number: statements.number,
  billed: sql`(${billedSum})::numeric`,
  against: sql`(${againstSum})::numeric`,
};

function matching(scope: Scope, filter: Filter): SQL | undefined {
  return and(
    eq(statements.companyId, scope.companyId),
    filter.status === 'all' ? undefined : eq(statements.status, filter.status),
    filter.supplierId ? eq(statements.supplierId, filter.supplierId) : undefined,
    filter.search
      ? or(
          ilike(statements.number, containing(filter.search)),
          ilike(suppliers.name, containing(filter.search)),
        )
      : undefined,
  );
}

/** One page of statements with how far each is settled. `limit` null means all. */
export async function listStatements(
  scope: Scope,
  filter: Filter,
  page: { offset: number; limit: number | null },
): Promise<{ rows: StatementRow[]; total: number }> {
  const where = matching(scope, filter);
  const joined = and(
    eq(suppliers.companyId, statements.companyId),
    eq(suppliers.id, statements.supplierId),
  );
  const [counted] = await scope.handle
    .select({ total: count() })
    .from(statements)
    .innerJoin(suppliers, joined)
    .where(where);
  const way = filter.direction === 'up' ? asc : desc;
  const found = scope.handle
    .select({
      id: statements.id,
      number: statements.number,
      kind: statements.kind,
      supplierId: statements.supplierId,
      supplierName: suppliers.name,
      periodStart: statements.periodStart,
      periodEnd: statements.periodEnd,
      openingBalance: statements.openingBalance,
      closingBalance: statements.closingBalance,
      status: statements.status,
      closedAt: statements.closedAt,
      closedBy: people.name,
      lines: lineCount,
      settled: settledCount,
      billed: billedSum,
      against: againstSum,
    })
    .from(statements)
    .innerJoin(suppliers, joined)
    .leftJoin(
      people,
      and(eq(people.companyId, statements.companyId), eq(people.id, statements.closedBy)),
    )
    .where(where)
    .orderBy(
      way(SORTS[filter.sort]),
      desc(statements.periodEnd),
      asc(suppliers.name),
      asc(statements.number),
      asc(statements.id),
    )
    .offset(page.offset);
  const rows = await (page.limit === null ? found : found.limit(page.limit));
  return {
    total: counted?.total ?? 0,
    rows: rows.map((row) => ({ ...row, closedAt: row.closedAt?.toISOString() ?? null })),
  };
}

/** Suppliers to choose from: who an import is for, and what lists can be narrowed to. */
export async function supplierChoices(scope: Scope): Promise<{ id: string; name: string }[]> {
  return scope.handle
    .select({ id: suppliers.id, name: suppliers.name })
    .from(suppliers)
    .where(and(eq(suppliers.companyId, scope.companyId), eq(suppliers.archived, false)))
    .orderBy(asc(suppliers.name));
}

export async function findSupplierName(scope: Scope, supplierId: string): Promise<string | null> {
  const [row] = await scope.handle
    .select({ name: suppliers.name })
    .from(suppliers)
    .where(and(eq(suppliers.companyId, scope.companyId), eq(suppliers.id, supplierId)));
  return row?.name ?? null;
}

export type StoredStatement = typeof statements.$inferSelect & {
  readonly supplierName: string;
  readonly closedByName: string | null;
};

/** The statement, locked against a second person's change when `forChange`. */
export async function findStatement(
  scope: Scope,
  statementId: string,
  forChange = false,
): Promise<StoredStatement | null> {
  if (forChange) {
    await scope.handle
      .select({ id: statements.id })
      .from(statements)
      .where(and(eq(statements.companyId, scope.companyId), eq(statements.id, statementId)))
      .for('update');
  }
  const [row] = await scope.handle
    .select({ statement: statements, supplierName: suppliers.name, closedByName: people.name })
    .from(statements)
    .innerJoin(
      suppliers,
      and(eq(suppliers.companyId, statements.companyId), eq(suppliers.id, statements.supplierId)),
    )
    .leftJoin(
      people,
      and(eq(people.companyId, statements.companyId), eq(people.id, statements.closedBy)),
    )
    .where(and(eq(statements.companyId, scope.companyId), eq(statements.id, statementId)));
  return row
    ? { ...row.statement, supplierName: row.supplierName, closedByName: row.closedByName }
    : null;
}

export async function openStatementIds(scope: Scope): Promise<string[]> {
  const rows = await scope.handle
    .select({ id: statements.id })
    .from(statements)
    .where(and(eq(statements.companyId, scope.companyId), ne(statements.status, 'closed')))
    .orderBy(asc(statements.periodEnd), asc(statements.createdAt), asc(statements.id));
  return rows.map((row) => row.id);
}

export type NewStatement = Omit<typeof statements.$inferInsert, 'companyId' | 'id' | 'createdAt'>;

/** Adds the statement; false where the supplier already has one of that number. */
export async function insertStatement(
  scope: Scope,
  id: string,
  values: NewStatement,
): Promise<boolean> {
  const added = await scope.handle
    .insert(statements)
    .values({ ...values, id, companyId: scope.companyId })
    .onConflictDoNothing({
      target: [statements.companyId, statements.supplierId, statements.number],
    })
    .returning({ id: statements.id });
  return added.length === 1;
}

/** Adds the statement's invoices and answers with the id for each number. */
export async function insertInvoices(
  scope: Scope,
  statement: { readonly id: string; readonly supplierId: string },
  facts: readonly { readonly number: string; readonly date: string | null }[],
): Promise<Map<string, string>> {
  const rows = facts.map(({ number, date }) => ({
    companyId: scope.companyId,
    id: newId<'invoice'>() as string,
    statementId: statement.id,
    supplierId: statement.supplierId,
    number,
    date,
  }));
  if (rows.length > 0) await scope.handle.insert(invoices).values(rows);
  return new Map(rows.map((row) => [row.number, row.id]));
}

export type NewBillLine = Omit<typeof billLines.$inferInsert, 'companyId' | 'createdAt'>;

const ROWS_PER_INSERT = 500;

/** Adds lines; the answer counts those that were new, by what each line says. */
export async function insertBillLines(
  scope: Scope,
  lines: readonly NewBillLine[],
): Promise<number> {
  let added = 0;
  for (let at = 0; at < lines.length; at += ROWS_PER_INSERT) {
    const values = lines
      .slice(at, at + ROWS_PER_INSERT)
      .map((line) => ({ ...line, companyId: scope.companyId }));
    const rows = await scope.handle
      .insert(billLines)
      .values(values)
      .onConflictDoNothing({
        target: [billLines.companyId, billLines.supplierId, billLines.rowKey],
      })
      .returning({ id: billLines.id });
    added += rows.length;
  }
  return added;
}

/** Keys of all lines that this supplier's documents brought in so far. */
export async function rowKeysOf(scope: Scope, supplierId: string): Promise<Set<string>> {
  const rows = await scope.handle
    .select({ rowKey: billLines.rowKey })
    .from(billLines)
    .where(and(eq(billLines.companyId, scope.companyId), eq(billLines.supplierId, supplierId)));
  return new Set(rows.map((row) => row.rowKey));
}

export async function setStatementStatus(
  scope: Scope,
  statementId: string,
  change: {
    readonly status: 'open' | 'closed';
    readonly closedAt: Date | null;
    readonly closedBy: string | null;
    readonly closedRows: unknown;
  },
): Promise<void> {
  await scope.handle
    .update(statements)
    .set(change)
    .where(and(eq(statements.companyId, scope.companyId), eq(statements.id, statementId)));
}
