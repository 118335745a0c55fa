import { extend, money, quantity, roundCents, sumMoney, sumQuantity } from '../money/money';
import type { ExpectedLine } from '../rating/expected-line';
import { dollars, price, yards } from '../words';
import { billedFigures } from './billed-figures';
import { arithmeticCause, type Cause, findingsOf, stepWords } from './chain';
import { type DraftFinding, type Judgement, nothingOwed, withinSlack } from './draft';
import { explain } from './explain';
import { judgeNotProvable } from './judge-time';
import type { LineCase } from './line-case';

/** A charge of one amount per delivery (short load, fee, set-up): owed or not, and how much. */
export function judgeCharge(
  at: LineCase,
  expected: readonly ExpectedLine[],
  kinds: { readonly notOwed: DraftFinding['kind']; readonly wrong: DraftFinding['kind'] },
): Judgement {
  const owed = expected.filter((line) => line.status === 'owed');
  if (owed.length < expected.length) {
    return judgeNotProvable(at, expected, { inRange: null, outside: kinds.wrong });
  }
  const { amount } = at.line;
  const why = explain(owed);
  const clauseId = owed[0]?.clauseId ?? null;
  const due = sumMoney(owed.map((line) => line.amount));
  if (due.isZero() && !withinSlack(due, amount)) {
    const sentence = `${why.sentence} The bill says ${dollars(amount)}.`;
    return nothingOwed(kinds.notOwed, amount, sentence, why.steps, clauseId);
  }
  const figures = billedFigures(at.line);
  const reached = figures.extended ?? amount;
  const apart = dollars(money(reached.minus(due)));
  const causes: Cause[] = [
    {
      kind: kinds.wrong,
      present: !withinSlack(reached, due),
      reached,
      sentence: `${why.sentence} The bill says ${dollars(reached)}; ${dollars(reached)} − ${dollars(due)} = ${apart}.`,
      steps: [
        ...why.steps,
        { label: 'Billed', value: dollars(reached) },
        { label: 'Difference', value: `${dollars(reached)} − ${dollars(due)} = ${apart}` },
      ],
    },
    arithmeticCause(at.name, figures.extended, amount, figures.arithmetic),
  ];
  return {
    expectedAmount: due,
    findings: findingsOf(due, causes, amount, clauseId, { kind: kinds.wrong, name: at.name }),
    ...why,
  };
}

/** Yards pumped: first the yards, then the price, then the arithmetic. */
export function judgePumpYards(at: LineCase, expected: readonly ExpectedLine[]): Judgement {
  const owed = expected.filter((line) => line.status === 'owed');
  const why = explain(owed);
  const rate = owed[0]?.rate ?? money('0');
  const clauseId = owed[0]?.clauseId ?? null;
  const due = sumMoney(owed.map((line) => line.amount));
  const charged = sumQuantity(owed.map((line) => line.quantity));
  const figures = billedFigures(at.line);
  const billed = figures.quantity ?? charged;
  const unitPrice = figures.unitPrice ?? rate;
  const atAgreed = roundCents(extend(billed, rate));
  const atBilled = roundCents(extend(billed, unitPrice));
  const apart = quantity(billed.minus(charged));
  const yardsStep = stepWords({ quantity: apart, words: yards(apart) }, rate, due, atAgreed);
  const rateApart = money(unitPrice.minus(rate));
  const all = { quantity: billed, words: yards(billed) };
  const priceStep = stepWords(all, rateApart, atAgreed, atBilled);
  const causes: Cause[] = [
    {
      kind: 'pumpYardsDiffer',
      present: !withinSlack(atAgreed, due),
      reached: atAgreed,
      sentence: `${why.sentence} The bill says ${yards(billed)}, ${yards(charged)} are owed; ${yardsStep}.`,
      steps: [
        ...why.steps,
        { label: 'Billed', value: yards(billed) },
        { label: 'Difference', value: yardsStep },
      ],
    },
    {
      kind: 'priceDiffers',
      present: !withinSlack(atBilled, atAgreed),
      reached: atBilled,
      sentence: `${at.name}: yards pumped are billed at ${price(unitPrice)}, ${price(rate)} is agreed; ${priceStep}.`,
      steps: [
        { label: 'Agreed', value: `${price(rate)} per yd` },
        { label: 'Billed', value: `${price(unitPrice)} per yd` },
        { label: 'Difference', value: priceStep },
      ],
    },
    arithmeticCause(at.name, figures.extended, at.line.amount, figures.arithmetic),
  ];
  return {
    expectedAmount: due,
    findings: findingsOf(due, causes, at.line.amount, clauseId, {
      kind: 'priceDiffers',
      name: at.name,
    }),
    ...why,
  };
}
