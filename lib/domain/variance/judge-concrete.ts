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
import { sameMix } from '../rating/mix-code';
import { day, price, yards } from '../words';
import { billedFigures } from './billed-figures';
import { arithmeticCause, type Cause, findingsOf, stepWords } from './chain';
import { type Judgement, notCheckable, withinSlack } from './draft';
import { explain } from './explain';
import type { LineCase } from './line-case';

type Owed = Extract<ExpectedLine, { status: 'owed' }>;

interface Agreed {
  readonly delivered: Quantity;
  /** Dollars per yard; of loads at several prices, their average. */
  readonly rate: Money;
  readonly amount: Money;
  readonly clauseId: string | null;
}

function agreedFor(at: LineCase, owed: readonly Owed[]): Agreed | null {
  const delivered = sumQuantity(
    owed.length > 0 ? owed.map((line) => line.quantity) : at.tickets.map((one) => one.quantityYd3),
  );
  const [first] = owed;
  if (first) {
    const amount = sumMoney(owed.map((line) => line.amount));
    const onePrice = owed.every((line) => line.rate.eq(first.rate));
    const rate = onePrice || delivered.isZero() ? first.rate : money(amount.dividedBy(delivered));
    return { delivered, rate, amount, clauseId: first.clauseId };
  }
  // No price was agreed: only the yards can be held against the tickets, at the billed price.
  const { unitPrice } = at.line;
  if (unitPrice === null) return null;
  return {
    delivered,
    rate: unitPrice,
    amount: roundCents(extend(delivered, unitPrice)),
    clauseId: null,
  };
}

function yardsCause(at: LineCase, agreed: Agreed, billed: Quantity | null): Cause {
  const apart = billed && quantity(billed.minus(agreed.delivered));
  const reached = billed === null ? agreed.amount : roundCents(extend(billed, agreed.rate));
  const missed = { quantity: apart ?? agreed.delivered, words: yards(apart ?? agreed.delivered) };
  const arithmetic = stepWords(missed, agreed.rate, agreed.amount, reached);
  const said = at.tickets.length > 1 ? 'the tickets come to' : 'the ticket says';
  return {
    kind: 'yardsDiffer',
    present: apart?.abs().gte('0.005') ?? false,
    reached,
    sentence: `${at.name}: billed ${yards(billed ?? agreed.delivered)}, ${said} ${yards(agreed.delivered)}; ${arithmetic}.`,
    steps: [
      { label: 'Delivered', value: yards(agreed.delivered) },
      { label: 'Billed', value: yards(billed ?? agreed.delivered) },
      { label: 'Difference', value: arithmetic },
    ],
  };
}

/** The mix that the bill names where the ticket names another; null where they agree. */
function wrongMix(at: LineCase): string | null {
  const { mixCode } = at.line;
  if (!mixCode) return null;
  return at.tickets.some((ticket) => ticket.mixCode && !sameMix(ticket.mixCode, mixCode))
    ? mixCode
    : null;
}

function priceCauses(
  at: LineCase,
  agreed: Agreed,
  billed: Quantity,
  unitPrice: Money,
): readonly Cause[] {
  const mix = wrongMix(at);
  const ticketMix = at.tickets[0]?.mixCode ?? '';
  const otherPrice = mix === null ? null : (at.sheet?.priceOf(mix) ?? null);
  const mixRate = otherPrice ? money(otherPrice.clause.dollarsPerYd3) : unitPrice;
  const amountAt = (rate: Money) => roundCents(extend(billed, rate));
  const step = (from: Money, to: Money) => {
    const all = { quantity: billed, words: yards(billed) };
    return stepWords(all, money(to.minus(from)), amountAt(from), amountAt(to));
  };
  const base = mix === null ? agreed.rate : mixRate;
  const sheet = at.sheet?.sheet;
  const from = sheet ? ` (${sheet.name}, from ${day(sheet.effectiveFrom)})` : '';
  return [
    {
      kind: 'mixDiffers',
      present: mix !== null,
      reached: amountAt(mixRate),
      sentence: `${at.name}: billed as mix ${mix} at ${price(mixRate)}, the ticket says ${ticketMix} at ${price(agreed.rate)}; ${step(agreed.rate, mixRate)}.`,
      steps: [
        { label: 'Mix on the ticket', value: `${ticketMix} at ${price(agreed.rate)}` },
        { label: 'Mix billed', value: `${mix} at ${price(mixRate)}` },
        { label: 'Difference', value: step(agreed.rate, mixRate) },
      ],
    },
    {
      kind: 'priceDiffers',
      present: !withinSlack(amountAt(unitPrice), amountAt(base)),
      reached: amountAt(unitPrice),
      sentence: `${at.name}: mix ${mix ?? ticketMix} is billed at ${price(unitPrice)} a yard, ${price(base)} is agreed${from}; ${step(base, unitPrice)}.`,
      steps: [
        { label: 'Agreed', value: `${price(base)} per yd` },
        { label: 'Billed', value: `${price(unitPrice)} per yd` },
        { label: 'Difference', value: step(base, unitPrice) },
      ],
    },
  ];
}

/** A wrong mix at the same price: worth knowing, though it costs nothing. */
function sameMoneyWrongMix(at: LineCase, agreed: Agreed): Judgement['findings'] {
  const mix = wrongMix(at);
  if (mix === null) return [];
  const { amount } = at.line;
  const sentence = `${at.name}: billed as mix ${mix}, the ticket says ${at.tickets[0]?.mixCode}; the price is the same.`;
  return [
    {
      kind: 'mixDiffers',
      expected: amount,
      billed: amount,
      clauseId: agreed.clauseId,
      sentence,
      steps: [],
    },
  ];
}

/** A line for concrete against its ticket: yards, then mix, then price, then arithmetic. */
export function judgeConcrete(at: LineCase, expected: readonly ExpectedLine[]): Judgement {
  const owed = expected.filter((line) => line.status === 'owed');
  const agreed = agreedFor(at, owed);
  if (!agreed) return notCheckable(`${at.name}: no price is agreed and none is billed.`);
  const figures = billedFigures(at.line);
  const causes: Cause[] = [yardsCause(at, agreed, figures.quantity)];
  if (figures.unitPrice !== null) {
    const billed = figures.quantity ?? agreed.delivered;
    causes.push(...priceCauses(at, agreed, billed, figures.unitPrice));
  }
  causes.push(arithmeticCause(at.name, figures.extended, at.line.amount, figures.arithmetic));
  const found = findingsOf(agreed.amount, causes, at.line.amount, agreed.clauseId, {
    kind: 'priceDiffers',
    name: at.name,
  });
  const unpriced = owed.length === 0;
  const { sentence, steps } = unpriced
    ? { sentence: `${at.name}: the rate sheet has no price for this mix.`, steps: [] }
    : explain(owed);
  const wrong = found.length > 0 || unpriced ? found : sameMoneyWrongMix(at, agreed);
  return {
    expectedAmount: unpriced && found.length === 0 ? null : agreed.amount,
    findings: wrong,
    sentence,
    steps,
  };
}
