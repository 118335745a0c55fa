import type { Money, Quantity } from '../money/money';
import { dollars, price } from '../words';
import { type DraftFinding, withinSlack } from './draft';

/**
 * One cause by which a billed amount leaves the expected one. `reached` is what the line would
 * come to with this cause and those before it: delivered × agreed, billed yards × agreed, billed
 * yards × billed price, the printed amount. Each cause's dollars are the step it adds, so that
 * they add up to the line's difference and none is counted twice.
 */
export interface Cause {
  readonly kind: DraftFinding['kind'];
  readonly present: boolean;
  readonly reached: Money;
  readonly sentence: string;
  readonly steps: DraftFinding['steps'];
}

/**
 * The findings of a line by its causes. A line within two cents of what it should be agrees,
 * whatever its parts; cents that no cause explains go with the last one that is present. Where a
 * line prints too little to tell the cause, the whole difference is `unexplained`'s kind.
 */
export function findingsOf(
  expected: Money,
  causes: readonly Cause[],
  amount: Money,
  clauseId: string | null,
  unexplained: { readonly kind: DraftFinding['kind']; readonly name: string },
): DraftFinding[] {
  if (withinSlack(expected, amount)) return [];
  const present = causes.filter((cause) => cause.present);
  if (present.length === 0) {
    const apart = `${dollars(amount)} − ${dollars(expected)} = ${dollars(amount.minus(expected))}`;
    const sentence = `${unexplained.name}: ${dollars(expected)} is owed, ${dollars(amount)} is billed; ${apart}.`;
    const steps = [{ label: 'Difference', value: apart }];
    return [{ kind: unexplained.kind, expected, billed: amount, clauseId, sentence, steps }];
  }
  let from = expected;
  return present.map(({ kind, reached, sentence, steps }, at) => {
    const to = at === present.length - 1 ? amount : reached;
    const finding = { kind, expected: from, billed: to, clauseId, sentence, steps };
    from = to;
    return finding;
  });
}

/**
 * How a step came to its dollars: "0.50 yd × $158.00 = $79.00" where that is exact, else, as
 * amounts were rounded before, the amounts themselves.
 */
export function stepWords(
  apart: { readonly quantity: Quantity; readonly words: string },
  rate: Money,
  from: Money,
  to: Money,
): string {
  const difference = to.minus(from);
  // The words show yards to two places, all else and prices to four: what is shown must work out.
  const shown = apart.quantity.toDecimalPlaces(apart.words.endsWith('yd') ? 2 : 4);
  const product = shown.times(rate.toDecimalPlaces(4)).toDecimalPlaces(2);
  return product.eq(difference)
    ? `${apart.words} × ${price(rate)} = ${dollars(difference)}`
    : `${dollars(to)} − ${dollars(from)} = ${dollars(difference)}`;
}

/** The cause that remains when quantity × price is not the printed amount. */
export function arithmeticCause(
  name: string,
  extended: Money | null,
  amount: Money,
  arithmetic: string,
): Cause {
  const said = extended === null ? '' : `${arithmetic} = ${dollars(extended)}`;
  return {
    kind: 'arithmeticWrong',
    present: extended !== null && !withinSlack(extended, amount),
    reached: amount,
    sentence: `${name}: ${said}, but ${dollars(amount)} is billed.`,
    steps: [
      { label: 'As printed', value: said },
      { label: 'Billed', value: dollars(amount) },
    ],
  };
}
