import type { BillLineFacts, ChargeKind, PumpTicketFacts, TicketFacts } from '../facts';
import type { Match } from '../matching/match';
import { ZERO_MONEY } from '../money/money';
import type { IdentifiedClause, RateSheetFacts } from '../rating/clauses';
import { loadName } from '../rating/clauses-by-kind/rule';
import type { ExpectedBill, ExpectedLine } from '../rating/expected-line';
import type { PreparedSheet, SheetIndex } from '../rating/sheet-index';
import { counted, day } from '../words';
import { bestNamed } from './charge-name';

/** A line of an earlier statement with the deliveries that it was matched to. */
export type EarlierLine = BillLineFacts & {
  readonly ticketIds: readonly string[];
  readonly pumpTicketIds: readonly string[];
};

/** Who charges an expected line: a line of this bill, or one of an earlier bill. */
export interface Taker {
  readonly line: BillLineFacts;
  readonly isEarlier: boolean;
}

/** A billed line with all that is needed to judge it. */
export interface LineCase {
  readonly line: BillLineFacts;
  readonly tickets: readonly TicketFacts[];
  readonly pumpTickets: readonly PumpTicketFacts[];
  /** "Load 447182, truck 214", "3 loads of 3 Sep 2026", or "Line 12" without a delivery. */
  readonly name: string;
  readonly sheet: PreparedSheet | null;
  /** This charge on these deliveries as agreed, whoever bills it. */
  readonly candidates: readonly ExpectedLine[];
}

/** What reconciling looks things up in. */
export interface Reckoning {
  readonly tickets: ReadonlyMap<string, TicketFacts>;
  readonly pumpTickets: ReadonlyMap<string, PumpTicketFacts>;
  readonly sheets: SheetIndex;
  readonly clauses: ReadonlyMap<string, IdentifiedClause>;
  readonly expectedOf: ReadonlyMap<string, readonly ExpectedLine[]>;
  /** The day by which a line without date and delivery is held against a sheet. */
  readonly fallbackDay: string;
}

/**
 * A delivery without an agreed price still has a main charge that only one line may bill, so it
 * gets a line of no known amount.
 */
function addUnpriced(
  expectedOf: Map<string, ExpectedLine[]>,
  delivery: TicketFacts | PumpTicketFacts,
  chargeKind: 'mix' | 'pumpTime',
): void {
  const list = expectedOf.get(delivery.id) ?? [];
  if (list.some((line) => line.chargeKind === chargeKind)) return;
  const { id, number, date, supplierId, orderId, jobId } = delivery;
  const sentence = `No rate sheet in effect on ${day(date)} has a price for ${number}.`;
  list.push({
    key: `unpriced:${id}`,
    chargeKind,
    clauseId: '',
    rateSheetId: '',
    supplierId,
    label: 'No agreed price',
    date,
    ticketIds: chargeKind === 'mix' ? [id] : [],
    pumpTicketIds: chargeKind === 'mix' ? [] : [id],
    orderId,
    jobId,
    explanation: { sentence, steps: [] },
    status: 'notProvable',
    missing: ['agreed price'],
    lowest: ZERO_MONEY,
    highest: null,
  });
  expectedOf.set(id, list);
}

export function reckon(
  expected: ExpectedBill,
  facts: {
    readonly tickets: readonly TicketFacts[];
    readonly pumpTickets: readonly PumpTicketFacts[];
    readonly rateSheets: readonly RateSheetFacts[];
  },
  sheets: SheetIndex,
  fallbackDay: string,
): Reckoning {
  const expectedOf = new Map<string, ExpectedLine[]>();
  for (const line of [...expected.lines, ...expected.notOwed]) {
    if (line.chargeKind === 'tax') continue;
    for (const id of [...line.ticketIds, ...line.pumpTicketIds]) {
      const list = expectedOf.get(id) ?? [];
      list.push(line);
      expectedOf.set(id, list);
    }
  }
  for (const ticket of facts.tickets) addUnpriced(expectedOf, ticket, 'mix');
  for (const ticket of facts.pumpTickets) addUnpriced(expectedOf, ticket, 'pumpTime');
  return {
    tickets: new Map(facts.tickets.map((ticket) => [ticket.id, ticket])),
    pumpTickets: new Map(facts.pumpTickets.map((ticket) => [ticket.id, ticket])),
    sheets,
    clauses: new Map(
      facts.rateSheets.flatMap((sheet) => sheet.clauses.map((clause) => [clause.id, clause])),
    ),
    expectedOf,
    fallbackDay,
  };
}

const SAME_CHARGE: Partial<Record<ChargeKind, ChargeKind>> = { pumpMinimum: 'pumpTime' };
const FEES: readonly ChargeKind[] = ['perLoadFee', 'perYardFee'];

export function isFee(kind: ChargeKind): boolean {
  return FEES.includes(kind) || kind === 'other';
}

/** The expected lines of one delivery that a billed line may be charging. */
function sameCharge(line: BillLineFacts, expected: readonly ExpectedLine[]): ExpectedLine[] {
  if (isFee(line.chargeKind)) {
    const fees = expected.filter(({ chargeKind }) => FEES.includes(chargeKind));
    const named = bestNamed(line.description, fees);
    return named ? [named] : [];
  }
  const kind = SAME_CHARGE[line.chargeKind] ?? line.chargeKind;
  return expected.filter(({ chargeKind }) => chargeKind === kind);
}

export function candidatesFor(
  line: BillLineFacts,
  deliveryIds: readonly string[],
  { expectedOf }: Reckoning,
): ExpectedLine[] {
  return deliveryIds.flatMap((id) => sameCharge(line, expectedOf.get(id) ?? []));
}

function nameOf(
  line: BillLineFacts,
  tickets: readonly TicketFacts[],
  pumpTickets: readonly PumpTicketFacts[],
): string {
  const [ticket] = tickets;
  const [pumpTicket] = pumpTickets;
  if (ticket && tickets.length === 1) return loadName(ticket);
  if (ticket) return `${counted(tickets.length, 'load')} of ${day(ticket.date)}`;
  if (pumpTicket && pumpTickets.length === 1) {
    return `Pump ticket ${pumpTicket.number}, ${day(pumpTicket.date)}`;
  }
  if (pumpTicket) return `${pumpTickets.length} pump tickets of ${day(pumpTicket.date)}`;
  return line.ticketNumber ? `Ticket ${line.ticketNumber}` : `Line ${line.position}`;
}

export function caseOf(
  line: BillLineFacts,
  matches: readonly Match[],
  reckoning: Reckoning,
): LineCase {
  const tickets = matches.flatMap(({ delivery }) => reckoning.tickets.get(delivery.id) ?? []);
  const pumpTickets = matches.flatMap(
    ({ delivery }) => reckoning.pumpTickets.get(delivery.id) ?? [],
  );
  const [delivery] = [...tickets, ...pumpTickets];
  const ids = [...tickets, ...pumpTickets].map(({ id }) => id);
  return {
    line,
    tickets,
    pumpTickets,
    name: nameOf(line, tickets, pumpTickets),
    sheet: reckoning.sheets.sheetFor(
      line.supplierId,
      delivery?.jobId ?? null,
      delivery?.date ?? line.date ?? reckoning.fallbackDay,
    ),
    candidates: candidatesFor(line, ids, reckoning),
  };
}
