import Decimal from 'decimal.js';
import type { PumpTicketFacts } from '../../facts';
import { count, extend, type Money, money, type Quantity, quantity } from '../../money/money';
import { unrollPastMidnight } from '../../time/clock-minutes';
import { counted, day, dollars, figure, price, yards } from '../../words';
import { atLeastZero, type ClauseOf, type PumpRule, type Rated } from './rule';
import { spanOf, type TimeSpan } from './time-span';

const TIME_LABEL = 'Pump time';

function pumpName(ticket: PumpTicketFacts): string {
  return `Pump ticket ${ticket.number}, ${day(ticket.date)}`;
}

function measuredTime(ticket: PumpTicketFacts, measured: 'onSite' | 'portalToPortal'): TimeSpan {
  const [leftYard = null, arrived = null, finished = null, left = null, back = null] =
    unrollPastMidnight([
      ticket.leftYardAt,
      ticket.arrivedAt,
      ticket.finishedAt,
      ticket.leftAt,
      ticket.backInYardAt,
    ]);
  if (measured === 'portalToPortal') {
    return spanOf({
      start: { name: 'leaving the yard', at: leftYard },
      end: { name: 'return to the yard', at: back },
      inside: [arrived, finished, left],
      before: null,
      after: null,
    });
  }
  return spanOf({
    start: { name: 'arrival', at: arrived },
    end: { name: 'leaving', at: left },
    inside: [finished],
    before: leftYard,
    after: back,
  });
}

/** Hours rounded up to the step, at least the minimum. A step of zero leaves them exact. */
function chargedHours(minutes: number, minimum: Quantity, step: Quantity) {
  const exact = count(minutes).dividedBy(60);
  const rounded = step.isZero()
    ? exact
    : count(minutes).dividedBy(step.times(60)).toDecimalPlaces(0, Decimal.ROUND_CEIL).times(step);
  const hours = Decimal.max(rounded, minimum) as Quantity;
  return { rounded: rounded as Quantity, hours, minimumApplies: minimum.gt(rounded) };
}

function notProvable(
  ticket: PumpTicketFacts,
  span: Extract<TimeSpan, { known: false }>,
  clause: ClauseOf<'pumpTime'>,
  rate: Money,
): Rated {
  const minimum = quantity(clause.minimumHours);
  const step = quantity(clause.incrementHours);
  const lowest = extend(chargedHours(span.atLeastMinutes, minimum, step).hours, rate);
  const highest =
    span.atMostMinutes === null
      ? null
      : extend(chargedHours(span.atMostMinutes, minimum, step).hours, rate);
  const range =
    highest === null
      ? `at least ${dollars(lowest)}`
      : `between ${dollars(lowest)} and ${dollars(highest)}`;
  return {
    status: 'notProvable',
    label: TIME_LABEL,
    missing: span.missing,
    lowest,
    highest,
    explanation: {
      sentence: `${pumpName(ticket)}: no time of ${span.missing.join(' or ')}; pump hours are not provable, ${range}.`,
      steps: [
        { label: 'Missing', value: span.missing.join(', ') },
        { label: 'Could be', value: range },
      ],
    },
  };
}

/**
 * Hours on site (arrival to leaving) or portal to portal (yard to yard), rounded up to the step,
 * never fewer than the minimum. One line: the minimum takes the place of the hours, it never
 * comes on top of them.
 */
export const pumpTimeRule: PumpRule<'pumpTime'> = {
  chargeKind: 'pumpTime',
  describe(clause) {
    const measured = clause.measured === 'onSite' ? 'on site' : 'portal to portal';
    const step = quantity(clause.incrementHours);
    const rounding = step.isZero() ? '' : `, rounded up to ${figure(step)} h`;
    return `Pump: ${price(money(clause.dollarsPerHour))} an hour ${measured}${rounding}, at least ${figure(quantity(clause.minimumHours))} h.`;
  },
  rate(clause, ticket) {
    const rate = money(clause.dollarsPerHour);
    const span = measuredTime(ticket, clause.measured);
    if (!span.known) return notProvable(ticket, span, clause, rate);
    const minimum = quantity(clause.minimumHours);
    const { rounded, hours, minimumApplies } = chargedHours(
      span.minutes,
      minimum,
      quantity(clause.incrementHours),
    );
    const where = clause.measured === 'onSite' ? 'on site' : 'portal to portal';
    const owed = `${figure(hours)} h × ${price(rate)} = ${dollars(extend(hours, rate))}`;
    const floor = minimumApplies ? `; the minimum is ${figure(minimum)} h` : '';
    return {
      status: 'owed',
      label: TIME_LABEL,
      quantity: hours,
      unit: 'h',
      rate,
      explanation: {
        sentence: `${pumpName(ticket)}: ${where} ${span.words}, charged as ${figure(rounded)} h${floor}; ${owed}.`,
        steps: [
          { label: where === 'on site' ? 'On site' : 'Portal to portal', value: span.words },
          { label: 'Rounded up', value: `${figure(rounded)} h` },
          { label: 'Minimum', value: `${figure(minimum)} h` },
          { label: 'Owed', value: owed },
        ],
      },
    };
  },
};

/** Dollars per yard pumped, from the first yard or beyond those included in the hours. */
export const pumpYardsRule: PumpRule<'pumpYards'> = {
  chargeKind: 'pumpYards',
  describe(clause) {
    const included = quantity(clause.beyondYd3);
    const from = included.isZero() ? '' : ` beyond the first ${yards(included)}`;
    return `Yards pumped: ${price(money(clause.dollarsPerYd3))} a yard${from}.`;
  },
  rate(clause, ticket) {
    const rate = money(clause.dollarsPerYd3);
    const included = quantity(clause.beyondYd3);
    const charged = atLeastZero(ticket.pumpedYd3.minus(included));
    const owed = `${yards(charged)} × ${price(rate)} = ${dollars(extend(charged, rate))}`;
    const less = included.isZero() ? '' : `, the first ${yards(included)} included`;
    return {
      status: 'owed',
      label: 'Yards pumped',
      quantity: charged,
      unit: 'yd',
      rate,
      explanation: {
        sentence: `${pumpName(ticket)}: ${yards(ticket.pumpedYd3)} pumped${less}; ${owed}.`,
        steps: [
          { label: 'Pumped', value: yards(ticket.pumpedYd3) },
          { label: 'Included', value: yards(included) },
          { label: 'Owed', value: owed },
        ],
      },
    };
  },
};

/** Dollars for each time the pump was set up. */
export const pumpSetUpRule: PumpRule<'pumpSetUp'> = {
  chargeKind: 'pumpSetUp',
  describe(clause) {
    return `Pump set-up: ${price(money(clause.dollarsEach))} each.`;
  },
  rate(clause, ticket) {
    const rate = money(clause.dollarsEach);
    const setUps = count(ticket.setUps);
    const owed = `${counted(ticket.setUps, 'set-up')} × ${price(rate)} = ${dollars(extend(setUps, rate))}`;
    return {
      status: 'owed',
      label: 'Set-up',
      quantity: setUps,
      unit: 'set-up',
      rate,
      explanation: {
        sentence: `${pumpName(ticket)}: ${owed}.`,
        steps: [{ label: 'Set-ups', value: owed }],
      },
    };
  },
};
