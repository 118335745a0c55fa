import type { ChargeKind } from '../facts';
import type { Money } from '../money/money';
import type { ExplanationStep } from '../rating/expected-line';

export const VARIANCE_KINDS = [
  'billedNotDelivered',
  'deliveredNotBilled',
  'billedTwice',
  'yardsDiffer',
  'mixDiffers',
  'priceDiffers',
  'shortLoadNotOwed',
  'shortLoadWrongAmount',
  'waitingNotOwed',
  'waitingWrongMinutes',
  'waitingWrongAmount',
  'waitingNotProvable',
  'pumpMinimumWrong',
  'pumpHoursDiffer',
  'pumpYardsDiffer',
  'feeNotAgreed',
  'feeWrongAmount',
  'taxWrong',
  'arithmeticWrong',
] as const;
export type VarianceKind = (typeof VARIANCE_KINDS)[number];

/** Variances smaller than either bound are struck within tolerance; the larger bound counts. */
export interface Tolerance {
  readonly absolute: Money;
  readonly percent: string;
}
export type Tolerances = Readonly<Partial<Record<VarianceKind, Tolerance>>>;

export interface Finding {
  /** Stable for the same facts, so that a settled finding is recognised when the engine runs again. */
  readonly key: string;
  readonly kind: VarianceKind;
  readonly billLineId: string | null;
  readonly ticketIds: readonly string[];
  readonly pumpTicketIds: readonly string[];
  readonly clauseId: string | null;
  readonly expected: Money;
  readonly billed: Money;
  /** billed − expected: positive is against us. */
  readonly difference: Money;
  readonly withinTolerance: boolean;
  /** One sentence fit to send to the supplier. */
  readonly sentence: string;
  readonly steps: readonly ExplanationStep[];
}

/**
 * One row of the strike-off sheet: a billed line with what it should have been, or a delivery
 * that the bill leaves out.
 */
export interface SheetLine {
  readonly key: string;
  readonly billLineId: string | null;
  readonly ticketIds: readonly string[];
  readonly pumpTicketIds: readonly string[];
  readonly orderId: string | null;
  readonly chargeKind: ChargeKind;
  readonly expectedAmount: Money | null;
  readonly billedAmount: Money | null;
  readonly difference: Money;
  readonly findings: readonly Finding[];
  /** "Why this expected amount", shown for agreeing lines too. */
  readonly sentence: string;
  readonly steps: readonly ExplanationStep[];
}
