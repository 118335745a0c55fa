import {
  date,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { CHARGE_KINDS } from '../../lib/domain/facts';
import { MATCH_METHODS } from '../../lib/domain/matching/match';
import { VARIANCE_KINDS } from '../../lib/domain/variance/finding';
import { companyRecord, dollars, moment, quantity, unitPrice } from './columns';
import { people } from './people';
import { suppliers } from './suppliers';
import { pumpTickets, tickets } from './tickets';

/** An uploaded file, before and after it becomes a statement. Its bytes are in the blob store. */
export const imports = pgTable(
  'imports',
  {
    ...companyRecord(),
    supplierId: uuid('supplier_id').notNull(),
    fileName: text('file_name').notNull(),
    sha256: text('sha256').notNull(),
    sizeBytes: integer('size_bytes').notNull(),
    status: text('status', { enum: ['preview', 'accepted', 'discarded'] })
      .notNull()
      .default('preview'),
    /** importers/csv's layout as confirmed by the bookkeeper. */
    layout: jsonb('layout'),
    statementId: uuid('statement_id'),
    uploadedBy: uuid('uploaded_by'),
    acceptedAt: moment('accepted_at'),
  },
  (t) => [
    unique('imports_company_id').on(t.companyId, t.id),
    foreignKey({
      columns: [t.companyId, t.supplierId],
      foreignColumns: [suppliers.companyId, suppliers.id],
    }),
    index('imports_file').on(t.companyId, t.supplierId, t.sha256),
  ],
);

/** The column layout last confirmed for a supplier's files with the same header. */
export const importLayouts = pgTable(
  'import_layouts',
  {
    ...companyRecord(),
    supplierId: uuid('supplier_id').notNull(),
    /** Hash of the titles, which can be longer than an index takes. */
    headerSignature: text('header_signature').notNull(),
    layout: jsonb('layout').notNull(),
  },
  (t) => [
    unique('import_layouts_company_id').on(t.companyId, t.id),
    unique('import_layouts_header').on(t.companyId, t.supplierId, t.headerSignature),
    foreignKey({
      columns: [t.companyId, t.supplierId],
      foreignColumns: [suppliers.companyId, suppliers.id],
    }),
  ],
);

export const statements = pgTable(
  'statements',
  {
    ...companyRecord(),
    supplierId: uuid('supplier_id').notNull(),
    number: text('number').notNull(),
    kind: text('kind', { enum: ['statement', 'invoice'] })
      .notNull()
      .default('statement'),
    periodStart: date('period_start').notNull(),
    periodEnd: date('period_end').notNull(),
    openingBalance: dollars('opening_balance'),
    closingBalance: dollars('closing_balance'),
    status: text('status', { enum: ['open', 'closed'] })
      .notNull()
      .default('open'),
    closedAt: moment('closed_at'),
    closedBy: uuid('closed_by'),
    /** The rows of the strike-off sheet as they stood at closing; later facts don't change them. */
    closedRows: jsonb('closed_rows'),
  },
  (t) => [
    unique('statements_company_id').on(t.companyId, t.id),
    unique('statements_number').on(t.companyId, t.supplierId, t.number),
    foreignKey({
      columns: [t.companyId, t.supplierId],
      foreignColumns: [suppliers.companyId, suppliers.id],
    }),
    index('statements_period').on(t.companyId, t.periodEnd),
  ],
);

export const invoices = pgTable(
  'invoices',
  {
    ...companyRecord(),
    supplierId: uuid('supplier_id').notNull(),
    statementId: uuid('statement_id').notNull(),
    number: text('number').notNull(),
    date: date('date'),
  },
  (t) => [
    unique('invoices_company_id').on(t.companyId, t.id),
    unique('invoices_number').on(t.companyId, t.statementId, t.number),
    foreignKey({
      columns: [t.companyId, t.statementId],
      foreignColumns: [statements.companyId, statements.id],
    }),
  ],
);

export const BILL_LINE_KINDS = ['charge', 'tax', 'credit', 'payment'] as const;

export const billLines = pgTable(
  'bill_lines',
  {
    ...companyRecord(),
    supplierId: uuid('supplier_id').notNull(),
    statementId: uuid('statement_id').notNull(),
    invoiceId: uuid('invoice_id'),
    position: integer('position').notNull(),
    /** The line of the file it came from, for 'where does this stand?'. */
    sourceLine: integer('source_line'),
    /** Fingerprint of the line's own content: the same line again is not taken twice. */
    rowKey: text('row_key').notNull(),
    lineKind: text('line_kind', { enum: BILL_LINE_KINDS }).notNull().default('charge'),
    chargeKind: text('charge_kind', { enum: CHARGE_KINDS }).notNull(),
    date: date('date'),
    ticketNumber: text('ticket_number'),
    jobName: text('job_name'),
    truck: text('truck'),
    description: text('description').notNull(),
    mixCode: text('mix_code'),
    quantity: quantity('quantity'),
    unit: text('unit'),
    unitPrice: unitPrice('unit_price'),
    amount: dollars('amount').notNull(),
  },
  (t) => [
    unique('bill_lines_company_id').on(t.companyId, t.id),
    unique('bill_lines_row').on(t.companyId, t.supplierId, t.rowKey),
    unique('bill_lines_position').on(t.companyId, t.statementId, t.position),
    foreignKey({
      columns: [t.companyId, t.statementId],
      foreignColumns: [statements.companyId, statements.id],
    }),
    foreignKey({
      columns: [t.companyId, t.invoiceId],
      foreignColumns: [invoices.companyId, invoices.id],
    }),
  ],
);

/** A billed line's ties to deliveries: the engine's, renewed at will, and people's own, kept. */
export const matches = pgTable(
  'matches',
  {
    ...companyRecord(),
    billLineId: uuid('bill_line_id').notNull(),
    ticketId: uuid('ticket_id'),
    pumpTicketId: uuid('pump_ticket_id'),
    method: text('method', { enum: MATCH_METHODS }).notNull(),
    confidence: doublePrecision('confidence').notNull(),
    reason: text('reason').notNull(),
    madeBy: uuid('made_by'),
  },
  (t) => [
    unique('matches_company_id').on(t.companyId, t.id),
    unique('matches_ticket_once').on(t.companyId, t.billLineId, t.ticketId),
    unique('matches_pump_ticket_once').on(t.companyId, t.billLineId, t.pumpTicketId),
    foreignKey({
      columns: [t.companyId, t.billLineId],
      foreignColumns: [billLines.companyId, billLines.id],
    }),
    foreignKey({
      columns: [t.companyId, t.ticketId],
      foreignColumns: [tickets.companyId, tickets.id],
    }),
    foreignKey({
      columns: [t.companyId, t.pumpTicketId],
      foreignColumns: [pumpTickets.companyId, pumpTickets.id],
    }),
    foreignKey({
      columns: [t.companyId, t.madeBy],
      foreignColumns: [people.companyId, people.id],
    }),
  ],
);

export const VARIANCE_STATUSES = [
  'open',
  'withinTolerance',
  'accepted',
  'claimed',
  'gone',
] as const;

/**
 * What does not agree. The engine's findings are kept under their stable key, so that a
 * person's decision outlives a second run; a finding that no longer holds becomes `gone`.
 */
export const variances = pgTable(
  'variances',
  {
    ...companyRecord(),
    supplierId: uuid('supplier_id').notNull(),
    statementId: uuid('statement_id').notNull(),
    key: text('key').notNull(),
    /** The row of the strike-off sheet that it stands on. */
    rowKey: text('row_key').notNull(),
    kind: text('kind', { enum: VARIANCE_KINDS }).notNull(),
    billLineId: uuid('bill_line_id'),
    ticketId: uuid('ticket_id'),
    pumpTicketId: uuid('pump_ticket_id'),
    clauseId: uuid('clause_id'),
    expected: dollars('expected').notNull(),
    billed: dollars('billed').notNull(),
    difference: dollars('difference').notNull(),
    sentence: text('sentence').notNull(),
    steps: jsonb('steps').$type<{ label: string; value: string }[]>().notNull(),
    status: text('status', { enum: VARIANCE_STATUSES }).notNull().default('open'),
    reason: text('reason').notNull().default(''),
    decidedBy: uuid('decided_by'),
    decidedAt: moment('decided_at'),
  },
  (t) => [
    unique('variances_company_id').on(t.companyId, t.id),
    unique('variances_key').on(t.companyId, t.statementId, t.key),
    foreignKey({
      columns: [t.companyId, t.statementId],
      foreignColumns: [statements.companyId, statements.id],
    }),
    foreignKey({
      columns: [t.companyId, t.billLineId],
      foreignColumns: [billLines.companyId, billLines.id],
    }),
    foreignKey({
      columns: [t.companyId, t.ticketId],
      foreignColumns: [tickets.companyId, tickets.id],
    }),
    foreignKey({
      columns: [t.companyId, t.pumpTicketId],
      foreignColumns: [pumpTickets.companyId, pumpTickets.id],
    }),
    index('variances_open').on(t.companyId, t.status, t.supplierId),
  ],
);

export const STRIKE_STATES = ['struck', 'accepted', 'claimed'] as const;

/**
 * A settled row of the strike-off sheet. `rowKey` is the sheet line's key: the billed line's id,
 * or the delivery that the bill leaves out.
 */
export const strikes = pgTable(
  'strikes',
  {
    ...companyRecord(),
    statementId: uuid('statement_id').notNull(),
    rowKey: text('row_key').notNull(),
    state: text('state', { enum: STRIKE_STATES }).notNull(),
    reason: text('reason').notNull().default(''),
    madeBy: uuid('made_by').notNull(),
    madeAt: moment('made_at').notNull(),
  },
  (t) => [
    unique('strikes_company_id').on(t.companyId, t.id),
    unique('strikes_row').on(t.companyId, t.statementId, t.rowKey),
    foreignKey({
      columns: [t.companyId, t.statementId],
      foreignColumns: [statements.companyId, statements.id],
    }),
    foreignKey({
      columns: [t.companyId, t.madeBy],
      foreignColumns: [people.companyId, people.id],
    }),
  ],
);
