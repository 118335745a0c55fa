import { sql } from 'drizzle-orm';
import { foreignKey, index, pgTable, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { companyRecord, moment } from './columns';
import { companies } from './companies';

export const ROLES = ['owner', 'bookkeeper', 'foreman'] as const;

export const people = pgTable(
  'people',
  {
    ...companyRecord(),
    email: text('email').notNull(),
    name: text('name').notNull(),
    role: text('role', { enum: ROLES }).notNull(),
    locale: text('locale', { enum: ['en', 'es'] })
      .notNull()
      .default('en'),
    passwordHash: text('password_hash').notNull(),
    removedAt: moment('removed_at'),
  },
  (t) => [
    unique('people_company_id').on(t.companyId, t.id),
    // One account for an address; a person who was removed may be invited again.
    uniqueIndex('people_email').on(t.email).where(sql`removed_at is null`),
    foreignKey({ columns: [t.companyId], foreignColumns: [companies.id] }),
  ],
);

/** The id is the hash of the token in the cookie; the token itself is stored nowhere. */
export const sessions = pgTable(
  'sessions',
  {
    id: text('id').primaryKey(),
    userId: uuid('user_id')
      .notNull()
      .references(() => people.id),
    expiresAt: moment('expires_at').notNull(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (t) => [index('sessions_user').on(t.userId)],
);

export const passwordResets = pgTable('password_resets', {
  tokenHash: text('token_hash').primaryKey(),
  personId: uuid('person_id')
    .notNull()
    .references(() => people.id),
  expiresAt: moment('expires_at').notNull(),
  usedAt: moment('used_at'),
});

export const invitations = pgTable(
  'invitations',
  {
    ...companyRecord(),
    email: text('email').notNull(),
    name: text('name').notNull(),
    role: text('role', { enum: ROLES }).notNull(),
    tokenHash: text('token_hash').notNull().unique(),
    expiresAt: moment('expires_at').notNull(),
    acceptedAt: moment('accepted_at'),
    withdrawnAt: moment('withdrawn_at'),
    invitedBy: uuid('invited_by').notNull(),
  },
  (t) => [
    unique('invitations_company_id').on(t.companyId, t.id),
    foreignKey({
      columns: [t.companyId, t.invitedBy],
      foreignColumns: [people.companyId, people.id],
    }),
  ],
);

/** Keys for scripts; they act with the bookkeeper's permissions. */
export const accessKeys = pgTable(
  'access_keys',
  {
    ...companyRecord(),
    name: text('name').notNull(),
    tokenHash: text('token_hash').notNull().unique(),
    lastFour: text('last_four').notNull(),
    createdBy: uuid('created_by').notNull(),
    lastUsedAt: moment('last_used_at'),
    revokedAt: moment('revoked_at'),
  },
  (t) => [
    unique('access_keys_company_id').on(t.companyId, t.id),
    foreignKey({
      columns: [t.companyId, t.createdBy],
      foreignColumns: [people.companyId, people.id],
    }),
  ],
);
