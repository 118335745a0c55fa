import { z } from 'zod';

const decimal = (places: number) =>
  z
    .string()
    .trim()
    .regex(
      new RegExp(`^\\d{1,9}(\\.\\d{1,${places}})?$`),
      `a number with at most ${places} decimals, not negative`,
    );

/** Dollars per something: up to four places, as suppliers quote fuel and per-minute rates. */
export const rateText = decimal(4);
/** A quantity of yards, hours or minutes: two places. */
export const quantityTextSchema = decimal(2);
const label = z.string().trim().min(1).max(80);
const percent = z
  .string()
  .trim()
  .regex(/^\d{1,2}(\.\d{1,4})?$/, 'a percentage from 0 to 99.9999');

export const mixPriceClause = z.strictObject({
  kind: z.literal('mixPrice'),
  /** Null is the catch-all for mixes not listed. */
  mixCode: z.string().trim().min(1).max(40).nullable(),
  description: label.nullable().default(null),
  dollarsPerYd3: rateText,
});

export const shortLoadClause = z.strictObject({
  kind: z.literal('shortLoad'),
  thresholdYd3: quantityTextSchema,
  charge: z.discriminatedUnion('basis', [
    z.strictObject({ basis: z.literal('flatPerLoad'), dollars: rateText }),
    z.strictObject({ basis: z.literal('perShortYd3'), dollarsPerYd3: rateText }),
  ]),
  /** The last load of an order, called in to finish, may be free of the charge. */
  balanceLoadExempt: z.boolean().default(false),
});

export const waitingClause = z.strictObject({
  kind: z.literal('waiting'),
  free: z.discriminatedUnion('basis', [
    z.strictObject({ basis: z.literal('perLoad'), minutes: quantityTextSchema }),
    z.strictObject({ basis: z.literal('perYd3'), minutesPerYd3: quantityTextSchema }),
  ]),
  dollarsPerMinute: rateText,
  /** Time on site runs from arrival to this moment. */
  until: z.enum(['finished', 'left']).default('finished'),
});

export const perLoadFeeClause = z.strictObject({
  kind: z.literal('perLoadFee'),
  name: label,
  dollars: rateText,
});

export const perYardFeeClause = z.strictObject({
  kind: z.literal('perYardFee'),
  name: label,
  dollarsPerYd3: rateText,
});

export const pumpTimeClause = z.strictObject({
  kind: z.literal('pumpTime'),
  dollarsPerHour: rateText,
  minimumHours: quantityTextSchema,
  measured: z.enum(['onSite', 'portalToPortal']).default('onSite'),
  /** Hours are rounded up to this step; "0.25" is a quarter hour. */
  incrementHours: quantityTextSchema.default('0.25'),
});

export const pumpYardsClause = z.strictObject({
  kind: z.literal('pumpYards'),
  dollarsPerYd3: rateText,
  /** Yards before this many are included in the hourly price; "0" charges from the first. */
  beyondYd3: quantityTextSchema.default('0'),
});

export const pumpSetUpClause = z.strictObject({
  kind: z.literal('pumpSetUp'),
  dollarsEach: rateText,
});

export const TAXABLE_KINDS = [
  'mixPrice',
  'shortLoad',
  'waiting',
  'perLoadFee',
  'perYardFee',
  'pumpTime',
  'pumpYards',
  'pumpSetUp',
] as const;

export const taxClause = z.strictObject({
  kind: z.literal('tax'),
  ratePercent: percent,
  taxes: z.array(z.enum(TAXABLE_KINDS)).min(1),
});

/** One agreed rule of a rate sheet. Plain data: stored as JSON, rendered in words, rated by kind. */
export const clauseSchema = z.discriminatedUnion('kind', [
  mixPriceClause,
  shortLoadClause,
  waitingClause,
  perLoadFeeClause,
  perYardFeeClause,
  pumpTimeClause,
  pumpYardsClause,
  pumpSetUpClause,
  taxClause,
]);

export type Clause = z.infer<typeof clauseSchema>;
export type ClauseKind = Clause['kind'];

/** A clause with the id by which expected lines and explanations refer to it. */
export type IdentifiedClause = { readonly id: string; readonly clause: Clause };

/** One approved version of what a supplier agreed to charge. */
export interface RateSheetFacts {
  readonly id: string;
  readonly supplierId: string;
  /** A job's own sheet takes precedence over the supplier's general one. */
  readonly jobId: string | null;
  readonly name: string;
  readonly version: number;
  readonly effectiveFrom: string;
  /** The last day on which it applies; null while no newer version is known. */
  readonly effectiveTo: string | null;
  readonly clauses: readonly IdentifiedClause[];
}
