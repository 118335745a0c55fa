import { money, quantity } from '../money/money';
import type { ClauseModule, ClauseOf } from './clause-module';
import type { Clause, ClauseKind } from './clauses';
import { perLoadFee, perYardFee } from './kinds/fees';
import { mixPrice } from './kinds/mix-price';
import { pumpSetUp, pumpTime, pumpYards } from './kinds/pump';
import { shortLoad } from './kinds/short-load';
import { waiting } from './kinds/waiting';
import { unitPrice } from './words';

const KIND_WORDS: Record<ClauseKind, string> = {
  mixPrice: 'concrete',
  shortLoad: 'short loads',
  waiting: 'waiting',
  perLoadFee: 'fees a load',
  perYardFee: 'fees a yard',
  pumpTime: 'pump hours',
  pumpYards: 'yards pumped',
  pumpSetUp: 'set-up',
  tax: 'tax',
};

/** Tax is worked out on a bill's other lines, never on a delivery: it rates nothing here. */
const tax: ClauseModule<'tax'> = {
  kind: 'tax',
  chargeKind: 'tax',
  describe: (clause) =>
    `Sales tax: ${quantity(clause.ratePercent).toString()} % on ${clause.taxes
      .map((kind) => KIND_WORDS[kind])
      .join(', ')}`,
};

const MODULES: { readonly [Kind in ClauseKind]: ClauseModule<Kind> } = {
  mixPrice,
  shortLoad,
  waiting,
  perLoadFee,
  perYardFee,
  pumpTime,
  pumpYards,
  pumpSetUp,
  tax,
};

/** The module of a clause's kind. */
export function moduleOf<Kind extends ClauseKind>(clause: ClauseOf<Kind>): ClauseModule<Kind> {
  return MODULES[clause.kind as Kind] as ClauseModule<Kind>;
}

/** A clause in a person's words. */
export function describeClause(clause: Clause): string {
  return moduleOf(clause as ClauseOf<ClauseKind>).describe(clause as never);
}

export interface ClauseIssue {
  readonly index: number;
  readonly field: string;
  readonly message: string;
}

/** Which clause of a kind may stand on a sheet only once, and by what they are told apart. */
function identity(clause: Clause): { key: string; field: string } | null {
  switch (clause.kind) {
    case 'mixPrice':
      return { key: `mixPrice:${clause.mixCode?.toUpperCase() ?? '*'}`, field: 'mixCode' };
    case 'perLoadFee':
    case 'perYardFee':
      return { key: `fee:${clause.name.toUpperCase()}`, field: 'name' };
    default:
      return { key: clause.kind, field: 'kind' };
  }
}

/**
 * What is wrong with a sheet as a whole: two clauses that would both charge for the same thing,
 * rates of zero. Each issue names the clause by its place and the field.
 */
export function checkClauses(clauses: readonly Clause[]): ClauseIssue[] {
  const issues: ClauseIssue[] = [];
  const seen = new Map<string, number>();
  clauses.forEach((clause, index) => {
    const same = identity(clause);
    const earlier = same ? seen.get(same.key) : undefined;
    if (same && earlier !== undefined) {
      issues.push({
        index,
        field: same.field,
        message: `The same as clause ${earlier + 1}: ${describeClause(clause)}. Keep one of them.`,
      });
    } else if (same) seen.set(same.key, index);
    if (clause.kind === 'mixPrice' && money(clause.dollarsPerYd3).isZero()) {
      issues.push({
        index,
        field: 'dollarsPerYd3',
        message: `A price of ${unitPrice(money('0'))} would make concrete free. Give the agreed price.`,
      });
    }
    if (clause.kind === 'pumpTime' && quantity(clause.incrementHours).isZero()) {
      issues.push({
        index,
        field: 'incrementHours',
        message: 'Say the step in which hours count.',
      });
    }
  });
  return issues;
}
