import { extend, money, roundCents } from '../../money/money';
import type { ClauseModule } from '../clause-module';
import { dollars, loadName, unitPrice, yards } from '../words';

/** Concrete by the yard: domain.md §3 'mix price'. Which clause fits a mix is the rater's choice. */
export const mixPrice: ClauseModule<'mixPrice'> = {
  kind: 'mixPrice',
  chargeKind: 'mix',
  describe(clause) {
    const name = clause.mixCode === null ? 'Any other mix' : `Mix ${clause.mixCode}`;
    const description = clause.description ? ` (${clause.description})` : '';
    return `${name}${description}: ${unitPrice(money(clause.dollarsPerYd3))} a yd³`;
  },
  rateLoad(clause, load) {
    const rate = money(clause.dollarsPerYd3);
    const amount = roundCents(extend(load.quantityYd3, rate));
    const sum = `${yards(load.quantityYd3)} × ${unitPrice(rate)}`;
    return {
      status: 'owed',
      label: `Concrete ${load.mixCode}`,
      quantity: load.quantityYd3,
      unit: 'yd³',
      rate,
      amount,
      explanation: {
        sentence: `${loadName(load)}: ${sum} for mix ${load.mixCode} = ${dollars(amount)}.`,
        steps: [
          { label: 'Delivered', value: yards(load.quantityYd3) },
          { label: `Mix ${load.mixCode}, a yd³`, value: unitPrice(rate) },
          { label: sum, value: dollars(amount) },
        ],
      },
    };
  },
};
