import { and, eq, isNull } from 'drizzle-orm';
import { cookies } from 'next/headers';
import type { Handle } from '../../db/client';
import { openStore } from '../../db/client';
import { accessKeys } from '../../db/schema/people';
import type { Actor } from '../auth/actor';
import { sessionCookieName } from '../auth/cookie';
import { actorOfPerson, actorOfSession } from '../auth/session';
import { hashToken } from '../auth/tokens';
import { systemClock } from '../clock';
import type { PersonId } from '../domain/ids';
import { readEnv } from '../env';

/** The token in the current request's session cookie, or null. */
export async function sessionToken(): Promise<string | null> {
  return (await cookies()).get(sessionCookieName(readEnv().appOrigin))?.value || null;
}

/** The person whose session cookie came with the current request, or null. */
export async function sessionActor(): Promise<Actor | null> {
  const token = await sessionToken();
  if (!token) return null;
  const { handle } = await openStore();
  return actorOfSession(handle, token, systemClock.now());
}

/** The script behind `Authorization: Bearer KEY`, or null. Acts as the bookkeeper, never more. */
export async function accessKeyActor(authorization: string): Promise<Actor | null> {
  const key = /^Bearer ([A-Za-z0-9_-]{20,200})$/.exec(authorization)?.[1];
  if (!key) return null;
  const { handle } = await openStore();
  const [row] = await handle
    .select({
      id: accessKeys.id,
      name: accessKeys.name,
      createdBy: accessKeys.createdBy,
      lastUsedAt: accessKeys.lastUsedAt,
    })
    .from(accessKeys)
    .where(and(eq(accessKeys.tokenHash, hashToken(key)), isNull(accessKeys.revokedAt)));
  if (!row) return null;
  const actor = await actorOfPerson(handle, row.createdBy as PersonId, 'accessKey');
  if (!actor) return null;
  await noteUse(handle, row.id, row.lastUsedAt);
  return { ...actor, name: row.name, role: 'bookkeeper' };
}

const USE_NOTED_EVERY_MS = 60_000;

/** Notes a key's use at most once a minute, so that a busy script does not write on every call. */
async function noteUse(handle: Handle, keyId: string, lastUsedAt: Date | null): Promise<void> {
  const now = systemClock.now();
  if (lastUsedAt && now.getTime() - lastUsedAt.getTime() < USE_NOTED_EVERY_MS) return;
  await handle.update(accessKeys).set({ lastUsedAt: now }).where(eq(accessKeys.id, keyId));
}
