import type { StoredBillLine } from '../../../db/queries/sheet-facts';
import type { StoredStrike, StoredVariance } from '../../../db/queries/sheet-state';
import type {
  Settlement,
  SheetDelivery,
  SheetFinding,
  SheetRow,
  Verdict,
} from '../../contracts/sheet';
import type { OrderFacts, PumpTicketFacts, TicketFacts } from '../../domain/facts';
import type { Match } from '../../domain/matching/match';
import { moneyText, quantityText } from '../../domain/money/money';
import type { Finding, SheetLine } from '../../domain/variance/finding';
import type { Reconciliation } from '../../domain/variance/reconcile';
import { minutesOnSite } from '../../domain/yield/summary';
import type { SheetFacts } from './sheet-facts';

const byId = <One extends { readonly id: string }>(rows: readonly One[]) =>
  new Map(rows.map((row) => [row.id, row]));

function ticketDelivery(ticket: TicketFacts): SheetDelivery {
  return {
    kind: 'ticket',
    id: ticket.id,
    number: ticket.number,
    date: ticket.date,
    quantityYd3: quantityText(ticket.quantityYd3),
    mixCode: ticket.mixCode,
    truck: ticket.truck,
    loadNumber: ticket.loadNumber,
    onSiteMinutes: minutesOnSite(ticket),
  };
}

function pumpDelivery(pump: PumpTicketFacts): SheetDelivery {
  const end = pump.finishedAt ?? pump.leftAt;
  return {
    kind: 'pumpTicket',
    id: pump.id,
    number: pump.number,
    date: pump.date,
    quantityYd3: quantityText(pump.pumpedYd3),
    mixCode: null,
    truck: null,
    loadNumber: null,
    onSiteMinutes: pump.arrivedAt === null || end === null ? null : end - pump.arrivedAt,
  };
}

export { pumpDelivery, ticketDelivery };

function orderedSide(order: OrderFacts | undefined, jobName: string | null): SheetRow['ordered'] {
  if (order) {
    return {
      orderId: order.id,
      orderNumber: order.number,
      jobName: order.jobName ?? '',
      mixCode: order.mixCode,
      quantityYd3: quantityText(order.orderedYd3),
    };
  }
  if (jobName === null) return null;
  return { orderId: null, orderNumber: null, jobName, mixCode: null, quantityYd3: null };
}

function billedSide(line: StoredBillLine): NonNullable<SheetRow['billed']> {
  return {
    lineId: line.id,
    position: line.position,
    sourceLine: line.sourceLine,
    invoiceNumber: line.invoiceNumber,
    date: line.date,
    ticketNumber: line.ticketNumber,
    jobName: line.jobName,
    description: line.description,
    mixCode: line.mixCode,
    quantity: line.quantity,
    unit: line.unit,
    unitPrice: line.unitPrice,
    amount: line.amount,
  };
}

function findingOf(finding: Finding): SheetFinding {
  return {
    key: finding.key,
    kind: finding.kind,
    expected: moneyText(finding.expected),
    billed: moneyText(finding.billed),
    difference: moneyText(finding.difference),
    withinTolerance: finding.withinTolerance,
    sentence: finding.sentence,
    steps: finding.steps.map(({ label, value }) => ({ label, value })),
  };
}

function verdictOf(line: SheetLine): Verdict {
  if (line.findings.some((finding) => !finding.withinTolerance)) return 'finding';
  if (line.findings.length > 0) return 'withinTolerance';
  return line.expectedAmount === null ? 'notChecked' : 'agrees';
}

function kindOf(line: SheetLine): SheetRow['kind'] {
  if (line.billLineId !== null) return line.chargeKind === 'tax' ? 'tax' : 'charge';
  return line.ticketIds.length + line.pumpTicketIds.length > 0 ? 'unbilled' : 'document';
}

/** The surest tie of a line stands for all of them: its reason is what a person wants to read. */
function matchOf(matches: readonly Match[]): SheetRow['match'] {
  const [first] = matches;
  if (!first) return null;
  const weakest = matches.reduce(
    (low, one) => (one.confidence < low.confidence ? one : low),
    first,
  );
  return { method: weakest.method, confidence: weakest.confidence, reason: weakest.reason };
}

/** A credit or payment: part of the supplier's account, held against no delivery. */
function accountRow(line: StoredBillLine): SheetRow {
  return {
    key: line.id,
    kind: line.lineKind === 'payment' ? 'payment' : 'credit',
    chargeKind: line.chargeKind,
    ordered: null,
    deliveries: [],
    billed: billedSide(line),
    expected: null,
    difference: '0.00',
    verdict: 'agrees',
    findings: [],
    sentence: 'It moves the account’s balance and is held against no delivery.',
    steps: [],
    match: null,
    settled: null,
  };
}

/**
 * A settlement counts while what it settled still stands: a struck row that no longer agrees,
 * and an accepted or claimed one whose amounts have changed, are open again.
 */
function settlementOf(
  row: SheetRow,
  strike: StoredStrike | undefined,
  variances: ReadonlyMap<string, StoredVariance>,
): Settlement | null {
  if (!strike) return null;
  const open = row.findings.filter((finding) => !finding.withinTolerance);
  const stillHolds =
    strike.state === 'struck'
      ? open.length === 0 && row.verdict !== 'notChecked'
      : open.every((finding) => {
          const kept = variances.get(finding.key);
          return kept?.status === strike.state && kept.difference === finding.difference;
        });
  if (!stillHolds) return null;
  return {
    state: strike.state,
    reason: strike.reason,
    by: strike.madeByName,
    at: strike.madeAt.toISOString(),
  };
}

/** The rows of the strike-off sheet: the bill's lines in its own order, then what it leaves out. */
export function sheetRows(
  facts: SheetFacts,
  result: Reconciliation,
  strikes: readonly StoredStrike[],
  variances: readonly StoredVariance[],
): SheetRow[] {
  const { input, storedLines } = facts;
  const lines = byId(storedLines);
  const tickets = byId(input.tickets);
  const pumps = byId(input.pumpTickets);
  const orders = byId(input.orders);
  const strikeOf = new Map(strikes.map((strike) => [strike.rowKey, strike]));
  const varianceOf = new Map(variances.map((variance) => [variance.key, variance]));
  const tied = new Map<string, Match[]>();
  for (const match of result.matchResult.matches) {
    tied.set(match.billLineId, [...(tied.get(match.billLineId) ?? []), match]);
  }
  const engineRows = result.lines.map((line): SheetRow => {
    const stored = line.billLineId === null ? undefined : lines.get(line.billLineId);
    const loads = line.ticketIds.flatMap((id) => tickets.get(id) ?? []);
    const pumped = line.pumpTicketIds.flatMap((id) => pumps.get(id) ?? []);
    const jobName = [...loads, ...pumped][0]?.jobName ?? null;
    return {
      key: line.key,
      kind: kindOf(line),
      chargeKind: line.chargeKind,
      ordered: orderedSide(orders.get(line.orderId ?? ''), jobName),
      deliveries: [...loads.map(ticketDelivery), ...pumped.map(pumpDelivery)],
      billed: stored ? billedSide(stored) : null,
      expected: line.expectedAmount === null ? null : moneyText(line.expectedAmount),
      difference: moneyText(line.difference),
      verdict: verdictOf(line),
      findings: line.findings.map(findingOf),
      sentence: line.sentence,
      steps: line.steps.map(({ label, value }) => ({ label, value })),
      match: line.billLineId === null ? null : matchOf(tied.get(line.billLineId) ?? []),
      settled: null,
    };
  });
  const accountRows = storedLines
    .filter(({ lineKind }) => lineKind === 'credit' || lineKind === 'payment')
    .map(accountRow);
  const position = (row: SheetRow) => row.billed?.position ?? Number.MAX_SAFE_INTEGER;
  return [...engineRows, ...accountRows]
    .map((row, index) => ({ row, index }))
    .sort((one, other) => position(one.row) - position(other.row) || one.index - other.index)
    .map(({ row }) => ({
      ...row,
      settled: settlementOf(row, strikeOf.get(row.key), varianceOf),
    }));
}
