import { count, extend, money } from '../../money/money';
import { dollars, price, yards } from '../../words';
import { type LoadRule, loadName } from './rule';

/** A named fee on every load. */
export const perLoadFeeRule: LoadRule<'perLoadFee'> = {
  chargeKind: 'perLoadFee',
  describe(clause) {
    return `${clause.name}: ${price(money(clause.dollars))} a load.`;
  },
  rate(clause, { ticket }) {
    const rate = money(clause.dollars);
    const arithmetic = `1 load × ${price(rate)} = ${dollars(rate)}`;
    return {
      status: 'owed',
      label: clause.name,
      quantity: count(1),
      unit: 'load',
      rate,
      explanation: {
        sentence: `${loadName(ticket)}: ${clause.name}, ${arithmetic}.`,
        steps: [{ label: clause.name, value: arithmetic }],
      },
    };
  },
};

/** A named fee on every yard of the ticket. */
export const perYardFeeRule: LoadRule<'perYardFee'> = {
  chargeKind: 'perYardFee',
  describe(clause) {
    return `${clause.name}: ${price(money(clause.dollarsPerYd3))} a yard.`;
  },
  rate(clause, { ticket }) {
    const rate = money(clause.dollarsPerYd3);
    const arithmetic = `${yards(ticket.quantityYd3)} × ${price(rate)} = ${dollars(extend(ticket.quantityYd3, rate))}`;
    return {
      status: 'owed',
      label: clause.name,
      quantity: ticket.quantityYd3,
      unit: 'yd',
      rate,
      explanation: {
        sentence: `${loadName(ticket)}: ${clause.name}, ${arithmetic}.`,
        steps: [
          { label: 'Delivered', value: yards(ticket.quantityYd3) },
          { label: clause.name, value: arithmetic },
        ],
      },
    };
  },
};
