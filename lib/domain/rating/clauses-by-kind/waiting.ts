import type { TicketFacts } from '../../facts';
import { count, extend, type Money, money, type Quantity, quantity } from '../../money/money';
import { unrollPastMidnight } from '../../time/clock-minutes';
import { dollars, figure, price, yards } from '../../words';
import { atLeastZero, type ClauseOf, type LoadRule, loadName, type Rated } from './rule';
import { spanOf, type TimeSpan } from './time-span';

const LABEL = 'Waiting';

function timeOnSite(ticket: TicketFacts, until: 'finished' | 'left'): TimeSpan {
  const [batched = null, arrived = null, started = null, finished = null, left = null] =
    unrollPastMidnight([
      ticket.batchedAt,
      ticket.arrivedAt,
      ticket.startedAt,
      ticket.finishedAt,
      ticket.leftAt,
    ]);
  const toFinish = until === 'finished';
  return spanOf({
    start: { name: 'arrival', at: arrived },
    end: toFinish ? { name: 'finish', at: finished } : { name: 'leaving', at: left },
    inside: toFinish ? [started] : [started, finished],
    before: batched,
    after: toFinish ? left : null,
  });
}

function freeMinutes(clause: ClauseOf<'waiting'>, delivered: Quantity) {
  if (clause.free.basis === 'perLoad') {
    const minutes = quantity(clause.free.minutes);
    return { minutes, words: `free ${figure(minutes)} min` };
  }
  const each = quantity(clause.free.minutesPerYd3);
  const minutes = each.times(delivered) as Quantity;
  return {
    minutes,
    words: `free ${figure(each)} min × ${yards(delivered)} = ${figure(minutes)}`,
  };
}

function chargeOf(minutes: number, free: Quantity, rate: Money): Money {
  return extend(atLeastZero(count(minutes).minus(free)), rate);
}

function notProvable(
  ticket: TicketFacts,
  span: Extract<TimeSpan, { known: false }>,
  free: { minutes: Quantity; words: string },
  rate: Money,
): Rated {
  const lowest = chargeOf(span.atLeastMinutes, free.minutes, rate);
  const highest =
    span.atMostMinutes === null ? null : chargeOf(span.atMostMinutes, free.minutes, rate);
  const missing = `no time of ${span.missing.join(' or ')} on the ticket`;
  if (highest?.isZero()) {
    const why = `${missing}, but ${span.atMostMinutes} min at most, ${free.words}`;
    return {
      status: 'owed',
      label: LABEL,
      quantity: count(0),
      unit: 'min',
      rate,
      explanation: {
        sentence: `${loadName(ticket)}: ${why}; no waiting is owed.`,
        steps: [{ label: 'Not owed', value: why }],
      },
    };
  }
  const range =
    highest === null
      ? `at least ${dollars(lowest)}`
      : `between ${dollars(lowest)} and ${dollars(highest)}`;
  return {
    status: 'notProvable',
    label: LABEL,
    missing: span.missing,
    lowest,
    highest,
    explanation: {
      sentence: `${loadName(ticket)}: ${missing}; ${free.words}; waiting is not provable, ${range}.`,
      steps: [
        { label: 'Missing', value: span.missing.join(', ') },
        { label: 'Free', value: free.words },
        { label: 'Could be', value: range },
      ],
    },
  };
}

/**
 * Minutes on site beyond the free ones, per load or per yard, from arrival until the load is
 * finished or the truck leaves. Minutes are exact: 3 min × 10.50 yd leaves halves. A missing time
 * makes the charge not provable, within the bounds that the other times give.
 */
export const waitingRule: LoadRule<'waiting'> = {
  chargeKind: 'waiting',
  describe(clause) {
    const free =
      clause.free.basis === 'perLoad'
        ? `${figure(quantity(clause.free.minutes))} minutes a load`
        : `${figure(quantity(clause.free.minutesPerYd3))} minutes a yard`;
    const until = clause.until === 'finished' ? 'the load is finished' : 'the truck leaves';
    return `Waiting: ${free} free, then ${price(money(clause.dollarsPerMinute))} a minute, from arrival until ${until}.`;
  },
  rate(clause, { ticket }) {
    const rate = money(clause.dollarsPerMinute);
    const free = freeMinutes(clause, ticket.quantityYd3);
    const span = timeOnSite(ticket, clause.until);
    if (!span.known) return notProvable(ticket, span, free, rate);
    const onSite = `on site ${span.words}`;
    const charged = atLeastZero(count(span.minutes).minus(free.minutes));
    const owed = `${figure(charged)} min × ${price(rate)} = ${dollars(extend(charged, rate))}`;
    const outcome = charged.isZero()
      ? 'nothing beyond that, so no waiting is owed'
      : `${figure(charged)} charged × ${price(rate)} = ${dollars(extend(charged, rate))}`;
    return {
      status: 'owed',
      label: LABEL,
      quantity: charged,
      unit: 'min',
      rate,
      explanation: {
        sentence: `${loadName(ticket)}: ${onSite}; ${free.words}; ${outcome}.`,
        steps: [
          { label: 'On site', value: span.words },
          { label: 'Free', value: free.words.replace('free ', '') },
          { label: 'Owed', value: owed },
        ],
      },
    };
  },
};
