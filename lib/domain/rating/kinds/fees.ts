import { count, extend, money, roundCents } from '../../money/money';
import type { ClauseModule } from '../clause-module';
import { dollars, loadName, unitPrice, yards } from '../words';

/** A flat fee for every load. */
export const perLoadFee: ClauseModule<'perLoadFee'> = {
  kind: 'perLoadFee',
  chargeKind: 'perLoadFee',
  describe: (clause) => `${clause.name}: ${unitPrice(money(clause.dollars))} a load`,
  rateLoad(clause, load) {
    const rate = money(clause.dollars);
    const amount = roundCents(rate);
    const sum = `1 load × ${unitPrice(rate)}`;
    return {
      status: 'owed',
      label: clause.name,
      quantity: count(1),
      unit: 'load',
      rate,
      amount,
      explanation: {
        sentence: `${loadName(load)}: ${clause.name}, ${sum} = ${dollars(amount)}.`,
        steps: [{ label: sum, value: dollars(amount) }],
      },
    };
  },
};

/** A fee on every yard delivered. */
export const perYardFee: ClauseModule<'perYardFee'> = {
  kind: 'perYardFee',
  chargeKind: 'perYardFee',
  describe: (clause) => `${clause.name}: ${unitPrice(money(clause.dollarsPerYd3))} a yd³`,
  rateLoad(clause, load) {
    const rate = money(clause.dollarsPerYd3);
    const amount = roundCents(extend(load.quantityYd3, rate));
    const sum = `${yards(load.quantityYd3)} × ${unitPrice(rate)}`;
    return {
      status: 'owed',
      label: clause.name,
      quantity: load.quantityYd3,
      unit: 'yd³',
      rate,
      amount,
      explanation: {
        sentence: `${loadName(load)}: ${clause.name}, ${sum} = ${dollars(amount)}.`,
        steps: [
          { label: 'Delivered', value: yards(load.quantityYd3) },
          { label: sum, value: dollars(amount) },
        ],
      },
    };
  },
};
