import { z } from 'zod';
import { pageInput, pageOf, plainDate, uuid } from './common';

export const STATEMENT_SORTS = ['period', 'supplier', 'number', 'billed', 'against'] as const;

const filters = {
  status: z.enum(['open', 'closed', 'all']).default('all'),
  supplierId: uuid.optional(),
  search: z.string().trim().max(80).default(''),
  sort: z.enum(STATEMENT_SORTS).default('period'),
  direction: z.enum(['up', 'down']).default('down'),
};
export const listStatementsInput = z.strictObject({ ...pageInput, ...filters });
export const exportStatementsInput = z.strictObject(filters);

export const statementRow = z.object({
  id: uuid,
  number: z.string(),
  kind: z.enum(['statement', 'invoice']),
  supplierId: uuid,
  supplierName: z.string(),
  periodStart: plainDate,
  periodEnd: plainDate,
  openingBalance: z.string().nullable(),
  closingBalance: z.string().nullable(),
  status: z.enum(['open', 'closed']),
  closedAt: z.iso.datetime().nullable(),
  closedBy: z.string().nullable(),
  lines: z.number().int(),
  /** Lines struck off, accepted or claimed. */
  settled: z.number().int(),
  billed: z.string(),
  /** Findings against us that nobody has settled or accepted. */
  against: z.string(),
});
export type StatementRow = z.infer<typeof statementRow>;

export const listStatementsOutput = z.object({
  ...pageOf(statementRow).shape,
  suppliers: z.array(z.object({ id: uuid, name: z.string() })),
});

export const statementRef = z.strictObject({ statementId: uuid });
/** One statement, or all that are open. */
export const refreshInput = z.strictObject({ statementId: uuid.optional() });
export const reopenStatementInput = z.strictObject({
  statementId: uuid,
  reason: z.string().trim().min(1, 'needed').max(300),
});
export const statementState = z.object({
  statementId: uuid,
  status: z.enum(['open', 'closed']),
});
