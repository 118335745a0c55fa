import type { TicketFacts } from '../../facts';
import {
  count,
  extend,
  money,
  type Quantity,
  quantity,
  roundCents,
  ZERO_MONEY,
} from '../../money/money';
import { clockText } from '../../time/clock-minutes';
import type { Charge, ClauseModule, ClauseOf } from '../clause-module';
import { dollars, loadName, minutes, unitPrice, yards } from '../words';

type Waiting = ClauseOf<'waiting'>;

/** The free minutes of a load, and how they come about. */
export function freeMinutes(clause: Waiting, load: TicketFacts): { free: Quantity; how: string } {
  if (clause.free.basis === 'perLoad') {
    const free = quantity(clause.free.minutes);
    return { free, how: `free ${minutes(free)} a load` };
  }
  const perYard = quantity(clause.free.minutesPerYd3);
  const free = perYard.times(load.quantityYd3) as Quantity;
  return {
    free,
    how: `free ${minutes(perYard)} × ${yards(load.quantityYd3)} = ${minutes(free)}`,
  };
}

function notProvable(clause: Waiting, load: TicketFacts, missing: string[]): Charge {
  const { how } = freeMinutes(clause, load);
  return {
    status: 'notProvable',
    label: 'Waiting time',
    missing,
    lowest: ZERO_MONEY,
    highest: null,
    explanation: {
      sentence: `${loadName(load)}: waiting can’t be shown, the ticket has no ${missing.join(' and no ')}; ${how}.`,
      steps: missing.map((label) => ({ label, value: 'not known' })),
    },
  };
}

/** Time on site beyond the free minutes, from arrival until finishing or leaving. */
export const waiting: ClauseModule<'waiting'> = {
  kind: 'waiting',
  chargeKind: 'waiting',
  describe(clause) {
    const free =
      clause.free.basis === 'perLoad'
        ? `${minutes(quantity(clause.free.minutes))} a load`
        : `${minutes(quantity(clause.free.minutesPerYd3))} a yd³`;
    const until = clause.until === 'left' ? 'leaving' : 'the end of unloading';
    return `Waiting: free ${free}, then ${unitPrice(money(clause.dollarsPerMinute))} a minute, from arrival to ${until}`;
  },
  rateLoad(clause, load) {
    const end = clause.until === 'left' ? load.leftAt : load.finishedAt;
    const endName = clause.until === 'left' ? 'time of leaving' : 'finishing time';
    const missing = [
      ...(load.arrivedAt === null ? ['arrival time'] : []),
      ...(end === null ? [endName] : []),
    ];
    if (load.arrivedAt === null || end === null) return notProvable(clause, load, missing);
    const onSite = count(Math.max(0, end - load.arrivedAt));
    const { free, how } = freeMinutes(clause, load);
    const charged = (onSite.gt(free) ? onSite.minus(free) : count(0)) as Quantity;
    if (charged.isZero()) return null;
    const rate = money(clause.dollarsPerMinute);
    const amount = roundCents(extend(charged, rate));
    const sum = `${minutes(charged)} × ${unitPrice(rate)}`;
    const span = `${clockText(load.arrivedAt)} to ${clockText(end)}`;
    return {
      status: 'owed',
      label: 'Waiting time',
      quantity: charged,
      unit: 'min',
      rate,
      amount,
      explanation: {
        sentence: `${loadName(load)}: on site ${span} = ${minutes(onSite)}; ${how}; ${sum} = ${dollars(amount)}.`,
        steps: waitingSteps(clause, load, onSite, charged, [sum, dollars(amount)]),
      },
    };
  },
};

/** The arithmetic of a wait, also for one that stayed within its free time. */
export function waitingSteps(
  clause: Waiting,
  load: TicketFacts,
  onSite: Quantity,
  charged: Quantity,
  [label, value]: readonly [string, string],
) {
  const end = clause.until === 'left' ? load.leftAt : load.finishedAt;
  const { free } = freeMinutes(clause, load);
  const freeLabel =
    clause.free.basis === 'perLoad'
      ? 'Free a load'
      : `Free ${minutes(quantity(clause.free.minutesPerYd3))} × ${yards(load.quantityYd3)}`;
  return [
    {
      label: `On site ${clockText(load.arrivedAt ?? 0)} to ${clockText(end ?? 0)}`,
      value: minutes(onSite),
    },
    { label: freeLabel, value: minutes(free) },
    { label: 'Chargeable', value: minutes(charged) },
    { label, value },
  ];
}
