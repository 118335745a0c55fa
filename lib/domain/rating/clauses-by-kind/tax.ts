import { extend, type Money, money, quantity } from '../../money/money';
import { dollars, figure } from '../../words';
import type { TAXABLE_KINDS } from '../clauses';
import type { ClauseOf, ClauseRule, TaxBase } from './rule';

const WORDS: Record<(typeof TAXABLE_KINDS)[number], string> = {
  mixPrice: 'concrete',
  shortLoad: 'short loads',
  waiting: 'waiting',
  perLoadFee: 'per-load fees',
  perYardFee: 'per-yard fees',
  pumpTime: 'pump time',
  pumpYards: 'yards pumped',
  pumpSetUp: 'set-ups',
};

/** "7.25" → 0.0725. */
export function taxFraction(clause: ClauseOf<'tax'>): Money {
  return money(money(clause.ratePercent).dividedBy(100));
}

/**
 * Tax once per invoice (or per statement where lines carry no invoice number) on the sum of its
 * taxable charges, rounded half up at the third decimal of a dollar: the invoice basis of the
 * Streamlined Sales and Use Tax Agreement, section 324. The quantity is the base in dollars.
 */
export const taxRule: ClauseRule<ClauseOf<'tax'>, TaxBase> = {
  chargeKind: 'tax',
  describe(clause) {
    const what = clause.taxes.map((kind) => WORDS[kind]).join(', ');
    return `Sales tax: ${figure(money(clause.ratePercent))}% on ${what}, per invoice.`;
  },
  rate(clause, { taxable, name }) {
    const rate = taxFraction(clause);
    const base = quantity(taxable);
    const owed = `${dollars(taxable)} × ${figure(money(clause.ratePercent))}% = ${dollars(extend(base, rate))}`;
    return {
      status: 'owed',
      label: 'Sales tax',
      quantity: base,
      unit: '$',
      rate,
      explanation: {
        sentence: `Tax on ${name}: ${owed}.`,
        steps: [
          { label: 'Taxable', value: dollars(taxable) },
          { label: 'Tax', value: owed },
        ],
      },
    };
  },
};
