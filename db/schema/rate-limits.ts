import { integer, pgTable, text } from 'drizzle-orm/pg-core';
import { moment } from './columns';

/** Attempts counted against an account or an address. In the database, so a restart forgets none. */
export const rateLimits = pgTable('rate_limits', {
  key: text('key').primaryKey(),
  points: integer('points').notNull(),
  expire: moment('expire'),
});
