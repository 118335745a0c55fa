import { z } from 'zod';

/** What a column of a supplier's file can mean to us. */
export const TARGET_FIELDS = [
  'date',
  'ticketNumber',
  'invoiceNumber',
  'jobName',
  'truck',
  'description',
  'mixCode',
  'quantity',
  'unit',
  'unitPrice',
  'amount',
  'creditAmount',
  'taxAmount',
  'balance',
] as const;
export type TargetField = (typeof TARGET_FIELDS)[number];

/** Trade words for the fields, for pickers and sentences. */
export const TARGET_FIELD_LABELS: Readonly<Record<TargetField, string>> = {
  date: 'Date',
  ticketNumber: 'Ticket',
  invoiceNumber: 'Invoice',
  jobName: 'Job',
  truck: 'Truck',
  description: 'Description',
  mixCode: 'Mix or item code',
  quantity: 'Quantity',
  unit: 'Unit',
  unitPrice: 'Unit price',
  amount: 'Amount',
  creditAmount: 'Credit or payment amount',
  taxAmount: 'Tax amount',
  balance: 'Running balance (not used)',
};

const ENCODINGS = ['utf-8', 'windows-1252', 'utf-16le', 'utf-16be'] as const;
export const DELIMITERS = [',', ';', '\t', '|'] as const;
const DATE_ORDERS = ['MDY', 'DMY', 'YMD'] as const;
const DECIMAL_MARKS = ['.', ','] as const;

export type Encoding = (typeof ENCODINGS)[number];
export type Delimiter = (typeof DELIMITERS)[number];
export type DateOrder = (typeof DATE_ORDERS)[number];
export type DecimalMark = (typeof DECIMAL_MARKS)[number];

const columnIndex = z.number().int().min(0).max(59).nullable().default(null);

/** Which column (counted from 0) holds each field; null where the file has none. */
const columnMappingSchema = z.strictObject({
  date: columnIndex,
  ticketNumber: columnIndex,
  invoiceNumber: columnIndex,
  jobName: columnIndex,
  truck: columnIndex,
  description: columnIndex,
  mixCode: columnIndex,
  quantity: columnIndex,
  unit: columnIndex,
  unitPrice: columnIndex,
  amount: columnIndex,
  /** Credits and payments where they stand in a column of their own. */
  creditAmount: columnIndex,
  /** Tax where each line carries its own. */
  taxAmount: columnIndex,
  /** Named so that it is recognised and left alone. */
  balance: columnIndex,
} satisfies Record<TargetField, typeof columnIndex>);
export type ColumnMapping = z.infer<typeof columnMappingSchema>;

/**
 * How one supplier's file is to be read: guessed first, corrected by a person, remembered for
 * that supplier. Plain data, so that it can be stored as JSON and sent by a form.
 */
export const importLayoutSchema = z.strictObject({
  encoding: z.enum(ENCODINGS),
  delimiter: z.enum(DELIMITERS),
  /** Physical line (from 1) of the column titles; null for a file without titles. */
  headerRow: z.number().int().min(1).nullable(),
  /**
   * The titles themselves, normalised. Where present, the title row is looked for by its
   * content, so that a longer preamble next month does not matter; where no row has these
   * titles, the remembered columns are not trusted and the guess is made afresh.
   * A form in which a person changes encoding, delimiter or title row sends null here, and
   * columns that are all null where it wants them guessed again.
   */
  headerSignature: z.string().max(4000).nullable().default(null),
  dateOrder: z.enum(DATE_ORDERS),
  decimalMark: z.enum(DECIMAL_MARKS),
  columns: columnMappingSchema,
});
export type ImportLayout = z.infer<typeof importLayoutSchema>;

export const EMPTY_COLUMNS: ColumnMapping = columnMappingSchema.parse({});
