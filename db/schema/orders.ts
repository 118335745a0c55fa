import {
  date,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { companyRecord, moment, quantity } from './columns';
import { jobs, placements } from './jobs';
import { suppliers } from './suppliers';

export const ORDER_STATUSES = ['draft', 'sent', 'confirmed', 'cancelled'] as const;

export const orders = pgTable(
  'orders',
  {
    ...companyRecord(),
    number: text('number').notNull(),
    supplierId: uuid('supplier_id').notNull(),
    jobId: uuid('job_id').notNull(),
    placementId: uuid('placement_id'),
    status: text('status', { enum: ORDER_STATUSES }).notNull().default('draft'),
    pourDate: date('pour_date').notNull(),
    firstTruckAt: integer('first_truck_at'),
    spacingMinutes: integer('spacing_minutes'),
    notes: text('notes').notNull().default(''),
    /** The supplier's own number for the order, once it is confirmed. */
    supplierReference: text('supplier_reference').notNull().default(''),
    version: integer('version').notNull().default(1),
    sentAt: moment('sent_at'),
    confirmedAt: moment('confirmed_at'),
    cancelledAt: moment('cancelled_at'),
  },
  (t) => [
    unique('orders_company_id').on(t.companyId, t.id),
    unique('orders_number').on(t.companyId, t.number),
    foreignKey({
      columns: [t.companyId, t.supplierId],
      foreignColumns: [suppliers.companyId, suppliers.id],
    }),
    foreignKey({ columns: [t.companyId, t.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
    foreignKey({
      columns: [t.companyId, t.placementId],
      foreignColumns: [placements.companyId, placements.id],
    }),
    index('orders_day').on(t.companyId, t.pourDate),
  ],
);

export const orderLines = pgTable(
  'order_lines',
  {
    ...companyRecord(),
    orderId: uuid('order_id').notNull(),
    position: integer('position').notNull(),
    /** A mix code, a pump or a material. */
    code: text('code').notNull(),
    description: text('description').notNull().default(''),
    quantity: quantity('quantity').notNull(),
    unit: text('unit').notNull(),
  },
  (t) => [
    unique('order_lines_company_id').on(t.companyId, t.id),
    unique('order_lines_position').on(t.companyId, t.orderId, t.position),
    foreignKey({
      columns: [t.companyId, t.orderId],
      foreignColumns: [orders.companyId, orders.id],
    }),
  ],
);

/** The order as it stood at each sending, confirmation or change. */
export const orderVersions = pgTable(
  'order_versions',
  {
    ...companyRecord(),
    orderId: uuid('order_id').notNull(),
    version: integer('version').notNull(),
    snapshot: jsonb('snapshot').notNull(),
  },
  (t) => [
    unique('order_versions_company_id').on(t.companyId, t.id),
    unique('order_versions_version').on(t.companyId, t.orderId, t.version),
    foreignKey({
      columns: [t.companyId, t.orderId],
      foreignColumns: [orders.companyId, orders.id],
    }),
  ],
);
