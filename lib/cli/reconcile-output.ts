import { moneyText } from '../domain/money/money';
import type { ExpectedLine } from '../domain/rating/expected-line';
import type { Finding } from '../domain/variance/finding';
import type { Reconciliation } from '../domain/variance/reconcile';

/** The result as plain JSON: amounts as text with two places, quantities and rates as they are. */

function expectedJson(line: ExpectedLine) {
  const { key, chargeKind, clauseId, label, date, ticketIds, pumpTicketIds, explanation } = line;
  const what = { key, chargeKind, clauseId, label, date, ticketIds, pumpTicketIds };
  if (line.status === 'notProvable') {
    return {
      ...what,
      status: line.status,
      missing: line.missing,
      lowest: moneyText(line.lowest),
      highest: line.highest && moneyText(line.highest),
      explanation,
    };
  }
  return {
    ...what,
    status: line.status,
    quantity: line.quantity.toFixed(),
    unit: line.unit,
    rate: line.rate.toFixed(),
    amount: moneyText(line.amount),
    explanation,
  };
}

function findingJson(finding: Finding) {
  return {
    ...finding,
    expected: moneyText(finding.expected),
    billed: moneyText(finding.billed),
    difference: moneyText(finding.difference),
  };
}

export function outputJson(result: Reconciliation) {
  const { totals, matchResult, expected } = result;
  return {
    matches: matchResult.matches,
    unmatchedLineIds: matchResult.unmatchedLineIds,
    unbilledTicketIds: matchResult.unbilledTicketIds,
    unbilledPumpTicketIds: matchResult.unbilledPumpTicketIds,
    variances: result.findings.map(findingJson),
    expected: { lines: expected.lines.map(expectedJson), unrated: expected.unrated },
    notCharged: result.notCharged.map(expectedJson),
    totals: {
      billed: moneyText(totals.billed),
      expected: moneyText(totals.expected),
      difference: moneyText(totals.difference),
      againstUs: moneyText(totals.againstUs),
      inOurFavour: moneyText(totals.inOurFavour),
      lines: totals.lines,
      agreeing: totals.agreeing,
      byKind: Object.fromEntries(
        Object.entries(totals.byKind).map(([kind, total]) => [
          kind,
          { count: total.count, difference: moneyText(total.difference) },
        ]),
      ),
    },
  };
}
