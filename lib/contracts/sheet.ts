import { z } from 'zod';
import { CHARGE_KINDS } from '../domain/facts';
import { MATCH_METHODS } from '../domain/matching/match';
import { VARIANCE_KINDS } from '../domain/variance/finding';
import { plainDate, uuid } from './common';
import { timeStyle } from './tickets';

/** Amounts and quantities are decimal text throughout. */
const amount = z.string();

export const step = z.object({ label: z.string(), value: z.string() });

export const sheetFinding = z.object({
  key: z.string(),
  kind: z.enum(VARIANCE_KINDS),
  expected: amount,
  billed: amount,
  /** billed − expected: positive is against us. */
  difference: amount,
  withinTolerance: z.boolean(),
  sentence: z.string(),
  steps: z.array(step),
});
export type SheetFinding = z.infer<typeof sheetFinding>;

export const SETTLED_STATES = ['struck', 'accepted', 'claimed'] as const;
export type SettledState = (typeof SETTLED_STATES)[number];

export const settlement = z.object({
  state: z.enum(SETTLED_STATES),
  reason: z.string(),
  by: z.string(),
  at: z.iso.datetime(),
});
export type Settlement = z.infer<typeof settlement>;

export const sheetDelivery = z.object({
  kind: z.enum(['ticket', 'pumpTicket']),
  id: uuid,
  number: z.string(),
  date: plainDate,
  quantityYd3: amount,
  mixCode: z.string().nullable(),
  truck: z.string().nullable(),
  loadNumber: z.number().int().nullable(),
  onSiteMinutes: z.number().int().nullable(),
});
export type SheetDelivery = z.infer<typeof sheetDelivery>;

/**
 * What a row is: a billed charge, tax, credit or payment; a delivery that the bill leaves out;
 * or something about the document as a whole.
 */
export const SHEET_ROW_KINDS = [
  'charge',
  'tax',
  'credit',
  'payment',
  'unbilled',
  'document',
] as const;

/** `notChecked`: no rate sheet says what it should be, so it can be accepted but not struck. */
export const VERDICTS = ['agrees', 'withinTolerance', 'notChecked', 'finding'] as const;
export type Verdict = (typeof VERDICTS)[number];

export const sheetRow = z.object({
  key: z.string(),
  kind: z.enum(SHEET_ROW_KINDS),
  chargeKind: z.enum(CHARGE_KINDS),
  ordered: z
    .object({
      orderId: uuid.nullable(),
      orderNumber: z.string().nullable(),
      jobName: z.string(),
      mixCode: z.string().nullable(),
      quantityYd3: amount.nullable(),
    })
    .nullable(),
  deliveries: z.array(sheetDelivery),
  billed: z
    .object({
      lineId: uuid,
      position: z.number().int(),
      sourceLine: z.number().int().nullable(),
      invoiceNumber: z.string().nullable(),
      date: plainDate.nullable(),
      ticketNumber: z.string().nullable(),
      jobName: z.string().nullable(),
      description: z.string(),
      mixCode: z.string().nullable(),
      quantity: amount.nullable(),
      unit: z.string().nullable(),
      unitPrice: amount.nullable(),
      amount,
    })
    .nullable(),
  expected: amount.nullable(),
  difference: amount,
  verdict: z.enum(VERDICTS),
  findings: z.array(sheetFinding),
  sentence: z.string(),
  steps: z.array(step),
  match: z
    .object({
      method: z.enum(MATCH_METHODS),
      confidence: z.number(),
      reason: z.string(),
    })
    .nullable(),
  settled: settlement.nullable(),
});
export type SheetRow = z.infer<typeof sheetRow>;

export const sheet = z.object({
  statement: z.object({
    id: uuid,
    number: z.string(),
    kind: z.enum(['statement', 'invoice']),
    supplierId: uuid,
    supplierName: z.string(),
    periodStart: plainDate,
    periodEnd: plainDate,
    openingBalance: amount.nullable(),
    closingBalance: amount.nullable(),
    status: z.enum(['open', 'closed']),
    closedAt: z.iso.datetime().nullable(),
    closedBy: z.string().nullable(),
  }),
  /** How the company writes moments. */
  times: timeStyle,
  rows: z.array(sheetRow),
  /** Tickets of the supplier and period that nobody has checked yet: they prove nothing. */
  ticketsToCheck: z.number().int(),
  /** False where the facts have changed since findings were last kept. */
  upToDate: z.boolean(),
});
export type Sheet = z.infer<typeof sheet>;

const rowKeys = z.array(z.string().min(1).max(200)).min(1).max(5000);

export const strikeInput = z.strictObject({ statementId: uuid, rowKeys });
export const acceptRowsInput = z.strictObject({
  statementId: uuid,
  rowKeys,
  reason: z.string().trim().min(1, 'needed').max(300),
});
export const claimRowsInput = z.strictObject({
  statementId: uuid,
  rowKeys,
  /** A remark for whoever writes to the supplier. */
  note: z.string().trim().max(300).default(''),
});

export const settledRows = z.object({
  rows: z.array(z.object({ key: z.string(), settled: settlement.nullable() })),
});
export type SettledRows = z.infer<typeof settledRows>;

export const undoOutput = z.object({
  /** What was taken back; null where this person has done nothing that could be. */
  undone: z.enum(['settled', 'matched']).nullable(),
  rows: settledRows.shape.rows,
});

export const refreshOutput = z.object({ changed: z.boolean() });

const deliveryRef = z.strictObject({ kind: z.enum(['ticket', 'pumpTicket']), id: uuid });
export const matchByHandInput = z.strictObject({
  statementId: uuid,
  billLineId: uuid,
  deliveries: z.array(deliveryRef).min(1).max(60),
});
/** `nothing`: the line belongs to no delivery. `engine`: forget what a person said about it. */
export const unmatchInput = z.strictObject({
  statementId: uuid,
  billLineId: uuid,
  leaveTo: z.enum(['nothing', 'engine']),
});
export const matchOutput = z.object({ billLineId: uuid });

export const candidatesInput = z.strictObject({
  statementId: uuid,
  billLineId: uuid,
  search: z.string().trim().max(80).default(''),
});
export const candidate = z.object({
  ...sheetDelivery.shape,
  jobName: z.string(),
  /** How many lines of this statement are tied to it already. */
  tiedLines: z.number().int(),
  tied: z.boolean(),
  /** Why it could be the one: "same yards", "same day". */
  reasons: z.array(z.enum(['sameNumber', 'likeNumber', 'sameYards', 'sameDay', 'sameTruck'])),
});
export type Candidate = z.infer<typeof candidate>;
export const candidatesOutput = z.object({ rows: z.array(candidate) });
