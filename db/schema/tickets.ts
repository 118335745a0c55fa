import {
  bigint,
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
import { orders } from './orders';
import { people } from './people';
import { suppliers } from './suppliers';

export const TICKET_STATUSES = ['toCheck', 'confirmed', 'rejected'] as const;

/**
 * One ready-mix load. Clock times are minutes after midnight of `date` in the company's time
 * zone and go past 1440 when the pour does.
 */
export const tickets = pgTable(
  'tickets',
  {
    ...companyRecord(),
    supplierId: uuid('supplier_id'),
    jobId: uuid('job_id').notNull(),
    placementId: uuid('placement_id'),
    orderId: uuid('order_id'),
    status: text('status', { enum: TICKET_STATUSES }).notNull(),
    number: text('number').notNull().default(''),
    date: date('date').notNull(),
    plant: text('plant'),
    truck: text('truck'),
    loadNumber: integer('load_number'),
    mixCode: text('mix_code').notNull().default(''),
    quantityYd3: quantity('quantity_yd3'),
    orderedYd3: quantity('ordered_yd3'),
    toDateYd3: quantity('to_date_yd3'),
    returnedYd3: quantity('returned_yd3'),
    batchedAt: integer('batched_at'),
    arrivedAt: integer('arrived_at'),
    startedAt: integer('started_at'),
    finishedAt: integer('finished_at'),
    leftAt: integer('left_at'),
    waterAddedGal: quantity('water_added_gal'),
    notes: text('notes').notNull().default(''),
    /** Made on the device before the first send, so that a repeat is recognised. */
    clientId: uuid('client_id').notNull(),
    version: integer('version').notNull().default(1),
    confirmedBy: uuid('confirmed_by'),
    confirmedAt: moment('confirmed_at'),
  },
  (t) => [
    unique('tickets_company_id').on(t.companyId, t.id),
    unique('tickets_client').on(t.companyId, t.clientId),
    foreignKey({
      columns: [t.companyId, t.supplierId],
      foreignColumns: [suppliers.companyId, suppliers.id],
    }),
    foreignKey({ columns: [t.companyId, t.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
    foreignKey({
      columns: [t.companyId, t.placementId],
      foreignColumns: [placements.companyId, placements.id],
    }),
    foreignKey({
      columns: [t.companyId, t.orderId],
      foreignColumns: [orders.companyId, orders.id],
    }),
    foreignKey({
      columns: [t.companyId, t.confirmedBy],
      foreignColumns: [people.companyId, people.id],
    }),
    index('tickets_supplier_day').on(t.companyId, t.supplierId, t.date),
    index('tickets_placement').on(t.companyId, t.placementId),
    index('tickets_number').on(t.companyId, t.supplierId, t.number),
  ],
);

export const pumpTickets = pgTable(
  'pump_tickets',
  {
    ...companyRecord(),
    supplierId: uuid('supplier_id').notNull(),
    jobId: uuid('job_id').notNull(),
    placementId: uuid('placement_id'),
    orderId: uuid('order_id'),
    number: text('number').notNull(),
    date: date('date').notNull(),
    leftYardAt: integer('left_yard_at'),
    arrivedAt: integer('arrived_at'),
    finishedAt: integer('finished_at'),
    leftAt: integer('left_at'),
    backInYardAt: integer('back_in_yard_at'),
    pumpedYd3: quantity('pumped_yd3').notNull(),
    setUps: integer('set_ups').notNull().default(1),
    notes: text('notes').notNull().default(''),
  },
  (t) => [
    unique('pump_tickets_company_id').on(t.companyId, t.id),
    unique('pump_tickets_number').on(t.companyId, t.supplierId, t.number),
    foreignKey({
      columns: [t.companyId, t.supplierId],
      foreignColumns: [suppliers.companyId, suppliers.id],
    }),
    foreignKey({ columns: [t.companyId, t.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
    foreignKey({
      columns: [t.companyId, t.placementId],
      foreignColumns: [placements.companyId, placements.id],
    }),
    foreignKey({
      columns: [t.companyId, t.orderId],
      foreignColumns: [orders.companyId, orders.id],
    }),
    index('pump_tickets_supplier_day').on(t.companyId, t.supplierId, t.date),
  ],
);

/** A photograph; its bytes are kept in the blob store under their hash. */
export const photos = pgTable(
  'photos',
  {
    ...companyRecord(),
    ticketId: uuid('ticket_id'),
    clientId: uuid('client_id').notNull(),
    sha256: text('sha256').notNull(),
    mediaType: text('media_type', { enum: ['image/jpeg', 'image/png', 'image/webp'] }).notNull(),
    widthPx: integer('width_px').notNull(),
    heightPx: integer('height_px').notNull(),
    sizeBytes: bigint('size_bytes', { mode: 'number' }).notNull(),
    takenBy: uuid('taken_by').notNull(),
  },
  (t) => [
    unique('photos_company_id').on(t.companyId, t.id),
    unique('photos_client').on(t.companyId, t.clientId),
    foreignKey({
      columns: [t.companyId, t.ticketId],
      foreignColumns: [tickets.companyId, tickets.id],
    }),
    foreignKey({
      columns: [t.companyId, t.takenBy],
      foreignColumns: [people.companyId, people.id],
    }),
    index('photos_ticket').on(t.companyId, t.ticketId),
  ],
);

export const READING_STATES = ['waiting', 'reading', 'read', 'failed'] as const;

/** What the reader made of a photo. `fields` is importers/ocr's TicketReading. */
export const readings = pgTable(
  'readings',
  {
    ...companyRecord(),
    photoId: uuid('photo_id').notNull(),
    state: text('state', { enum: READING_STATES }).notNull().default('waiting'),
    fields: jsonb('fields'),
    failureCode: text('failure_code'),
    failureSentence: text('failure_sentence'),
    finishedAt: moment('finished_at'),
  },
  (t) => [
    unique('readings_company_id').on(t.companyId, t.id),
    unique('readings_photo').on(t.companyId, t.photoId),
    foreignKey({
      columns: [t.companyId, t.photoId],
      foreignColumns: [photos.companyId, photos.id],
    }),
  ],
);
