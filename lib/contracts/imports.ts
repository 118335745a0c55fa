import { z } from 'zod';
import { importLayoutSchema } from '../../importers/core/layout';
import { billCsvPreviewSchema } from '../../importers/core/plan';
import { CHARGE_KINDS } from '../domain/facts';
import { decimalText, plainDate, uuid } from './common';

export const MAX_IMPORT_BYTES = 10 * 1024 * 1024;

const sha256 = z.string().regex(/^[0-9a-f]{64}$/);
const namedStatement = z.object({ id: uuid, number: z.string() });

export const uploadImportInput = z.strictObject({
  supplierId: uuid,
  fileName: z.string().trim().min(1).max(200),
  bytes: z.custom<Uint8Array>((value) => value instanceof Uint8Array),
});
export const uploadImportOutput = z.object({
  importId: uuid,
  /** The statement that this very file became earlier; null for a file not yet accepted. */
  statement: namedStatement.nullable(),
  /** True when the same file was waiting here already and nothing was added. */
  repeated: z.boolean(),
});

export const pendingImport = z.object({
  id: uuid,
  fileName: z.string(),
  supplierId: uuid,
  supplierName: z.string(),
  sizeBytes: z.number().int(),
  uploadedAt: z.iso.datetime(),
  uploadedBy: z.string().nullable(),
});
export type PendingImport = z.infer<typeof pendingImport>;
export const listImportsInput = z.strictObject({});
export const listImportsOutput = z.object({ rows: z.array(pendingImport) });

export const previewImportInput = z.strictObject({ importId: uuid });
export const importPreview = z.object({
  importId: uuid,
  status: z.enum(['preview', 'accepted', 'discarded']),
  supplier: z.object({ id: uuid, name: z.string() }),
  /** The statement it became, once it is accepted. */
  statement: namedStatement.nullable(),
  /** Where the columns come from: guessed, remembered for the supplier, or chosen on the preview. */
  layoutFrom: z.enum(['guessed', 'remembered', 'chosen']),
  /** What the document says of itself, or what its lines suggest, for the form to start with. */
  proposed: z.object({
    number: z.string(),
    periodStart: z.string(),
    periodEnd: z.string(),
    openingBalance: z.string(),
    closingBalance: z.string(),
  }),
  preview: billCsvPreviewSchema,
});
export type ImportPreview = z.infer<typeof importPreview>;

export const setImportLayoutInput = z.strictObject({
  importId: uuid,
  /** Null: guess again. */
  layout: importLayoutSchema.nullable(),
});
export const setImportLayoutOutput = z.object({ importId: uuid });

const optionalAmount = z
  .union([z.literal('').transform(() => null), decimalText])
  .nullable()
  .default(null);

export const acceptFields = {
  number: z.string().trim().min(1, 'needed').max(60),
  periodStart: plainDate,
  periodEnd: plainDate,
  openingBalance: optionalAmount,
  closingBalance: optionalAmount,
};
const periodInOrder = (value: { periodStart: string; periodEnd: string }) =>
  value.periodStart <= value.periodEnd;
const PERIOD_ORDER = { path: ['periodEnd'], message: 'before the first day' };

/** The part of `acceptImportInput` that the bookkeeper types. */
export const acceptForm = z.strictObject(acceptFields).refine(periodInOrder, PERIOD_ORDER);

export const acceptImportInput = z
  .strictObject({
    importId: uuid,
    /** The file that was looked at on the preview; another one is refused. */
    fileSha256: sha256,
    ...acceptFields,
    /** Rows that could not be read are left out; said in the activity record. */
    leaveOutUnreadable: z.boolean().default(false),
    /** What a line charges for where the bookkeeper knows better, by the line's row key. */
    chargeKinds: z.record(z.string().max(80), z.enum(CHARGE_KINDS)).default({}),
  })
  .refine(periodInOrder, PERIOD_ORDER);
export const acceptImportOutput = z.object({
  statementId: uuid,
  lines: z.number().int(),
  /** True when the import had been accepted before and nothing was added. */
  repeated: z.boolean(),
});

export const discardImportInput = z.strictObject({ importId: uuid });
export const discardImportOutput = z.object({ importId: uuid });
