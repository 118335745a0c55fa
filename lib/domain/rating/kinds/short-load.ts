import { count, extend, money, type Quantity, quantity, roundCents } from '../../money/money';
import type { ClauseModule } from '../clause-module';
import { dollars, loadName, unitPrice, yards } from '../words';

/** A charge for a load under the threshold; a load exactly at the threshold is not short. */
export const shortLoad: ClauseModule<'shortLoad'> = {
  kind: 'shortLoad',
  chargeKind: 'shortLoad',
  describe(clause) {
    const under = `under ${yards(quantity(clause.thresholdYd3))}`;
    const exempt = clause.balanceLoadExempt ? '; the balance load is free of it' : '';
    return clause.charge.basis === 'flatPerLoad'
      ? `Short load: ${unitPrice(money(clause.charge.dollars))} a load ${under}${exempt}`
      : `Short load: ${unitPrice(money(clause.charge.dollarsPerYd3))} for each yd³ ${under}${exempt}`;
  },
  rateLoad(clause, load, { isBalanceLoad }) {
    const threshold = quantity(clause.thresholdYd3);
    if (load.quantityYd3.gte(threshold)) return null;
    if (clause.balanceLoadExempt && isBalanceLoad) return null;
    const short = threshold.minus(load.quantityYd3) as Quantity;
    const perYard = clause.charge.basis === 'perShortYd3';
    const rate = money(
      clause.charge.basis === 'perShortYd3' ? clause.charge.dollarsPerYd3 : clause.charge.dollars,
    );
    const charged = perYard ? short : count(1);
    const amount = roundCents(extend(charged, rate));
    const sum = perYard ? `${yards(short)} × ${unitPrice(rate)}` : `1 load × ${unitPrice(rate)}`;
    return {
      status: 'owed',
      label: 'Short load',
      quantity: charged,
      unit: perYard ? 'yd³' : 'load',
      rate,
      amount,
      explanation: {
        sentence:
          `${loadName(load)}: ${yards(load.quantityYd3)} is ${yards(short)} short of ` +
          `${yards(threshold)}; ${sum} = ${dollars(amount)}.`,
        steps: [
          { label: 'Delivered', value: yards(load.quantityYd3) },
          { label: 'Short under', value: yards(threshold) },
          { label: sum, value: dollars(amount) },
        ],
      },
    };
  },
};
