import {
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { companyRecord, moment } from './columns';
import { companies } from './companies';

/** Who changed what, when, and what it was before. Rows are only ever added. */
export const activity = pgTable(
  'activity',
  {
    ...companyRecord(),
    at: moment('at').notNull(),
    /** Null where the product itself acted (a reading finished, an outside link was used). */
    actorId: uuid('actor_id'),
    actorName: text('actor_name').notNull(),
    action: text('action').notNull(),
    entity: text('entity').notNull(),
    entityId: uuid('entity_id').notNull(),
    summary: text('summary').notNull(),
    before: jsonb('before'),
    after: jsonb('after'),
  },
  (t) => [
    unique('activity_company_id').on(t.companyId, t.id),
    foreignKey({ columns: [t.companyId], foreignColumns: [companies.id] }),
    index('activity_at').on(t.companyId, t.at),
    index('activity_entity').on(t.companyId, t.entity, t.entityId),
  ],
);

/** Mail as written: sent through the mail service, or kept here where none is configured. */
export const outbox = pgTable(
  'outbox',
  {
    ...companyRecord(),
    kind: text('kind').notNull(),
    to: text('to').notNull(),
    subject: text('subject').notNull(),
    text: text('text').notNull(),
    sentAt: moment('sent_at'),
    providerId: text('provider_id'),
    error: text('error'),
  },
  (t) => [
    unique('outbox_company_id').on(t.companyId, t.id),
    foreignKey({ columns: [t.companyId], foreignColumns: [companies.id] }),
    index('outbox_created').on(t.companyId, t.createdAt),
  ],
);

export const WORK_STATES = ['waiting', 'running', 'done', 'failed'] as const;

/** Long work, done off the request path by the one worker; a lease that runs out is taken again. */
export const workItems = pgTable(
  'work_items',
  {
    ...companyRecord(),
    kind: text('kind', { enum: ['readPhoto', 'sendMail'] }).notNull(),
    subjectId: uuid('subject_id').notNull(),
    state: text('state', { enum: WORK_STATES }).notNull().default('waiting'),
    attempts: integer('attempts').notNull().default(0),
    runAfter: moment('run_after').notNull(),
    leaseUntil: moment('lease_until'),
    lastError: text('last_error'),
    finishedAt: moment('finished_at'),
  },
  (t) => [
    unique('work_items_company_id').on(t.companyId, t.id),
    unique('work_items_once').on(t.kind, t.subjectId),
    foreignKey({ columns: [t.companyId], foreignColumns: [companies.id] }),
    index('work_items_next').on(t.state, t.runAfter),
  ],
);
