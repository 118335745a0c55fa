import {
  boolean,
  date,
  foreignKey,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import type { Clause } from '../../lib/domain/rating/clauses';
import { companyRecord, moment } from './columns';
import { companies } from './companies';
import { jobs } from './jobs';

export const SUPPLIER_KINDS = ['readyMix', 'pump', 'material'] as const;

export const suppliers = pgTable(
  'suppliers',
  {
    ...companyRecord(),
    name: text('name').notNull(),
    kind: text('kind', { enum: SUPPLIER_KINDS }).notNull(),
    dispatchEmail: text('dispatch_email').notNull().default(''),
    creditEmail: text('credit_email').notNull().default(''),
    phone: text('phone').notNull().default(''),
    accountNumber: text('account_number').notNull().default(''),
    archived: boolean('archived').notNull().default(false),
  },
  (t) => [
    unique('suppliers_company_id').on(t.companyId, t.id),
    unique('suppliers_name').on(t.companyId, t.name),
    foreignKey({ columns: [t.companyId], foreignColumns: [companies.id] }),
  ],
);

/**
 * One version of what a supplier agreed to charge. Approved versions are never edited, only
 * superseded by a later one.
 */
export const rateSheets = pgTable(
  'rate_sheets',
  {
    ...companyRecord(),
    supplierId: uuid('supplier_id').notNull(),
    jobId: uuid('job_id'),
    name: text('name').notNull(),
    version: integer('version').notNull(),
    status: text('status', { enum: ['draft', 'approved'] })
      .notNull()
      .default('draft'),
    effectiveFrom: date('effective_from').notNull(),
    effectiveTo: date('effective_to'),
    approvedBy: uuid('approved_by'),
    approvedAt: moment('approved_at'),
  },
  (t) => [
    unique('rate_sheets_company_id').on(t.companyId, t.id),
    foreignKey({
      columns: [t.companyId, t.supplierId],
      foreignColumns: [suppliers.companyId, suppliers.id],
    }),
    foreignKey({ columns: [t.companyId, t.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
  ],
);

export const rateClauses = pgTable(
  'rate_clauses',
  {
    ...companyRecord(),
    rateSheetId: uuid('rate_sheet_id').notNull(),
    position: integer('position').notNull(),
    clause: jsonb('clause').$type<Clause>().notNull(),
  },
  (t) => [
    unique('rate_clauses_company_id').on(t.companyId, t.id),
    unique('rate_clauses_position').on(t.companyId, t.rateSheetId, t.position),
    foreignKey({
      columns: [t.companyId, t.rateSheetId],
      foreignColumns: [rateSheets.companyId, rateSheets.id],
    }),
  ],
);
