import type { BillLineFacts, PumpTicketFacts, TicketFacts } from '../facts';
import { type MatchBook, openBook } from './book';
import { matchByNumber } from './by-number';
import { matchByScore } from './by-score';
import { matchBySum } from './by-sum';
import { type Delivery, isMainCharge, loadDelivery, pumpDelivery } from './delivery';
import { matchFees } from './fees';
import type { HandMatch, MatchResult } from './match';

export interface MatchInput {
  readonly lines: readonly BillLineFacts[];
  readonly tickets: readonly TicketFacts[];
  readonly pumpTickets: readonly PumpTicketFacts[];
  readonly handMatches: readonly HandMatch[];
  /**
   * Tickets and pump tickets that earlier bills charge. A line may still name one by its number
   * (it is then billed twice), but none is found for a line that has no number.
   */
  readonly alreadyBilledIds?: ReadonlySet<string>;
}

function keepHandMatches(book: MatchBook, handMatches: readonly HandMatch[]): void {
  const lines = new Map(book.lines.map((line) => [line.id, line]));
  const deliveries = new Map(book.deliveries.map((delivery) => [delivery.id, delivery]));
  const chosen = new Map<string, Delivery[]>();
  for (const { billLineId, delivery } of handMatches) {
    const list = chosen.get(billLineId) ?? [];
    const found = delivery && deliveries.get(delivery.id);
    if (found && !list.includes(found)) list.push(found);
    // A match to a delivery that is gone says nothing any more; "none of them" still does.
    if (found || delivery === null) chosen.set(billLineId, list);
  }
  for (const [lineId, list] of chosen) {
    const line = lines.get(lineId);
    if (!line) continue;
    if (list.length === 0) book.settleWithout(line);
    else {
      const sorted = [...list].sort(inOrder);
      book.settle(line, sorted, { method: 'hand', confidence: 1, reason: 'Matched by hand.' });
    }
  }
}

function inOrder(one: Delivery, other: Delivery): number {
  for (const key of ['date', 'number', 'kind', 'id'] as const) {
    if (one[key] !== other[key]) return one[key] < other[key] ? -1 : 1;
  }
  return 0;
}

/** Lines as they stand on the document; the order in which they come in does not matter. */
export function inDocumentOrder<L extends BillLineFacts>(lines: readonly L[]): L[] {
  return [...lines].sort(
    (one, other) => one.position - other.position || (one.id < other.id ? -1 : 1),
  );
}

/**
 * Puts billed lines and deliveries together: a person's own matches first, then by number as
 * printed, by looser readings of the number, by score at minimum cost, by loads that add up, and
 * last the fees. Every line is matched or in `unmatchedLineIds` (tax lines without a number
 * always are: they belong to an invoice). A delivery counts as billed when a main charge (mix,
 * pump time) is matched to it here or it is already billed; its yards go to one main charge only,
 * unless another line prints its number too, which is then tied to it and says so.
 */
export function matchBill(input: MatchInput): MatchResult {
  const deliveries = [
    ...input.tickets.map(loadDelivery),
    ...input.pumpTickets.map(pumpDelivery),
  ].sort(inOrder);
  const already = input.alreadyBilledIds ?? new Set<string>();
  const book = openBook(inDocumentOrder(input.lines), deliveries, already);
  keepHandMatches(book, input.handMatches);
  matchByNumber(book);
  matchByScore(book);
  matchBySum(book);
  matchFees(book);
  const billed = new Set<string>(already);
  const byHand = new Set(input.handMatches.map(({ billLineId }) => billLineId));
  for (const line of book.lines) {
    const { chargeKind } = line;
    if (!isMainCharge(chargeKind) && chargeKind !== 'other') continue;
    for (const { id } of book.deliveriesOf(line.id)) {
      if (isMainCharge(chargeKind) || byHand.has(line.id)) billed.add(id);
    }
  }
  const unbilled = (kind: Delivery['kind']) =>
    book.deliveries.filter((one) => one.kind === kind && !billed.has(one.id)).map(({ id }) => id);
  return {
    matches: book.matches(),
    unmatchedLineIds: book.lines
      .filter((line) => book.deliveriesOf(line.id).length === 0)
      .map(({ id }) => id),
    unbilledTicketIds: unbilled('ticket'),
    unbilledPumpTicketIds: unbilled('pumpTicket'),
  };
}
