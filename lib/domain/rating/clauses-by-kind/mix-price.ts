import { extend, money } from '../../money/money';
import { dollars, price, yards } from '../../words';
import { type LoadRule, loadName } from './rule';

/** Dollars per cubic yard of a mix, on the yards of the ticket. */
export const mixPriceRule: LoadRule<'mixPrice'> = {
  chargeKind: 'mix',
  describe(clause) {
    const mix = clause.mixCode === null ? 'Any mix not listed' : `Mix ${clause.mixCode}`;
    const name = clause.description ? `${mix} (${clause.description})` : mix;
    return `${name}: ${price(money(clause.dollarsPerYd3))} per yard.`;
  },
  rate(clause, { ticket }) {
    const rate = money(clause.dollarsPerYd3);
    const arithmetic = `${yards(ticket.quantityYd3)} × ${price(rate)} = ${dollars(extend(ticket.quantityYd3, rate))}`;
    return {
      status: 'owed',
      label: `Mix ${ticket.mixCode}`,
      quantity: ticket.quantityYd3,
      unit: 'yd',
      rate,
      explanation: {
        sentence: `${loadName(ticket)}: ${arithmetic} for mix ${ticket.mixCode}.`,
        steps: [
          { label: 'Delivered', value: yards(ticket.quantityYd3) },
          { label: `Price of ${ticket.mixCode}`, value: `${price(rate)} per yd` },
          { label: 'Owed', value: arithmetic },
        ],
      },
    };
  },
};
