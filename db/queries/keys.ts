import { and, desc, eq, isNull } from 'drizzle-orm';
import type { KeyRow } from '../../lib/contracts/keys';
import { accessKeys, people } from '../schema/people';
import type { Scope } from '../tx';

async function selectKeys(scope: Scope, keyId: string | null): Promise<KeyRow[]> {
  const rows = await scope.handle
    .select({
      id: accessKeys.id,
      name: accessKeys.name,
      lastFour: accessKeys.lastFour,
      issuedBy: people.name,
      issuedAt: accessKeys.createdAt,
      lastUsedAt: accessKeys.lastUsedAt,
      revokedAt: accessKeys.revokedAt,
    })
    .from(accessKeys)
    .innerJoin(
      people,
      and(eq(people.companyId, accessKeys.companyId), eq(people.id, accessKeys.createdBy)),
    )
    .where(
      and(
        eq(accessKeys.companyId, scope.companyId),
        keyId === null ? undefined : eq(accessKeys.id, keyId),
      ),
    )
    .orderBy(desc(accessKeys.createdAt), desc(accessKeys.id));
  return rows.map((row) => ({
    ...row,
    issuedAt: row.issuedAt.toISOString(),
    lastUsedAt: row.lastUsedAt?.toISOString() ?? null,
    revokedAt: row.revokedAt?.toISOString() ?? null,
  }));
}

/** All keys ever issued, newest first: a revoked one stays to be seen. */
export function listKeys(scope: Scope): Promise<KeyRow[]> {
  return selectKeys(scope, null);
}

export async function findKey(scope: Scope, keyId: string): Promise<KeyRow | null> {
  return (await selectKeys(scope, keyId))[0] ?? null;
}

export async function insertKey(
  scope: Scope,
  values: Omit<typeof accessKeys.$inferInsert, 'companyId'>,
): Promise<void> {
  await scope.handle.insert(accessKeys).values({ ...values, companyId: scope.companyId });
}

export async function revokeKey(scope: Scope, keyId: string, at: Date): Promise<void> {
  await scope.handle
    .update(accessKeys)
    .set({ revokedAt: at })
    .where(
      and(
        eq(accessKeys.companyId, scope.companyId),
        eq(accessKeys.id, keyId),
        isNull(accessKeys.revokedAt),
      ),
    );
}

/** A key acts for whoever issued it, so it ends with that person's ownership. */
export async function revokeKeysOf(scope: Scope, personId: string, at: Date): Promise<number> {
  const revoked = await scope.handle
    .update(accessKeys)
    .set({ revokedAt: at })
    .where(
      and(
        eq(accessKeys.companyId, scope.companyId),
        eq(accessKeys.createdBy, personId),
        isNull(accessKeys.revokedAt),
      ),
    )
    .returning({ id: accessKeys.id });
  return revoked.length;
}
