import { z } from 'zod';
import { CHARGE_KINDS } from '@/lib/domain/facts';
import { diagnosticSchema, SEVERITIES } from './diagnostic';
import { importLayoutSchema, TARGET_FIELDS } from './layout';

/**
 * The plan that an importer hands over: plain data, amounts and quantities as decimal text, so
 * that it can be shown, stored as evidence, sent as JSON and replayed. It never writes.
 */

const ROW_KINDS = [
  'line',
  'tax',
  'credit',
  'payment',
  'opening',
  'closing',
  'subtotal',
  'note',
] as const;
export type RowKind = (typeof ROW_KINDS)[number];

const ITEM_ACTIONS = ['create', 'skip', 'error'] as const;
const SKIP_REASONS = ['alreadyImported', 'opening', 'closing', 'subtotal', 'note'] as const;

/** Decimal text with a point and no grouping: "-1234.50". */
const decimalText = z.string();

const billLineValuesSchema = z.object({
  /** YYYY-MM-DD. */
  date: z.string().nullable(),
  ticketNumber: z.string().nullable(),
  invoiceNumber: z.string().nullable(),
  jobName: z.string().nullable(),
  truck: z.string().nullable(),
  description: z.string(),
  /** Only where the line charges for a mix; a fee's item code stays in `itemCode`. */
  mixCode: z.string().nullable(),
  itemCode: z.string().nullable(),
  quantity: decimalText.nullable(),
  unit: z.string().nullable(),
  unitPrice: decimalText.nullable(),
  /** Charges are positive; credits and payments negative, however the file prints them. */
  amount: decimalText.nullable(),
});
export type BillLineValues = z.infer<typeof billLineValuesSchema>;

const importItemSchema = z.object({
  /**
   * Fingerprint of the line's own content with its occurrence in the file ("…#1"): the same
   * line has the same key in any file, in any order of columns and style of dates.
   */
  rowKey: z.string(),
  /** Physical line of the file, from 1. */
  sourceLine: z.number().int(),
  /** The record as it stands in the file. */
  raw: z.string(),
  rowKind: z.enum(ROW_KINDS),
  values: billLineValuesSchema,
  chargeKind: z.enum(CHARGE_KINDS),
  /** Why this charge kind, in a few words. */
  chargeReason: z.string(),
  action: z.enum(ITEM_ACTIONS),
  skipReason: z.enum(SKIP_REASONS).nullable(),
});
export type ImportItem = z.infer<typeof importItemSchema>;

export const COLUMN_CONFIDENCES = ['confirmed', 'certain', 'likely', 'unsure'] as const;

const previewColumnSchema = z.object({
  index: z.number().int(),
  title: z.string(),
  field: z.enum(TARGET_FIELDS).nullable(),
  confidence: z.enum(COLUMN_CONFIDENCES).nullable(),
  why: z.string().nullable(),
  samples: z.array(z.string()),
});

/** What the document says about itself, above, between or below its lines. */
const documentFactsSchema = z.object({
  supplierName: z.string().nullable(),
  documentNumber: z.string().nullable(),
  documentDate: z.string().nullable(),
  periodFrom: z.string().nullable(),
  periodTo: z.string().nullable(),
  openingBalance: decimalText.nullable(),
  closingBalance: decimalText.nullable(),
});
export type DocumentFacts = z.infer<typeof documentFactsSchema>;

const importTotalsSchema = z.object({
  /** Every record of the file: lines + skipped + failed. */
  records: z.number().int(),
  /** Records that are lines of the bill, already imported or not. */
  lines: z.number().int(),
  /** Preamble, titles, blank rows, notes, totals and balances. */
  skipped: z.number().int(),
  failed: z.number().int(),
  toCreate: z.number().int(),
  alreadyImported: z.number().int(),
  charges: decimalText,
  tax: decimalText,
  /** Zero or negative. */
  credits: decimalText,
  /** Zero or negative. */
  payments: decimalText,
  /** charges + tax + credits + payments, of all lines of the file. */
  net: decimalText,
});
export type ImportTotals = z.infer<typeof importTotalsSchema>;

export const billCsvPreviewSchema = z.object({
  fileName: z.string(),
  fileSha256: z.string(),
  byteLength: z.number().int(),
  /** False where nothing could be read: the diagnostics say why. */
  readable: z.boolean(),
  /** How the file was read; what a person corrects and what is remembered. */
  layout: importLayoutSchema,
  columns: z.array(previewColumnSchema),
  sampleRows: z.array(z.object({ line: z.number().int(), cells: z.array(z.string()) })),
  document: documentFactsSchema,
  items: z.array(importItemSchema),
  totals: importTotalsSchema,
  diagnostics: z.array(diagnosticSchema),
  moreDiagnostics: z.number().int(),
  diagnosticCounts: z.record(z.enum(SEVERITIES), z.number().int()),
});
export type BillCsvPreview = z.infer<typeof billCsvPreviewSchema>;
