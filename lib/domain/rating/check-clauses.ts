import type { Clause, ClauseKind } from './clauses';
import { mixKey } from './mix-code';

/** Something about a list of clauses that cannot be right, at the field where it shows. */
export interface ClauseIssue {
  readonly code: 'mixTwice' | 'clauseTwice' | 'feeTwice' | 'taxMissesCharges';
  readonly severity: 'error' | 'warning';
  readonly clauseIndex: number;
  readonly field: string;
  readonly sentence: string;
}

const ONLY_ONCE: Partial<Record<ClauseKind, string>> = {
  shortLoad: 'short-load charge',
  waiting: 'waiting charge',
  pumpTime: 'price of pump time',
  pumpYards: 'price of yards pumped',
  pumpSetUp: 'price of a set-up',
  tax: 'sales tax',
};

/** What two clauses must not share, with the field that would have to change. */
function identity(clause: Clause) {
  if (clause.kind === 'mixPrice') {
    const code = clause.mixCode === null ? 'any mix not listed' : `mix ${clause.mixCode}`;
    const key = `mix:${clause.mixCode === null ? '*' : mixKey(clause.mixCode)}`;
    return { key, code: 'mixTwice', field: 'mixCode', what: `price of ${code}` } as const;
  }
  if (clause.kind === 'perLoadFee' || clause.kind === 'perYardFee') {
    const key = `fee:${clause.name.toLowerCase().replace(/[^a-z0-9]/g, '')}`;
    return { key, code: 'feeTwice', field: 'name', what: `fee named ${clause.name}` } as const;
  }
  const what = ONLY_ONCE[clause.kind] ?? clause.kind;
  return { key: clause.kind, code: 'clauseTwice', field: 'kind', what } as const;
}

/**
 * Issues of a rate sheet as a whole, for its form: two clauses for the same thing (only the first
 * would ever be used), and tax that names kinds of charge which the sheet does not have.
 */
export function checkClauses(clauses: readonly Clause[]): ClauseIssue[] {
  const issues: ClauseIssue[] = [];
  const first = new Map<string, number>();
  clauses.forEach((clause, clauseIndex) => {
    const { key, code, field, what } = identity(clause);
    const earlier = first.get(key);
    if (earlier === undefined) {
      first.set(key, clauseIndex);
      return;
    }
    const sentence = `Clause ${earlier + 1} already gives the ${what}; a sheet can have only one.`;
    issues.push({ code, severity: 'error', clauseIndex, field, sentence });
  });
  const kinds = new Set<ClauseKind>(clauses.map((clause) => clause.kind));
  clauses.forEach((clause, clauseIndex) => {
    if (clause.kind !== 'tax' || clause.taxes.some((kind) => kinds.has(kind))) return;
    const sentence = 'This tax applies to no charge of the sheet.';
    issues.push({
      code: 'taxMissesCharges',
      severity: 'warning',
      clauseIndex,
      field: 'taxes',
      sentence,
    });
  });
  return issues;
}
