import type { Money } from '../money/money';
import { type DecimalInput, money, ZERO_MONEY } from '../money/money';
import type { ExplanationStep } from '../rating/expected-line';
import type { Finding, Tolerances, VarianceKind } from './finding';

/** Two cents: what rounding in other places than ours may make of a line that agrees. */
const ROUNDING_SLACK = money('0.02');

export function withinSlack(one: Money, other: Money): boolean {
  return one.minus(other).abs().lte(ROUNDING_SLACK);
}

/** What is wrong with a line, before tolerances: billed − expected is its own share only. */
export interface DraftFinding {
  readonly kind: VarianceKind;
  readonly expected: Money;
  readonly billed: Money;
  readonly clauseId: string | null;
  readonly sentence: string;
  readonly steps: readonly ExplanationStep[];
}

/** What comparing a billed line says. */
export interface Judgement {
  /** Null where nothing was agreed that the line could be held against. */
  readonly expectedAmount: Money | null;
  readonly findings: readonly DraftFinding[];
  readonly sentence: string;
  readonly steps: readonly ExplanationStep[];
}

export interface FindingPlace {
  readonly billLineId: string | null;
  /** Names the place in the finding's key: the line's id, or the delivery left out. */
  readonly place: string;
  readonly ticketIds: readonly string[];
  readonly pumpTicketIds: readonly string[];
}

/**
 * A difference is within tolerance up to and including the larger of the kind's two bounds, its
 * percentage taken of the expected amount. A wrong mix at the same price costs nothing and still
 * is the wrong mix, so a finding of no dollars never is within tolerance.
 */
function isTolerated(draft: DraftFinding, tolerances: Tolerances): boolean {
  const tolerance = tolerances[draft.kind];
  const difference = draft.billed.minus(draft.expected).abs();
  if (!tolerance || difference.isZero()) return false;
  const share = draft.expected.abs().times(tolerance.percent).dividedBy(100);
  return difference.lte(tolerance.absolute) || difference.lte(share);
}

export function toFinding(
  draft: DraftFinding,
  place: FindingPlace,
  tolerances: Tolerances,
): Finding {
  const { billLineId, ticketIds, pumpTicketIds } = place;
  return {
    key: `${draft.kind}:${place.place}`,
    kind: draft.kind,
    billLineId,
    ticketIds,
    pumpTicketIds,
    clauseId: draft.clauseId,
    expected: draft.expected,
    billed: draft.billed,
    difference: subtract(draft.billed, draft.expected),
    withinTolerance: isTolerated(draft, tolerances),
    sentence: draft.sentence,
    steps: draft.steps,
  };
}

export function subtract(one: Money, other: DecimalInput): Money {
  return money(one.minus(other));
}

/** The whole amount of a line is against us: nothing of it was owed. */
export function nothingOwed(
  kind: VarianceKind,
  billed: Money,
  sentence: string,
  steps: readonly ExplanationStep[] = [],
  clauseId: string | null = null,
): Judgement {
  const finding = { kind, expected: ZERO_MONEY, billed, clauseId, sentence, steps };
  return { expectedAmount: ZERO_MONEY, findings: [finding], sentence, steps };
}

/** Nothing to hold the line against: it is shown, and not called right or wrong. */
export function notCheckable(sentence: string): Judgement {
  return { expectedAmount: null, findings: [], sentence, steps: [] };
}
