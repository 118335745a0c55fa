import { z } from 'zod';
import { VARIANCE_KINDS } from '../domain/variance/finding';
import { pageInput, pageOf, plainDate, uuid } from './common';

export const VARIANCE_STATUSES = [
  'open',
  'withinTolerance',
  'accepted',
  'claimed',
  'gone',
] as const;

/** Days since the end of the statement's period. */
export const AGES = ['0-30', '31-60', '61-90', 'over90'] as const;
export const VARIANCE_SORTS = ['difference', 'age', 'supplier', 'kind', 'statement'] as const;

const filters = {
  status: z.enum([...VARIANCE_STATUSES, 'unsettled', 'all']).default('unsettled'),
  supplierId: uuid.optional(),
  statementId: uuid.optional(),
  kind: z.enum(VARIANCE_KINDS).optional(),
  age: z.enum(AGES).optional(),
  sort: z.enum(VARIANCE_SORTS).default('difference'),
  direction: z.enum(['up', 'down']).default('down'),
};
export const listVariancesInput = z.strictObject({ ...pageInput, ...filters });
export const exportVariancesInput = z.strictObject(filters);
export type VarianceFilters = z.output<typeof exportVariancesInput>;

export const varianceRow = z.object({
  id: uuid,
  kind: z.enum(VARIANCE_KINDS),
  status: z.enum(VARIANCE_STATUSES),
  supplierId: uuid,
  supplierName: z.string(),
  statementId: uuid,
  statementNumber: z.string(),
  statementClosed: z.boolean(),
  periodEnd: plainDate,
  ageDays: z.number().int(),
  /** The sheet's row, for the link. */
  rowKey: z.string(),
  ticketNumber: z.string().nullable(),
  jobName: z.string().nullable(),
  expected: z.string(),
  billed: z.string(),
  difference: z.string(),
  sentence: z.string(),
  reason: z.string(),
  decidedBy: z.string().nullable(),
  decidedAt: z.iso.datetime().nullable(),
});
export type VarianceRow = z.infer<typeof varianceRow>;

const bySomething = z.object({
  /** Findings against us, dollars. */
  against: z.string(),
  count: z.number().int(),
});
export const listVariancesOutput = z.object({
  ...pageOf(varianceRow).shape,
  /** Of everything that the filters let through, not of this page only. */
  totals: z.object({ against: z.string(), inOurFavour: z.string() }),
  suppliers: z.array(z.object({ id: uuid, name: z.string(), ...bySomething.shape })),
  kinds: z.array(z.object({ kind: z.enum(VARIANCE_KINDS), ...bySomething.shape })),
  ages: z.array(z.object({ age: z.enum(AGES), ...bySomething.shape })),
});
