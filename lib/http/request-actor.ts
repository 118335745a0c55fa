import { and, eq, isNull } from 'drizzle-orm';
import { cookies } from 'next/headers';
import { openStore } from '../../db/client';
import { accessKeys } from '../../db/schema/people';
import type { Actor } from '../auth/actor';
import { actorOfPerson, actorOfSession, SESSION_COOKIE } from '../auth/session';
import { hashToken } from '../auth/tokens';
import { systemClock } from '../clock';
import type { PersonId } from '../domain/ids';

/** The person whose session cookie came with the current request, or null. */
export async function sessionActor(): Promise<Actor | null> {
  const token = (await cookies()).get(SESSION_COOKIE)?.value;
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
    .select({ id: accessKeys.id, name: accessKeys.name, createdBy: accessKeys.createdBy })
    .from(accessKeys)
    .where(and(eq(accessKeys.tokenHash, hashToken(key)), isNull(accessKeys.revokedAt)));
  if (!row) return null;
  const actor = await actorOfPerson(handle, row.createdBy as PersonId, 'accessKey');
  if (!actor) return null;
  await handle
    .update(accessKeys)
    .set({ lastUsedAt: systemClock.now() })
    .where(eq(accessKeys.id, row.id));
  return { ...actor, name: row.name, role: 'bookkeeper' };
}
