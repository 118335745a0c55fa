import { DrizzlePostgreSQLAdapter } from '@lucia-auth/adapter-drizzle';
import { and, asc, eq, gt, ne } from 'drizzle-orm';
import { Lucia, TimeSpan } from 'lucia';
import type { Handle } from '../../db/client';
import { companies } from '../../db/schema/companies';
import { people, sessions } from '../../db/schema/people';
import type { CompanyId, PersonId } from '../domain/ids';
import type { Actor } from './actor';
import { SESSION_LIFE_MS } from './cookie';
import { hashToken, newToken } from './tokens';

const SLIDING = new TimeSpan(14, 'd');

declare module 'lucia' {
  interface Register {
    Lucia: Lucia;
    DatabaseSessionAttributes: { createdAt: Date };
  }
}

/** Lucia keeps its session's id in the cookie; here the id is the token's hash instead. */
function luciaFor(handle: Handle) {
  const adapter = new DrizzlePostgreSQLAdapter(
    handle as unknown as ConstructorParameters<typeof DrizzlePostgreSQLAdapter>[0],
    sessions as unknown as ConstructorParameters<typeof DrizzlePostgreSQLAdapter>[1],
    people as unknown as ConstructorParameters<typeof DrizzlePostgreSQLAdapter>[2],
  );
  return new Lucia(adapter, {
    sessionExpiresIn: SLIDING,
    getSessionAttributes: (row) => ({ createdAt: row.createdAt }),
  });
}

/** Starts a session and returns the token for the cookie; it is stored nowhere. */
export async function startSession(handle: Handle, personId: PersonId, now: Date): Promise<string> {
  const token = newToken();
  await luciaFor(handle).createSession(
    personId,
    { createdAt: now },
    { sessionId: hashToken(token) },
  );
  return token;
}

/**
 * The person behind a cookie's token, or null. Role and removal are read afresh every time; the
 * sliding limit moves on with use, the absolute one does not.
 */
export async function actorOfSession(
  handle: Handle,
  token: string,
  now: Date,
): Promise<Actor | null> {
  const lucia = luciaFor(handle);
  const { session, user } = await lucia.validateSession(hashToken(token));
  if (!session || !user) return null;
  const startedAt = (session as unknown as { createdAt: Date }).createdAt;
  if (now.getTime() - startedAt.getTime() > SESSION_LIFE_MS) {
    await lucia.invalidateSession(session.id);
    return null;
  }
  return actorOfPerson(handle, user.id as PersonId, 'session', session.id);
}

export async function actorOfPerson(
  handle: Handle,
  personId: PersonId,
  via: Actor['via'],
  sessionId: string | null = null,
): Promise<Actor | null> {
  const [row] = await handle
    .select({ person: people, company: companies })
    .from(people)
    .innerJoin(companies, eq(people.companyId, companies.id))
    .where(eq(people.id, personId));
  if (!row || row.person.removedAt) return null;
  const isOffice = row.person.role !== 'foreman';
  return {
    personId: row.person.id as PersonId,
    companyId: row.person.companyId as CompanyId,
    name: row.person.name,
    email: row.person.email,
    role: row.person.role,
    locale: row.person.locale,
    seesPrices: isOffice || row.company.foremenSeePrices,
    seesAllJobs: isOffice || row.company.foremenSeeAllJobs,
    via,
    sessionId,
  };
}

export async function endSession(handle: Handle, token: string): Promise<void> {
  await luciaFor(handle).invalidateSession(hashToken(token));
}

/** After a password reset, a role change or a removal: every device signs in again. */
export async function endAllSessions(handle: Handle, personId: PersonId): Promise<void> {
  await luciaFor(handle).invalidateUserSessions(personId);
}

/** Ends all of a person's sessions but one; how many they were. */
export async function endOtherSessions(
  handle: Handle,
  personId: PersonId,
  keptSessionId: string,
): Promise<number> {
  const ended = await handle
    .delete(sessions)
    .where(and(eq(sessions.userId, personId), ne(sessions.id, keptSessionId)))
    .returning({ id: sessions.id });
  return ended.length;
}

/** A person's live sessions, oldest first. Lucia's own clock decides which live. */
export async function sessionsOf(
  handle: Handle,
  personId: PersonId,
): Promise<{ id: string; startedAt: Date; expiresAt: Date }[]> {
  return handle
    .select({ id: sessions.id, startedAt: sessions.createdAt, expiresAt: sessions.expiresAt })
    .from(sessions)
    .where(and(eq(sessions.userId, personId), gt(sessions.expiresAt, new Date())))
    .orderBy(asc(sessions.createdAt), asc(sessions.id));
}
