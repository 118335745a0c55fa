import { DrizzlePostgreSQLAdapter } from '@lucia-auth/adapter-drizzle';
import { eq } from 'drizzle-orm';
import { Lucia, TimeSpan } from 'lucia';
import type { Handle } from '../../db/client';
import { companies } from '../../db/schema/companies';
import { people, sessions } from '../../db/schema/people';
import type { CompanyId, PersonId } from '../domain/ids';
import type { Actor } from './actor';
import { hashToken, newToken } from './tokens';

export const SESSION_COOKIE = 'strikeoff_session';
const SLIDING = new TimeSpan(14, 'd');
const ABSOLUTE_MS = 90 * 24 * 60 * 60 * 1000;

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

/** Starts a session and returns the token for the cookie. */
export async function startSession(
  handle: Handle,
  personId: PersonId,
  now: Date,
): Promise<{ token: string; expiresAt: Date }> {
  const token = newToken();
  const session = await luciaFor(handle).createSession(
    personId,
    { createdAt: now },
    { sessionId: hashToken(token) },
  );
  return { token, expiresAt: session.expiresAt };
}

/** The person behind a cookie's token, or null. Role and removal are read afresh every time. */
export async function actorOfSession(
  handle: Handle,
  token: string,
  now: Date,
): Promise<Actor | null> {
  const lucia = luciaFor(handle);
  const { session, user } = await lucia.validateSession(hashToken(token));
  if (!session || !user) return null;
  const startedAt = (session as unknown as { createdAt: Date }).createdAt;
  if (now.getTime() - startedAt.getTime() > ABSOLUTE_MS) {
    await lucia.invalidateSession(session.id);
    return null;
  }
  return actorOfPerson(handle, user.id as PersonId, 'session');
}

export async function actorOfPerson(
  handle: Handle,
  personId: PersonId,
  via: Actor['via'],
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
  };
}

export async function endSession(handle: Handle, token: string): Promise<void> {
  await luciaFor(handle).invalidateSession(hashToken(token));
}

/** After a password change, a role change or a removal: every device signs in again. */
export async function endAllSessions(handle: Handle, personId: PersonId): Promise<void> {
  await luciaFor(handle).invalidateUserSessions(personId);
}
