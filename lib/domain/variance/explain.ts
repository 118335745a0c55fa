import { sumMoney } from '../money/money';
import type { ExpectedLine, Explanation } from '../rating/expected-line';
import { counted, dollars } from '../words';
import { amountOf } from './take';

const MOST_SPELT_OUT = 3;

/** Why an amount is expected: one line's own words, or those of several and their sum. */
export function explain(expected: readonly ExpectedLine[]): Explanation {
  const [only] = expected;
  if (only && expected.length === 1) return only.explanation;
  const owed = expected.filter((line) => line.status !== 'owed' || !line.amount.isZero());
  const total = dollars(sumMoney(owed.map(amountOf)));
  const steps = owed.map((line) => ({ label: line.label, value: line.explanation.sentence }));
  if (owed.length === 0) {
    return {
      sentence: `Nothing is owed on ${counted(expected.length, 'delivery', 'deliveries')}.`,
      steps,
    };
  }
  const spelt = owed.slice(0, MOST_SPELT_OUT).map((line) => line.explanation.sentence);
  const more = owed.length - spelt.length;
  const rest = more > 0 ? ` And ${more} more.` : '';
  return { sentence: `${spelt.join(' ')}${rest} Together ${total}.`, steps };
}
