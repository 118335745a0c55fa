import {
  extend,
  type Money,
  money,
  type Quantity,
  quantity,
  roundCents,
  sumMoney,
  sumQuantity,
} from '../money/money';
import type { ExpectedLine } from '../rating/expected-line';
import { dollars, figure, price } from '../words';
import { type BilledFigures, billedTime } from './billed-figures';
import { arithmeticCause, type Cause, findingsOf, stepWords } from './chain';
import { type DraftFinding, type Judgement, nothingOwed, withinSlack } from './draft';
import { explain } from './explain';
import type { LineCase, Reckoning } from './line-case';
import { amountOf } from './take';

type Owed = Extract<ExpectedLine, { status: 'owed' }>;

interface TimeWords {
  readonly unit: 'min' | 'h';
  readonly timeKind: DraftFinding['kind'];
  readonly priceKind: DraftFinding['kind'];
  readonly what: string;
}

function timeCause(
  owed: readonly Owed[],
  rate: Money,
  words: TimeWords,
  billed: Quantity | null,
): Cause {
  const charged = sumQuantity(owed.map((line) => line.quantity));
  const expected = sumMoney(owed.map((line) => line.amount));
  const reached = billed === null ? expected : roundCents(extend(billed, rate));
  const { unit, what } = words;
  const apart = billed === null ? charged : quantity(billed.minus(charged));
  const missed = { quantity: apart, words: `${figure(apart)} ${unit}` };
  const arithmetic = stepWords(missed, rate, expected, reached);
  const why = explain(owed);
  return {
    kind: words.timeKind,
    present: billed !== null && !withinSlack(reached, expected),
    reached,
    sentence: `${why.sentence} The bill says ${figure(billed ?? charged)} ${unit} of ${what}, ${figure(charged)} are owed; ${arithmetic}.`,
    steps: [
      ...why.steps,
      { label: 'Billed', value: `${figure(billed ?? charged)} ${unit}` },
      { label: 'Difference', value: arithmetic },
    ],
  };
}

function rateCause(
  at: LineCase,
  rate: Money,
  words: TimeWords,
  billed: Quantity,
  figures: BilledFigures,
): Cause {
  const unitPrice = figures.unitPrice ?? rate;
  const reached = roundCents(extend(billed, unitPrice));
  const before = roundCents(extend(billed, rate));
  const charged = { quantity: billed, words: `${figure(billed)} ${words.unit}` };
  const arithmetic = stepWords(charged, money(unitPrice.minus(rate)), before, reached);
  return {
    kind: words.priceKind,
    present: !withinSlack(reached, before),
    reached,
    sentence: `${at.name}: ${words.what} is billed at ${price(unitPrice)} per ${words.unit}, ${price(rate)} is agreed; ${arithmetic}.`,
    steps: [
      { label: 'Agreed', value: `${price(rate)} per ${words.unit}` },
      { label: 'Billed', value: `${price(unitPrice)} per ${words.unit}` },
      { label: 'Difference', value: arithmetic },
    ],
  };
}

/** A lump sum that comes to no sensible time at the agreed rate: the amount is simply wrong. */
function lumpCause(at: LineCase, owed: readonly Owed[], words: TimeWords): Cause {
  const why = explain(owed);
  return {
    kind: words.priceKind,
    present: true,
    reached: at.line.amount,
    sentence: `${why.sentence} The bill says ${dollars(at.line.amount)} for ${words.what}.`,
    steps: [...why.steps, { label: 'Billed', value: dollars(at.line.amount) }],
  };
}

function judgeTime(at: LineCase, owed: readonly Owed[], words: TimeWords): Judgement {
  const rate = owed[0]?.rate ?? money('0');
  const expected = sumMoney(owed.map((line) => line.amount));
  const figures = billedTime(at.line, words.unit, rate);
  const charged = sumQuantity(owed.map((line) => line.quantity));
  const causes: Cause[] =
    figures.quantity === null && figures.unitPrice === null
      ? [lumpCause(at, owed, words)]
      : [
          timeCause(owed, rate, words, figures.quantity),
          rateCause(at, rate, words, figures.quantity ?? charged, figures),
          arithmeticCause(at.name, figures.extended, at.line.amount, figures.arithmetic),
        ];
  const findings = findingsOf(expected, causes, at.line.amount, owed[0]?.clauseId ?? null, {
    kind: words.priceKind,
    name: at.name,
  });
  return { expectedAmount: expected, findings, ...explain(owed) };
}

/**
 * Charges with a missing fact: an amount the range allows is not provable (waiting), or stands as
 * billed (what has no kind of its own); outside the range the nearest bound is expected.
 */
export function judgeNotProvable(
  at: LineCase,
  expected: readonly ExpectedLine[],
  kinds: {
    readonly inRange: DraftFinding['kind'] | null;
    readonly outside: DraftFinding['kind'];
  },
): Judgement {
  const lowest = sumMoney(expected.map(amountOf));
  const bounds = expected.map((line) => (line.status === 'owed' ? line.amount : line.highest));
  const highest = bounds.includes(null) ? null : sumMoney(bounds.filter((one) => one !== null));
  const { amount } = at.line;
  const why = explain(expected);
  const clauseId = expected[0]?.clauseId || null;
  const sentence = `${why.sentence} The bill says ${dollars(amount)}.`;
  const steps = [...why.steps, { label: 'Billed', value: dollars(amount) }];
  const inRange = amount.gte(lowest) && (highest === null || amount.lte(highest));
  const kind = inRange ? kinds.inRange : kinds.outside;
  if (kind === null) return { expectedAmount: amount, findings: [], ...why };
  const nearest = inRange || highest === null || amount.lt(lowest) ? lowest : highest;
  const owed = kinds.inRange === null ? nearest : lowest;
  if (withinSlack(owed, amount)) return { expectedAmount: owed, findings: [], ...why };
  const finding = { kind, expected: owed, billed: amount, clauseId, sentence, steps };
  return { expectedAmount: owed, findings: [finding], ...why };
}

/** Waiting: nothing owed, wrong minutes, wrong rate, or not provable for want of a time. */
export function judgeWaiting(at: LineCase, expected: readonly ExpectedLine[]): Judgement {
  const owed = expected.filter((line) => line.status === 'owed');
  if (owed.length < expected.length) {
    return judgeNotProvable(at, expected, {
      inRange: 'waitingNotProvable',
      outside: 'waitingNotProvable',
    });
  }
  const why = explain(owed);
  const { amount } = at.line;
  if (owed.every((line) => line.amount.isZero())) {
    const sentence = `${why.sentence} The bill says ${dollars(amount)}.`;
    return nothingOwed('waitingNotOwed', amount, sentence, why.steps, owed[0]?.clauseId);
  }
  return judgeTime(at, owed, {
    unit: 'min',
    timeKind: 'waitingWrongMinutes',
    priceKind: 'waitingWrongAmount',
    what: 'waiting',
  });
}

/** Pump hours or their minimum, whichever of the two the sheet says is owed. */
export function judgePumpTime(
  at: LineCase,
  expected: readonly ExpectedLine[],
  { clauses }: Reckoning,
): Judgement {
  const owed = expected.filter((line) => line.status === 'owed');
  const isMinimumLine = at.line.chargeKind === 'pumpMinimum';
  const minimumApplies = owed.some((line) => {
    const clause = clauses.get(line.clauseId)?.clause;
    return clause?.kind === 'pumpTime' && line.quantity.eq(clause.minimumHours);
  });
  const timeKind = isMinimumLine || minimumApplies ? 'pumpMinimumWrong' : 'pumpHoursDiffer';
  if (owed.length < expected.length) {
    return judgeNotProvable(at, expected, { inRange: null, outside: timeKind });
  }
  return judgeTime(at, owed, { unit: 'h', timeKind, priceKind: 'priceDiffers', what: 'pump time' });
}
