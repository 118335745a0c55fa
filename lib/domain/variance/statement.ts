import type { BillLineFacts } from '../facts';
import { type Money, sumMoney, ZERO_MONEY } from '../money/money';
import type { PlainDate } from '../time/clock-minutes';
import { dollars } from '../words';
import { type DraftFinding, subtract, withinSlack } from './draft';

/** What a statement or invoice says about itself. */
export interface StatementFacts {
  readonly periodStart: PlainDate;
  readonly periodEnd: PlainDate;
  /** Sums as printed, where the document prints them. */
  readonly subtotal?: Money | null;
  readonly tax?: Money | null;
  readonly total?: Money | null;
}

export interface SumFinding {
  readonly place: 'subtotal' | 'tax' | 'total';
  readonly draft: DraftFinding;
}

function wrongSum(place: SumFinding['place'], expected: Money, billed: Money): SumFinding {
  const apart = dollars(subtract(billed, expected));
  return {
    place,
    draft: {
      kind: 'arithmeticWrong',
      expected,
      billed,
      clauseId: null,
      sentence: `The ${place} says ${dollars(billed)}, its lines come to ${dollars(expected)}: ${apart} apart.`,
      steps: [
        { label: 'Sum of the lines', value: dollars(expected) },
        { label: `Printed ${place}`, value: dollars(billed) },
        { label: 'Difference', value: `${dollars(billed)} − ${dollars(expected)} = ${apart}` },
      ],
    },
  };
}

/**
 * Printed sums against the lines. A wrong subtotal that runs on into the total is one finding:
 * the total is only held for what it is off by itself.
 */
export function checkSums(
  statement: StatementFacts | null,
  lines: readonly BillLineFacts[],
): SumFinding[] {
  if (!statement) return [];
  const sumOf = (wanted: boolean) =>
    sumMoney(
      lines.filter((line) => (line.chargeKind === 'tax') === wanted).map((line) => line.amount),
    );
  const [charges, tax] = [sumOf(false), sumOf(true)];
  const found: SumFinding[] = [];
  let carried = ZERO_MONEY;
  const check = (place: SumFinding['place'], printed: Money | null | undefined, sum: Money) => {
    if (!printed || withinSlack(printed, sum)) return;
    found.push(wrongSum(place, sum, printed));
    if (place !== 'total') carried = subtract(carried, sum.minus(printed));
  };
  check('subtotal', statement.subtotal, charges);
  check('tax', statement.tax, tax);
  check('total', statement.total, sumMoney([charges, tax, carried]));
  return found;
}
