import type { BillLineFacts, OrderFacts, PumpTicketFacts, TicketFacts } from '../facts';
import { isMainCharge } from '../matching/delivery';
import type { HandMatch, Match, MatchResult } from '../matching/match';
import { inDocumentOrder, matchBill } from '../matching/match-bill';
import { ZERO_MONEY } from '../money/money';
import type { RateSheetFacts } from '../rating/clauses';
import { expectedBill } from '../rating/expected-bill';
import type { ExpectedBill, ExpectedLine } from '../rating/expected-line';
import { indexOrders } from '../rating/order-index';
import { indexSheets } from '../rating/sheet-index';
import { type FindingPlace, type Judgement, subtract, toFinding } from './draft';
import type { Finding, SheetLine, Tolerances } from './finding';
import { judge } from './judge';
import { judgeTax, type TaxScope, taxOwed, taxScopes, untaxedScopes } from './judge-tax';
import { leftOut } from './left-out';
import { caseOf, type EarlierLine, type LineCase, type Reckoning, reckon } from './line-case';
import { checkSums, type StatementFacts, type SumFinding } from './statement';
import { amountOf, takeCharges, takenFor } from './take';
import { type ReconcileTotals, totalsOf } from './totals';

export interface ReconcileInput {
  readonly rateSheets: readonly RateSheetFacts[];
  readonly orders: readonly OrderFacts[];
  readonly tickets: readonly TicketFacts[];
  readonly pumpTickets: readonly PumpTicketFacts[];
  /** Charges and tax of the bill. Credits and payments belong to the account, not here. */
  readonly billLines: readonly BillLineFacts[];
  readonly earlierLines: readonly EarlierLine[];
  readonly handMatches: readonly HandMatch[];
  readonly tolerances: Tolerances;
  /** Null: no sums to check, and every delivery given is within the period. */
  readonly statement: StatementFacts | null;
}

export interface Reconciliation {
  readonly expected: ExpectedBill;
  readonly matchResult: MatchResult;
  readonly lines: readonly SheetLine[];
  readonly findings: readonly Finding[];
  /** Owed on a billed delivery, but charged by no line: not claimed, only said. */
  readonly notCharged: readonly ExpectedLine[];
  readonly totals: ReconcileTotals;
}

function groupByLine(matches: readonly Match[]): Map<string, Match[]> {
  const byLine = new Map<string, Match[]>();
  for (const match of matches) {
    const list = byLine.get(match.billLineId) ?? [];
    list.push(match);
    byLine.set(match.billLineId, list);
  }
  return byLine;
}

function invoicesOf(lines: readonly BillLineFacts[], matches: ReadonlyMap<string, Match[]>) {
  const invoices = new Map<string, string>();
  for (const { id, chargeKind, invoiceNumber } of lines) {
    if (!isMainCharge(chargeKind) || invoiceNumber === null) continue;
    for (const { delivery } of matches.get(id) ?? []) {
      if (!invoices.has(delivery.id)) invoices.set(delivery.id, invoiceNumber);
    }
  }
  return invoices;
}

function billedRow(at: LineCase, judgement: Judgement, tolerances: Tolerances): SheetLine {
  const { line } = at;
  const ticketIds = at.tickets.map(({ id }) => id);
  const pumpTicketIds = at.pumpTickets.map(({ id }) => id);
  const place: FindingPlace = { billLineId: line.id, place: line.id, ticketIds, pumpTicketIds };
  const { expectedAmount, sentence, steps } = judgement;
  return {
    key: line.id,
    billLineId: line.id,
    ticketIds,
    pumpTicketIds,
    orderId: [...at.tickets, ...at.pumpTickets][0]?.orderId ?? null,
    chargeKind: line.chargeKind,
    expectedAmount,
    billedAmount: line.amount,
    difference: expectedAmount === null ? ZERO_MONEY : subtract(line.amount, expectedAmount),
    findings: judgement.findings.map((draft) => toFinding(draft, place, tolerances)),
    sentence,
    steps,
  };
}

function leftOutRow(
  delivery: TicketFacts | PumpTicketFacts,
  expected: readonly ExpectedLine[],
  tolerances: Tolerances,
): SheetLine {
  const { draft, kind, expectedAmount } = leftOut(delivery, expected);
  const key = `${kind}:${delivery.id}`;
  const ticketIds = kind === 'ticket' ? [delivery.id] : [];
  const pumpTicketIds = kind === 'pumpTicket' ? [delivery.id] : [];
  const place: FindingPlace = { billLineId: null, place: key, ticketIds, pumpTicketIds };
  return {
    key,
    billLineId: null,
    ticketIds,
    pumpTicketIds,
    orderId: delivery.orderId,
    chargeKind: kind === 'ticket' ? 'mix' : 'pumpTime',
    expectedAmount,
    billedAmount: null,
    difference: subtract(ZERO_MONEY, draft.expected),
    findings: [toFinding(draft, place, tolerances)],
    sentence: draft.sentence,
    steps: draft.steps,
  };
}

/** A row without a line and a delivery: a printed sum that is off, tax that an invoice leaves out. */
function looseRow(
  key: string,
  chargeKind: SheetLine['chargeKind'],
  draft: SumFinding['draft'],
  tolerances: Tolerances,
): SheetLine {
  const place: FindingPlace = { billLineId: null, place: key, ticketIds: [], pumpTicketIds: [] };
  const finding = toFinding(draft, place, tolerances);
  const isSum = draft.kind === 'arithmeticWrong';
  return {
    key,
    billLineId: null,
    ticketIds: [],
    pumpTicketIds: [],
    orderId: null,
    chargeKind,
    // A printed sum adds to the bill only what it is off by; its lines have rows of their own.
    expectedAmount: isSum ? ZERO_MONEY : draft.expected,
    billedAmount: isSum ? finding.difference : draft.billed,
    difference: finding.difference,
    findings: [finding],
    sentence: draft.sentence,
    steps: draft.steps,
  };
}

function untaxedRow(scope: TaxScope, tolerances: Tolerances): SheetLine {
  const { amount, words, tax } = taxOwed(scope);
  const sentence = `No tax is billed on ${scope.name}, though others have theirs: ${words}.`;
  const draft = {
    kind: 'taxWrong',
    expected: amount,
    billed: ZERO_MONEY,
    clauseId: tax?.id ?? null,
    sentence,
    steps: [{ label: 'Tax', value: words }],
  } as const;
  return looseRow(`tax:${scope.name}`, 'tax', draft, tolerances);
}

function leftOutDeliveries(
  { statement, billLines, tickets, pumpTickets }: ReconcileInput,
  { unbilledTicketIds, unbilledPumpTicketIds }: MatchResult,
) {
  const suppliers = new Set(billLines.map((line) => line.supplierId));
  const byId = new Map<string, TicketFacts | PumpTicketFacts>();
  for (const delivery of [...tickets, ...pumpTickets]) byId.set(delivery.id, delivery);
  return [...unbilledTicketIds, ...unbilledPumpTicketIds]
    .flatMap((id) => byId.get(id) ?? [])
    .filter(
      ({ date, supplierId }) =>
        (billLines.length === 0 || suppliers.has(supplierId)) &&
        (!statement || (statement.periodStart <= date && date <= statement.periodEnd)),
    );
}

function latestDay(lines: readonly BillLineFacts[]): string {
  return (
    lines
      .flatMap((line) => line.date ?? [])
      .sort()
      .at(-1) ?? ''
  );
}

interface Judged {
  readonly cases: readonly LineCase[];
  readonly judgements: ReadonlyMap<string, Judgement>;
  readonly untaxed: readonly TaxScope[];
  readonly takenKeys: ReadonlySet<string>;
}

function judgeAll(
  input: ReconcileInput,
  lines: readonly BillLineFacts[],
  matches: ReadonlyMap<string, Match[]>,
  reckoning: Reckoning,
): Judged {
  const cases = lines.map((line) => caseOf(line, matches.get(line.id) ?? [], reckoning));
  const charges = cases.filter(({ line }) => line.chargeKind !== 'tax');
  const taken = takeCharges(charges, input.earlierLines, reckoning);
  const judgements = new Map<string, Judgement>();
  for (const at of charges) {
    judgements.set(at.line.id, judge(at, takenFor(at, taken), reckoning));
  }
  const orders = indexOrders(input.orders, input.tickets);
  const taxLines = lines.filter((line) => line.chargeKind === 'tax');
  const scopes = taxScopes(taxLines, charges, taken, input.orders, orders);
  for (const scope of scopes) {
    for (const [id, judgement] of judgeTax(scope)) judgements.set(id, judgement);
  }
  const takenKeys = new Set(
    [...taken.values()].flatMap(({ expected }) => expected.map(({ key }) => key)),
  );
  return { cases, judgements, untaxed: untaxedScopes(scopes), takenKeys };
}

/**
 * Holds a bill against what was agreed and delivered.
 *
 * Rows: one per billed line in document order, then one per delivery of the period that no bill
 * charges, then tax left out and printed sums that are off. Every dollar is in one finding:
 *
 * - An expected charge (a clause on a ticket) belongs to at most one billed line: the earlier
 *   bill that has it, else the line that fits best. A line whose charge another one has is
 *   billed twice as a whole.
 * - A line that misses several facts is split along delivered × agreed → billed quantity ×
 *   agreed → billed quantity × billed price → printed amount; each step is one finding, and the
 *   steps add up to the line's difference. Two cents are left to rounding.
 * - Fees on the wrong yards are their own lines' findings; tax is held against the tax on the
 *   charges *as billed*, so wrong yards do not come back on the tax line.
 * - What was not agreed is called that, whether or not its delivery is found; what was agreed but
 *   has no delivery is billed, not delivered.
 * - Where no sheet applies the row has no expected amount and no difference; yards and double
 *   billing are still found, at the billed price.
 *
 * The lines' differences add up to billed − expected total. The result does not depend on the
 * order of the input, and finding keys stay the same from run to run.
 */
export function reconcile(input: ReconcileInput): Reconciliation {
  const lines = inDocumentOrder(input.billLines);
  const alreadyBilledIds = new Set(
    input.earlierLines
      .filter(({ chargeKind }) => isMainCharge(chargeKind))
      .flatMap((line) => [...line.ticketIds, ...line.pumpTicketIds]),
  );
  const matchResult = matchBill({
    lines,
    tickets: input.tickets,
    pumpTickets: input.pumpTickets,
    handMatches: input.handMatches,
    alreadyBilledIds,
  });
  const matches = groupByLine(matchResult.matches);
  const expected = expectedBill({ ...input, invoiceOf: invoicesOf(lines, matches) });
  const fallbackDay = input.statement?.periodEnd ?? latestDay(lines);
  const reckoning = reckon(expected, input, indexSheets(input.rateSheets), fallbackDay);
  const { cases, judgements, untaxed, takenKeys } = judgeAll(input, lines, matches, reckoning);
  const { tolerances } = input;
  const untaken = (id: string) =>
    (reckoning.expectedOf.get(id) ?? []).filter(({ key }) => !takenKeys.has(key));
  const missing = leftOutDeliveries(input, matchResult);
  const rows: SheetLine[] = [
    ...cases.map((at) => {
      const judgement = judgements.get(at.line.id);
      if (!judgement) throw new Error(`line ${at.line.id} was not judged`);
      return billedRow(at, judgement, tolerances);
    }),
    ...missing.map((delivery) => leftOutRow(delivery, untaken(delivery.id), tolerances)),
    ...untaxed.map((scope) => untaxedRow(scope, tolerances)),
    ...checkSums(input.statement, lines).map(({ place, draft }) =>
      looseRow(`statement:${place}`, place === 'tax' ? 'tax' : 'other', draft, tolerances),
    ),
  ];
  const billedHere = new Set(matchResult.matches.map(({ delivery }) => delivery.id));
  const missingIds = new Set(missing.map(({ id }) => id));
  return {
    expected,
    matchResult,
    lines: rows,
    findings: rows.flatMap((row) => row.findings),
    notCharged: [...billedHere]
      .filter((id) => !missingIds.has(id) && !alreadyBilledIds.has(id))
      .flatMap(untaken)
      .filter((line) => line.status === 'owed' && !amountOf(line).isZero()),
    totals: totalsOf(rows),
  };
}
