import { z } from 'zod';
import { clauseSchema } from '../domain/rating/clauses';
import { name, plainDate, uuid } from './common';
import { rateSheetRow, SUPPLIER_KINDS } from './suppliers';
import { timeStyle } from './tickets';

const fields = {
  name,
  jobId: uuid.nullable(),
  effectiveFrom: plainDate,
  effectiveTo: plainDate.nullable(),
  clauses: z.array(clauseSchema).max(60),
};
const inOrder = (value: { effectiveFrom: string; effectiveTo: string | null }) =>
  value.effectiveTo === null || value.effectiveFrom <= value.effectiveTo;
const ORDER = { path: ['effectiveTo'], message: 'before the first day' };

export const rateSheetValues = z.strictObject(fields).refine(inOrder, ORDER);

/** A clause as it is read: its words, and what is wrong with it. */
export const clauseInWords = z.object({ clause: clauseSchema, says: z.string() });

export const clauseProblem = z.object({
  /** Place of the clause on the sheet, from 0. */
  index: z.number().int(),
  severity: z.enum(['error', 'warning']),
  sentence: z.string(),
});

export const rateSheetDetail = z.object({
  ...rateSheetRow.shape,
  supplierId: uuid,
  supplierName: z.string(),
  supplierKind: z.enum(SUPPLIER_KINDS),
  approvedAt: z.iso.datetime().nullable(),
  lines: z.array(clauseInWords),
  problems: z.array(clauseProblem),
  times: timeStyle,
});
export type RateSheetDetail = z.infer<typeof rateSheetDetail>;

export const rateSheetRef = z.strictObject({ rateSheetId: uuid });
export const createRateSheetInput = z.strictObject({
  supplierId: uuid,
  name,
  jobId: uuid.nullable(),
  effectiveFrom: plainDate,
  /** Begin with the clauses of the latest sheet for the same deliveries. */
  copyLatest: z.boolean().default(true),
});
export const updateRateSheetInput = z
  .strictObject({ rateSheetId: uuid, ...fields })
  .refine(inOrder, ORDER);
export const deletedRateSheet = z.object({ rateSheetId: uuid });
