import { boolean, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { moment } from './columns';

export type StoredTolerances = Record<string, { absolute: string; percent: string }>;

export const companies = pgTable('companies', {
  id: uuid('id').primaryKey(),
  name: text('name').notNull(),
  timeZone: text('time_zone').notNull(),
  clock: text('clock', { enum: ['12', '24'] })
    .notNull()
    .default('12'),
  foremenSeePrices: boolean('foremen_see_prices').notNull().default(false),
  foremenSeeAllJobs: boolean('foremen_see_all_jobs').notNull().default(false),
  tolerances: jsonb('tolerances').$type<StoredTolerances>().notNull().default({}),
  isDemo: boolean('is_demo').notNull().default(false),
  createdAt: moment('created_at').notNull().defaultNow(),
});
