import type { PumpTicketFacts, TicketFacts } from '../facts';
import { type Money, sumMoney, ZERO_MONEY } from '../money/money';
import { loadName } from '../rating/clauses-by-kind/rule';
import type { ExpectedLine } from '../rating/expected-line';
import { day, dollars, yards } from '../words';
import type { DraftFinding } from './draft';
import { amountOf } from './take';

/** A delivery that the bill leaves out, with what it should come to (tax not counted). */
export interface LeftOut {
  readonly delivery: TicketFacts | PumpTicketFacts;
  readonly kind: 'ticket' | 'pumpTicket';
  readonly expectedAmount: Money | null;
  readonly draft: DraftFinding;
}

export function leftOut(
  delivery: TicketFacts | PumpTicketFacts,
  expected: readonly ExpectedLine[],
): LeftOut {
  const isLoad = 'mixCode' in delivery;
  const what = isLoad
    ? `${loadName(delivery)}, ${day(delivery.date)}, ${yards(delivery.quantityYd3)} of ${delivery.mixCode}`
    : `Pump ticket ${delivery.number}, ${day(delivery.date)}`;
  const due = expected.filter((line) => !amountOf(line).isZero());
  const amount = sumMoney(due.map(amountOf));
  const unpriced = due.length === 0;
  const worth = unpriced ? 'no price is agreed' : `${dollars(amount)} is expected`;
  return {
    delivery,
    kind: isLoad ? 'ticket' : 'pumpTicket',
    expectedAmount: unpriced ? null : amount,
    draft: {
      kind: 'deliveredNotBilled',
      expected: amount,
      billed: ZERO_MONEY,
      clauseId: null,
      sentence: `${what}: delivered, but on no bill of the period; ${worth}.`,
      steps: due.map(({ label, explanation }) => ({
        label,
        value: explanation.steps.at(-1)?.value ?? explanation.sentence,
      })),
    },
  };
}
