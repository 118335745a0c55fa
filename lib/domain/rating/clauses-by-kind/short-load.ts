import { count, extend, type Money, money, type Quantity, quantity } from '../../money/money';
import { dollars, price, yards } from '../../words';
import { atLeastZero, type ClauseOf, type LoadRule, loadName, type Rated } from './rule';

const LABEL = 'Short load';

interface Charge {
  readonly quantity: Quantity;
  readonly unit: string;
  readonly rate: Money;
  readonly arithmetic: string;
}

function chargeFor(clause: ClauseOf<'shortLoad'>, delivered: Quantity): Charge {
  const { charge } = clause;
  if (charge.basis === 'flatPerLoad') {
    const rate = money(charge.dollars);
    return {
      quantity: count(1),
      unit: 'load',
      rate,
      arithmetic: `1 load × ${price(rate)} = ${dollars(rate)}`,
    };
  }
  const rate = money(charge.dollarsPerYd3);
  const short = atLeastZero(quantity(clause.thresholdYd3).minus(delivered));
  return {
    quantity: short,
    unit: 'yd',
    rate,
    arithmetic: `${yards(short)} short × ${price(rate)} = ${dollars(extend(short, rate))}`,
  };
}

function nothingOwed(clause: ClauseOf<'shortLoad'>, sentence: string, why: string): Rated {
  const { charge } = clause;
  const flat = charge.basis === 'flatPerLoad';
  return {
    status: 'owed',
    label: LABEL,
    quantity: count(0),
    unit: flat ? 'load' : 'yd',
    rate: money(flat ? charge.dollars : charge.dollarsPerYd3),
    explanation: { sentence, steps: [{ label: 'Not owed', value: why }] },
  };
}

/**
 * A charge on loads under a threshold: flat per load, or per yard short of it. A load of exactly
 * the threshold is not short. The balance load (the last of several loads of one order) may be
 * exempt; without a known order that cannot be told, so the charge is then not provable.
 */
export const shortLoadRule: LoadRule<'shortLoad'> = {
  chargeKind: 'shortLoad',
  describe(clause) {
    const under = yards(quantity(clause.thresholdYd3));
    const { charge } = clause;
    const what =
      charge.basis === 'flatPerLoad'
        ? `${price(money(charge.dollars))} for each load under ${under}`
        : `${price(money(charge.dollarsPerYd3))} for each yard that a load is short of ${under}`;
    return `Short load: ${what}${clause.balanceLoadExempt ? ', the balance load exempt' : ''}.`;
  },
  rate(clause, { ticket, isBalanceLoad }) {
    const threshold = quantity(clause.thresholdYd3);
    const name = loadName(ticket);
    const delivered = yards(ticket.quantityYd3);
    if (ticket.quantityYd3.gte(threshold)) {
      const why = `${delivered} is not under ${yards(threshold)}`;
      return nothingOwed(clause, `${name}: ${why}, so no short-load charge.`, why);
    }
    if (clause.balanceLoadExempt && isBalanceLoad === true) {
      const why = 'the balance load of its order is exempt';
      return nothingOwed(clause, `${name}: ${delivered}, but ${why}: no short-load charge.`, why);
    }
    const charge = chargeFor(clause, ticket.quantityYd3);
    if (clause.balanceLoadExempt && isBalanceLoad === null) {
      return {
        status: 'notProvable',
        label: LABEL,
        missing: ['order'],
        lowest: money('0'),
        highest: extend(charge.quantity, charge.rate),
        explanation: {
          sentence: `${name}: ${delivered} is under ${yards(threshold)}, but without its order it cannot be told whether it was the balance load, which is exempt; ${charge.arithmetic} at most.`,
          steps: [
            { label: 'Delivered', value: delivered },
            { label: 'Missing', value: 'the order' },
            { label: 'At most', value: charge.arithmetic },
          ],
        },
      };
    }
    return {
      status: 'owed',
      label: LABEL,
      quantity: charge.quantity,
      unit: charge.unit,
      rate: charge.rate,
      explanation: {
        sentence: `${name}: ${delivered} is under ${yards(threshold)}; ${charge.arithmetic}.`,
        steps: [
          { label: 'Delivered', value: delivered },
          { label: 'Short of', value: yards(threshold) },
          { label: 'Owed', value: charge.arithmetic },
        ],
      },
    };
  },
};
