import { type Money, money, sumMoney } from '../money/money';
import type { SheetLine, VarianceKind } from './finding';

export interface KindTotal {
  readonly count: number;
  readonly difference: Money;
}

/** A reconciliation in figures. `difference` = `billed` − `expected` = the lines' differences. */
export interface ReconcileTotals {
  /** All billed lines, and what printed sums add to them. */
  readonly billed: Money;
  /** What the sheet's rows should come to; a row that cannot be checked counts as billed. */
  readonly expected: Money;
  readonly difference: Money;
  /** Findings that are against us, and those in our favour, the tolerated ones left out. */
  readonly againstUs: Money;
  readonly inOurFavour: Money;
  readonly withinTolerance: Money;
  readonly lines: number;
  /** Billed lines without a finding. */
  readonly agreeing: number;
  readonly byKind: Readonly<Partial<Record<VarianceKind, KindTotal>>>;
}

export function totalsOf(lines: readonly SheetLine[]): ReconcileTotals {
  const findings = lines.flatMap((line) => line.findings);
  const byKind: Partial<Record<VarianceKind, KindTotal>> = {};
  for (const { kind, difference } of findings) {
    const before = byKind[kind];
    byKind[kind] = {
      count: (before?.count ?? 0) + 1,
      difference: before ? money(before.difference.plus(difference)) : difference,
    };
  }
  const differences = (wanted: (difference: Money, tolerated: boolean) => boolean) =>
    sumMoney(
      findings
        .filter((finding) => wanted(finding.difference, finding.withinTolerance))
        .map((finding) => finding.difference),
    );
  const billed = sumMoney(lines.flatMap((line) => line.billedAmount ?? []));
  const difference = sumMoney(lines.map((line) => line.difference));
  return {
    billed,
    expected: money(billed.minus(difference)),
    difference,
    againstUs: differences((amount, tolerated) => !tolerated && amount.isPositive()),
    inOurFavour: differences((amount, tolerated) => !tolerated && amount.isNegative()),
    withinTolerance: differences((_, tolerated) => tolerated),
    lines: lines.length,
    agreeing: lines.filter((line) => line.billLineId && line.findings.length === 0).length,
    byKind,
  };
}
