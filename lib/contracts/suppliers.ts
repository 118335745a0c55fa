import { z } from 'zod';
import { email, name, pageInput, pageOf, plainDate, uuid } from './common';

export const SUPPLIER_KINDS = ['readyMix', 'pump', 'material'] as const;

const emailOrNothing = z.union([z.literal(''), email]);

export const supplierFields = {
  name,
  kind: z.enum(SUPPLIER_KINDS),
  dispatchEmail: emailOrNothing,
  creditEmail: emailOrNothing,
  phone: z.string().trim().max(40),
  accountNumber: z.string().trim().max(40),
};

export const supplierRow = z.object({
  id: uuid,
  name: z.string(),
  kind: z.enum(SUPPLIER_KINDS),
  dispatchEmail: z.string(),
  creditEmail: z.string(),
  phone: z.string(),
  accountNumber: z.string(),
  archived: z.boolean(),
  statements: z.number().int(),
  /** Findings against us that nobody has settled or accepted, dollars. */
  openAgainst: z.string(),
});
export type SupplierRow = z.infer<typeof supplierRow>;

export const rateSheetRow = z.object({
  id: uuid,
  name: z.string(),
  version: z.number().int(),
  status: z.enum(['draft', 'approved']),
  jobId: uuid.nullable(),
  jobName: z.string().nullable(),
  effectiveFrom: plainDate,
  effectiveTo: plainDate.nullable(),
  approvedBy: z.string().nullable(),
  clauses: z.number().int(),
});
export type RateSheetRow = z.infer<typeof rateSheetRow>;

export const supplierDetail = z.object({
  ...supplierRow.shape,
  rateSheets: z.array(rateSheetRow),
  /** Layouts of its files that are remembered from earlier imports. */
  rememberedLayouts: z.number().int(),
});

const filters = {
  kind: z.enum([...SUPPLIER_KINDS, 'all']).default('all'),
  search: z.string().trim().max(80).default(''),
  archived: z.enum(['no', 'yes', 'all']).default('no'),
};
export const listSuppliersInput = z.strictObject({ ...pageInput, ...filters });
export const exportSuppliersInput = z.strictObject(filters);
export type SupplierFilters = z.output<typeof exportSuppliersInput>;
export const listSuppliersOutput = pageOf(supplierRow);
export const supplierRef = z.strictObject({ supplierId: uuid });
export const createSupplierInput = z.strictObject(supplierFields);
export const updateSupplierInput = z.strictObject({
  supplierId: uuid,
  ...supplierFields,
  archived: z.boolean(),
});
