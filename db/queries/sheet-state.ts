import { and, asc, desc, eq, inArray, ne, sql } from 'drizzle-orm';
import { newId } from '../../lib/ids';
import { people } from '../schema/people';
import { billLines, matches, strikes, variances } from '../schema/statements';
import type { Scope } from '../tx';

/** What people settled on a sheet, row by row. */
export type StoredStrike = typeof strikes.$inferSelect & { readonly madeByName: string };

export async function strikesOf(scope: Scope, statementId: string): Promise<StoredStrike[]> {
  const rows = await scope.handle
    .select({ strike: strikes, madeByName: people.name })
    .from(strikes)
    .innerJoin(people, and(eq(people.companyId, strikes.companyId), eq(people.id, strikes.madeBy)))
    .where(and(eq(strikes.companyId, scope.companyId), eq(strikes.statementId, statementId)));
  return rows.map(({ strike, madeByName }) => ({ ...strike, madeByName }));
}

/** Settles rows; a row that is settled already stays as it is. */
export async function insertStrikes(
  scope: Scope,
  statementId: string,
  rowKeys: readonly string[],
  values: Pick<StoredStrike, 'state' | 'reason' | 'madeBy' | 'madeAt'>,
): Promise<void> {
  if (rowKeys.length === 0) return;
  await scope.handle
    .insert(strikes)
    .values(
      rowKeys.map((rowKey) => ({
        ...values,
        companyId: scope.companyId,
        id: newId<'strike'>(),
        statementId,
        rowKey,
      })),
    )
    .onConflictDoNothing();
}

export async function deleteStrikes(
  scope: Scope,
  statementId: string,
  rowKeys: readonly string[],
): Promise<void> {
  if (rowKeys.length === 0) return;
  await scope.handle
    .delete(strikes)
    .where(
      and(
        eq(strikes.companyId, scope.companyId),
        eq(strikes.statementId, statementId),
        inArray(strikes.rowKey, [...rowKeys]),
      ),
    );
}

export type StoredMatch = typeof matches.$inferSelect;

const linesOf = (scope: Scope, statementId: string) =>
  scope.handle
    .select({ id: billLines.id })
    .from(billLines)
    .where(and(eq(billLines.companyId, scope.companyId), eq(billLines.statementId, statementId)));

export async function matchesOf(scope: Scope, statementId: string): Promise<StoredMatch[]> {
  return scope.handle
    .select()
    .from(matches)
    .where(
      and(
        eq(matches.companyId, scope.companyId),
        inArray(matches.billLineId, linesOf(scope, statementId)),
      ),
    )
    .orderBy(asc(matches.createdAt), asc(matches.id));
}

export type NewMatch = Omit<typeof matches.$inferInsert, 'companyId' | 'id' | 'createdAt'>;

/** Puts the engine's ties in the place of its earlier ones; people's own are left alone. */
export async function replaceEngineMatches(
  scope: Scope,
  statementId: string,
  values: readonly NewMatch[],
): Promise<void> {
  await scope.handle
    .delete(matches)
    .where(
      and(
        eq(matches.companyId, scope.companyId),
        ne(matches.method, 'hand'),
        inArray(matches.billLineId, linesOf(scope, statementId)),
      ),
    );
  await insertMatches(scope, values);
}

export async function insertMatches(scope: Scope, values: readonly NewMatch[]): Promise<void> {
  for (let at = 0; at < values.length; at += 1000) {
    await scope.handle.insert(matches).values(
      values.slice(at, at + 1000).map((value) => ({
        ...value,
        companyId: scope.companyId,
        id: newId<'match'>(),
      })),
    );
  }
}

/** Takes all ties of one line away, a person's own too. */
export async function deleteMatchesOfLine(scope: Scope, billLineId: string): Promise<void> {
  await scope.handle
    .delete(matches)
    .where(and(eq(matches.companyId, scope.companyId), eq(matches.billLineId, billLineId)));
}

/** The last thing that a person did on a sheet: rows settled at one stroke, or a line tied. */
export async function lastDoneBy(
  scope: Scope,
  statementId: string,
  personId: string,
): Promise<
  { kind: 'settled'; rowKeys: string[] } | { kind: 'matched'; billLineId: string } | null
> {
  const [strike] = await scope.handle
    .select({ at: sql<string>`${strikes.createdAt}::text` })
    .from(strikes)
    .where(
      and(
        eq(strikes.companyId, scope.companyId),
        eq(strikes.statementId, statementId),
        eq(strikes.madeBy, personId),
      ),
    )
    .orderBy(desc(strikes.createdAt))
    .limit(1);
  const [match] = await scope.handle
    .select({ at: sql<string>`${matches.createdAt}::text`, billLineId: matches.billLineId })
    .from(matches)
    .where(
      and(
        eq(matches.companyId, scope.companyId),
        eq(matches.method, 'hand'),
        eq(matches.madeBy, personId),
        inArray(matches.billLineId, linesOf(scope, statementId)),
      ),
    )
    .orderBy(desc(matches.createdAt), desc(matches.id))
    .limit(1);
  if (match && (!strike || match.at > strike.at)) {
    return { kind: 'matched', billLineId: match.billLineId };
  }
  if (!strike) return null;
  const rows = await scope.handle
    .select({ rowKey: strikes.rowKey })
    .from(strikes)
    .where(
      and(
        eq(strikes.companyId, scope.companyId),
        eq(strikes.statementId, statementId),
        eq(strikes.madeBy, personId),
        sql`${strikes.createdAt} = ${strike.at}::timestamptz`,
      ),
    );
  return { kind: 'settled', rowKeys: rows.map((row) => row.rowKey) };
}

export type StoredVariance = typeof variances.$inferSelect;

export async function variancesOf(scope: Scope, statementId: string): Promise<StoredVariance[]> {
  return scope.handle
    .select()
    .from(variances)
    .where(and(eq(variances.companyId, scope.companyId), eq(variances.statementId, statementId)))
    .orderBy(asc(variances.key));
}

export type VarianceValues = Omit<StoredVariance, 'companyId' | 'id' | 'createdAt'>;

export async function insertVariance(scope: Scope, values: VarianceValues): Promise<void> {
  await scope.handle
    .insert(variances)
    .values({ ...values, companyId: scope.companyId, id: newId<'variance'>() });
}

export async function updateVariance(
  scope: Scope,
  id: string,
  values: Partial<VarianceValues>,
): Promise<void> {
  await scope.handle
    .update(variances)
    .set(values)
    .where(and(eq(variances.companyId, scope.companyId), eq(variances.id, id)));
}
