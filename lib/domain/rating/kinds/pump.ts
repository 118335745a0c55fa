import Decimal from 'decimal.js';
import type { PumpTicketFacts } from '../../facts';
import {
  count,
  extend,
  money,
  type Quantity,
  quantity,
  quantityText,
  roundCents,
  ZERO_MONEY,
} from '../../money/money';
import { clockText } from '../../time/clock-minutes';
import type { Charge, ClauseModule, ClauseOf } from '../clause-module';
import { dollars, pumpName, unitPrice, yards } from '../words';

type PumpTime = ClauseOf<'pumpTime'>;

function hours(amount: Decimal): string {
  return `${quantityText(amount)} h`;
}

function span(clause: PumpTime, pump: PumpTicketFacts) {
  return clause.measured === 'portalToPortal'
    ? {
        from: pump.leftYardAt,
        to: pump.backInYardAt,
        fromName: 'time of leaving the yard',
        toName: 'time back in the yard',
      }
    : {
        from: pump.arrivedAt,
        to: pump.leftAt,
        fromName: 'arrival time',
        toName: 'time of leaving',
      };
}

/** Hours between the clause's two moments, rounded up to its increment, and the minimum. */
export function pumpHours(
  clause: PumpTime,
  pump: PumpTicketFacts,
): { measured: Quantity; rounded: Quantity; charged: Quantity } | null {
  const { from, to } = span(clause, pump);
  if (from === null || to === null) return null;
  const measured = new Decimal(Math.max(0, to - from)).div(60) as Quantity;
  const increment = quantity(clause.incrementHours);
  const rounded = (
    increment.isZero()
      ? measured
      : measured.div(increment).toDecimalPlaces(6).ceil().times(increment)
  ) as Quantity;
  const charged = Decimal.max(rounded, clause.minimumHours) as Quantity;
  return { measured, rounded, charged };
}

export const pumpTime: ClauseModule<'pumpTime'> = {
  kind: 'pumpTime',
  chargeKind: 'pumpTime',
  describe(clause) {
    const how = clause.measured === 'portalToPortal' ? 'yard to yard' : 'on site';
    return (
      `Pump: ${unitPrice(money(clause.dollarsPerHour))} an hour ${how}, ` +
      `at least ${hours(quantity(clause.minimumHours))}, in steps of ${hours(quantity(clause.incrementHours))}`
    );
  },
  ratePumpTicket(clause, pump) {
    const rate = money(clause.dollarsPerHour);
    const worked = pumpHours(clause, pump);
    if (!worked) return unknownHours(clause, pump);
    const amount = roundCents(extend(worked.charged, rate));
    const { from, to } = span(clause, pump);
    const sum = `${hours(worked.charged)} × ${unitPrice(rate)}`;
    const atMinimum = worked.charged.gt(worked.rounded);
    const spanText = `${clockText(from ?? 0)} to ${clockText(to ?? 0)}`;
    const rounding = atMinimum
      ? `the minimum of ${hours(worked.charged)} applies`
      : `rounded up to ${hours(worked.rounded)}`;
    return {
      status: 'owed',
      label: 'Pump hours',
      quantity: worked.charged,
      unit: 'h',
      rate,
      amount,
      explanation: {
        sentence: `${pumpName(pump)}: ${spanText} = ${hours(worked.measured)}, ${rounding}; ${sum} = ${dollars(amount)}.`,
        steps: [
          {
            label: `${clause.measured === 'portalToPortal' ? 'Yard to yard' : 'On site'} ${spanText}`,
            value: hours(worked.measured),
          },
          {
            label: `Rounded up to ${hours(quantity(clause.incrementHours))}`,
            value: hours(worked.rounded),
          },
          { label: 'Minimum', value: hours(quantity(clause.minimumHours)) },
          { label: sum, value: dollars(amount) },
        ],
      },
    };
  },
};

/** Without its times at least the minimum is owed; how much more can't be shown. */
function unknownHours(clause: PumpTime, pump: PumpTicketFacts): Charge {
  const { from, to, fromName, toName } = span(clause, pump);
  const missing = [...(from === null ? [fromName] : []), ...(to === null ? [toName] : [])];
  const lowest = roundCents(extend(quantity(clause.minimumHours), money(clause.dollarsPerHour)));
  return {
    status: 'notProvable',
    label: 'Pump hours',
    missing,
    lowest,
    highest: null,
    explanation: {
      sentence: `${pumpName(pump)}: hours can’t be shown, the ticket has no ${missing.join(' and no ')}; the minimum alone is ${dollars(lowest)}.`,
      steps: missing.map((label) => ({ label, value: 'not known' })),
    },
  };
}

export const pumpYards: ClauseModule<'pumpYards'> = {
  kind: 'pumpYards',
  chargeKind: 'pumpYards',
  describe(clause) {
    const beyond = quantity(clause.beyondYd3);
    const from = beyond.isZero() ? 'from the first' : `beyond ${yards(beyond)}`;
    return `Pumped: ${unitPrice(money(clause.dollarsPerYd3))} a yd³ ${from}`;
  },
  ratePumpTicket(clause, pump) {
    const beyond = quantity(clause.beyondYd3);
    const charged = Decimal.max(pump.pumpedYd3.minus(beyond), 0) as Quantity;
    if (charged.isZero()) return null;
    const rate = money(clause.dollarsPerYd3);
    const amount = roundCents(extend(charged, rate));
    const sum = `${yards(charged)} × ${unitPrice(rate)}`;
    return {
      status: 'owed',
      label: 'Yards pumped',
      quantity: charged,
      unit: 'yd³',
      rate,
      amount,
      explanation: {
        sentence: `${pumpName(pump)}: ${yards(pump.pumpedYd3)} pumped${beyond.isZero() ? '' : `, ${yards(beyond)} included`}; ${sum} = ${dollars(amount)}.`,
        steps: [
          { label: 'Pumped', value: yards(pump.pumpedYd3) },
          ...(beyond.isZero() ? [] : [{ label: 'Included', value: yards(beyond) }]),
          { label: sum, value: dollars(amount) },
        ],
      },
    };
  },
};

export const pumpSetUp: ClauseModule<'pumpSetUp'> = {
  kind: 'pumpSetUp',
  chargeKind: 'pumpSetUp',
  describe: (clause) => `Pump set-up: ${unitPrice(money(clause.dollarsEach))} each`,
  ratePumpTicket(clause, pump) {
    if (pump.setUps === 0) return null;
    const rate = money(clause.dollarsEach);
    const amount = pump.setUps > 0 ? roundCents(extend(count(pump.setUps), rate)) : ZERO_MONEY;
    const sum = `${pump.setUps} × ${unitPrice(rate)}`;
    return {
      status: 'owed',
      label: 'Set-up',
      quantity: count(pump.setUps),
      unit: 'each',
      rate,
      amount,
      explanation: {
        sentence: `${pumpName(pump)}: set-up, ${sum} = ${dollars(amount)}.`,
        steps: [{ label: sum, value: dollars(amount) }],
      },
    };
  },
};
