import { and, asc, eq, gt, isNull } from 'drizzle-orm';
import type { CompanyId, PersonId } from '../../lib/domain/ids';
import type { Handle } from '../client';
import { companies } from '../schema/companies';
import { invitations, passwordResets, people } from '../schema/people';

/**
 * The only queries without a company: whoever signs in, accepts or resets has none yet. Each
 * finds its row by an address or by the hash of a secret, never by an id from outside.
 */
export interface FoundAccount {
  readonly personId: PersonId;
  readonly companyId: CompanyId;
  readonly companyName: string;
  readonly name: string;
  readonly email: string;
  readonly passwordHash: string;
}

/** The account that signs in with `email`; people who were removed have none. */
export async function findAccount(handle: Handle, email: string): Promise<FoundAccount | null> {
  const [row] = await handle
    .select({
      personId: people.id,
      companyId: people.companyId,
      companyName: companies.name,
      name: people.name,
      email: people.email,
      passwordHash: people.passwordHash,
    })
    .from(people)
    .innerJoin(companies, eq(companies.id, people.companyId))
    .where(and(eq(people.email, email), isNull(people.removedAt)));
  return row ? (row as FoundAccount) : null;
}

export async function insertCompany(
  handle: Handle,
  values: typeof companies.$inferInsert,
): Promise<void> {
  await handle.insert(companies).values(values);
}

export async function insertPerson(
  handle: Handle,
  values: typeof people.$inferInsert,
): Promise<void> {
  await handle.insert(people).values(values);
}

/** A reset link replaces the person's earlier ones. */
export async function replacePasswordReset(
  handle: Handle,
  personId: PersonId,
  tokenHash: string,
  expiresAt: Date,
): Promise<void> {
  await handle.delete(passwordResets).where(eq(passwordResets.personId, personId));
  await handle.insert(passwordResets).values({ personId, tokenHash, expiresAt });
}

function liveReset(tokenHash: string, now: Date) {
  return and(
    eq(passwordResets.tokenHash, tokenHash),
    isNull(passwordResets.usedAt),
    gt(passwordResets.expiresAt, now),
  );
}

/** Whose password a live reset link changes, or null. */
export async function findPasswordReset(
  handle: Handle,
  tokenHash: string,
  now: Date,
): Promise<FoundAccount | null> {
  const [row] = await handle
    .select({
      personId: people.id,
      companyId: people.companyId,
      companyName: companies.name,
      name: people.name,
      email: people.email,
      passwordHash: people.passwordHash,
    })
    .from(passwordResets)
    .innerJoin(people, eq(people.id, passwordResets.personId))
    .innerJoin(companies, eq(companies.id, people.companyId))
    .where(and(liveReset(tokenHash, now), isNull(people.removedAt)));
  return row ? (row as FoundAccount) : null;
}

/** Uses a reset link up; false when someone was faster or it is over. */
export async function spendPasswordReset(
  handle: Handle,
  tokenHash: string,
  now: Date,
): Promise<boolean> {
  const used = await handle
    .update(passwordResets)
    .set({ usedAt: now })
    .where(liveReset(tokenHash, now))
    .returning({ tokenHash: passwordResets.tokenHash });
  return used.length === 1;
}

export async function setPassword(
  handle: Handle,
  personId: PersonId,
  passwordHash: string,
): Promise<void> {
  await handle.update(people).set({ passwordHash }).where(eq(people.id, personId));
  await handle.delete(passwordResets).where(eq(passwordResets.personId, personId));
}

export interface FoundInvitation {
  readonly id: string;
  readonly companyId: CompanyId;
  readonly companyName: string;
  readonly email: string;
  readonly name: string;
  readonly role: 'owner' | 'bookkeeper' | 'foreman';
  readonly expiresAt: Date;
}

function liveInvitation(tokenHash: string, now: Date) {
  return and(
    eq(invitations.tokenHash, tokenHash),
    isNull(invitations.acceptedAt),
    isNull(invitations.withdrawnAt),
    gt(invitations.expiresAt, now),
  );
}

/** A live invitation by its link's token, or null. */
export async function findInvitation(
  handle: Handle,
  tokenHash: string,
  now: Date,
): Promise<FoundInvitation | null> {
  const [row] = await handle
    .select({
      id: invitations.id,
      companyId: invitations.companyId,
      companyName: companies.name,
      email: invitations.email,
      name: invitations.name,
      role: invitations.role,
      expiresAt: invitations.expiresAt,
    })
    .from(invitations)
    .innerJoin(companies, eq(companies.id, invitations.companyId))
    .where(liveInvitation(tokenHash, now));
  return row ? (row as FoundInvitation) : null;
}

/** Uses an invitation up; false when someone was faster or it is over. */
export async function spendInvitation(
  handle: Handle,
  tokenHash: string,
  now: Date,
): Promise<boolean> {
  const used = await handle
    .update(invitations)
    .set({ acceptedAt: now })
    .where(liveInvitation(tokenHash, now))
    .returning({ id: invitations.id });
  return used.length === 1;
}

/** Lets someone who was removed from the company come back under the same records. */
export async function reinstate(
  handle: Handle,
  companyId: CompanyId,
  email: string,
  values: { name: string; role: FoundInvitation['role']; passwordHash: string },
): Promise<PersonId | null> {
  const [row] = await handle
    .select({ id: people.id })
    .from(people)
    .where(and(eq(people.companyId, companyId), eq(people.email, email)))
    .limit(1);
  if (!row) return null;
  await handle
    .update(people)
    .set({ ...values, removedAt: null })
    .where(eq(people.id, row.id));
  return row.id as PersonId;
}

/** The demo company and its people, or null when there is none. */
export async function findDemo(handle: Handle): Promise<{
  companyName: string;
  people: { name: string; email: string; role: string }[];
} | null> {
  const rows = await handle
    .select({
      companyName: companies.name,
      name: people.name,
      email: people.email,
      role: people.role,
    })
    .from(companies)
    .innerJoin(people, eq(people.companyId, companies.id))
    .where(and(eq(companies.isDemo, true), isNull(people.removedAt)))
    .orderBy(asc(people.createdAt), asc(people.email));
  const [first] = rows;
  if (!first) return null;
  return {
    companyName: first.companyName,
    people: rows.map(({ name, email, role }) => ({ name, email, role })),
  };
}
