import { numeric, timestamp, uuid } from 'drizzle-orm/pg-core';

/** Columns that every table of a company's records has. */
export const companyRecord = () => ({
  companyId: uuid('company_id').notNull(),
  id: uuid('id').primaryKey(),
  createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
});

/** Dollars and cents, up to ten billion. */
export const dollars = (name: string) => numeric(name, { precision: 14, scale: 2 });
/** Yards, hours, minutes or pieces, to two places. */
export const quantity = (name: string) => numeric(name, { precision: 14, scale: 2 });
/** A unit price: suppliers quote up to four places. */
export const unitPrice = (name: string) => numeric(name, { precision: 14, scale: 4 });

export const moment = (name: string) => timestamp(name, { withTimezone: true });
