import { and, asc, eq, isNull, ne } from 'drizzle-orm';
import type { InvitationRow, PersonRow } from '../../lib/contracts/people';
import { invitations, people } from '../schema/people';
import type { Scope } from '../tx';

type Role = PersonRow['role'];
export type StoredPerson = Omit<PersonRow, 'isYou'>;

const personColumns = {
  id: people.id,
  name: people.name,
  email: people.email,
  role: people.role,
  locale: people.locale,
  joinedAt: people.createdAt,
};

function present(scope: Scope) {
  return and(eq(people.companyId, scope.companyId), isNull(people.removedAt));
}

/** The people who work in the company now. */
export async function listPeople(scope: Scope): Promise<StoredPerson[]> {
  const rows = await scope.handle
    .select(personColumns)
    .from(people)
    .where(present(scope))
    .orderBy(asc(people.name), asc(people.id));
  return rows.map((row) => ({ ...row, joinedAt: row.joinedAt.toISOString() }));
}

export async function findPerson(scope: Scope, personId: string): Promise<StoredPerson | null> {
  const [row] = await scope.handle
    .select(personColumns)
    .from(people)
    .where(and(present(scope), eq(people.id, personId)));
  return row ? { ...row, joinedAt: row.joinedAt.toISOString() } : null;
}

export async function isColleague(scope: Scope, email: string): Promise<boolean> {
  const rows = await scope.handle
    .select({ id: people.id })
    .from(people)
    .where(and(present(scope), eq(people.email, email)));
  return rows.length > 0;
}

/**
 * How many owners there are besides `personId`. Their rows stay locked until the transaction
 * ends, so that two owners can't take each other's role away at the same moment.
 */
export async function countOtherOwners(scope: Scope, personId: string): Promise<number> {
  const owners = await scope.handle
    .select({ id: people.id })
    .from(people)
    .where(and(present(scope), eq(people.role, 'owner')))
    .orderBy(asc(people.id))
    .for('update');
  return owners.filter((owner) => owner.id !== personId).length;
}

export async function setRole(scope: Scope, personId: string, role: Role): Promise<void> {
  await scope.handle
    .update(people)
    .set({ role })
    .where(and(present(scope), eq(people.id, personId)));
}

export async function markRemoved(scope: Scope, personId: string, at: Date): Promise<void> {
  await scope.handle
    .update(people)
    .set({ removedAt: at })
    .where(and(present(scope), eq(people.id, personId)));
}

export async function updateOwnPerson(
  scope: Scope,
  personId: string,
  values: { name: string; locale: PersonRow['locale'] },
): Promise<void> {
  await scope.handle
    .update(people)
    .set(values)
    .where(and(present(scope), eq(people.id, personId)));
}

export async function findPasswordHash(scope: Scope, personId: string): Promise<string | null> {
  const [row] = await scope.handle
    .select({ passwordHash: people.passwordHash })
    .from(people)
    .where(and(present(scope), eq(people.id, personId)));
  return row?.passwordHash ?? null;
}

function unanswered(scope: Scope) {
  return and(
    eq(invitations.companyId, scope.companyId),
    isNull(invitations.acceptedAt),
    isNull(invitations.withdrawnAt),
  );
}

/** Invitations that wait for an answer, or waited too long. */
export async function listInvitations(scope: Scope, now: Date): Promise<InvitationRow[]> {
  const rows = await scope.handle
    .select({
      id: invitations.id,
      email: invitations.email,
      name: invitations.name,
      role: invitations.role,
      invitedBy: people.name,
      invitedAt: invitations.createdAt,
      expiresAt: invitations.expiresAt,
    })
    .from(invitations)
    .innerJoin(
      people,
      and(eq(people.companyId, invitations.companyId), eq(people.id, invitations.invitedBy)),
    )
    .where(unanswered(scope))
    .orderBy(asc(invitations.createdAt), asc(invitations.id));
  return rows.map((row) => ({
    ...row,
    state: row.expiresAt > now ? ('open' as const) : ('expired' as const),
    invitedAt: row.invitedAt.toISOString(),
    expiresAt: row.expiresAt.toISOString(),
  }));
}

export async function insertInvitation(
  scope: Scope,
  values: Omit<typeof invitations.$inferInsert, 'companyId'>,
): Promise<void> {
  await scope.handle.insert(invitations).values({ ...values, companyId: scope.companyId });
}

/** Ends earlier invitations of the same address: only the newest link works. */
export async function withdrawEarlier(
  scope: Scope,
  email: string,
  newestId: string,
  at: Date,
): Promise<void> {
  await scope.handle
    .update(invitations)
    .set({ withdrawnAt: at })
    .where(and(unanswered(scope), eq(invitations.email, email), ne(invitations.id, newestId)));
}

/** Withdraws an unanswered invitation; what it was for, or null when there is none. */
export async function withdrawInvitation(
  scope: Scope,
  invitationId: string,
  at: Date,
): Promise<{ email: string; name: string; role: Role } | null> {
  const [row] = await scope.handle
    .update(invitations)
    .set({ withdrawnAt: at })
    .where(and(unanswered(scope), eq(invitations.id, invitationId)))
    .returning({ email: invitations.email, name: invitations.name, role: invitations.role });
  return row ?? null;
}

/** The foremen who work in the company now: who can be put on a job. */
export async function foremenOf(scope: Scope): Promise<{ id: string; name: string }[]> {
  return scope.handle
    .select({ id: people.id, name: people.name })
    .from(people)
    .where(and(present(scope), eq(people.role, 'foreman')))
    .orderBy(asc(people.name), asc(people.id));
}
