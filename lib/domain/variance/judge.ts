import { PUMP_KINDS } from '../rating/clauses-by-kind/registry';
import { sameMix } from '../rating/mix-code';
import { day, dollars } from '../words';
import { bestNamed } from './charge-name';
import { type Judgement, notCheckable, nothingOwed } from './draft';
import { explain } from './explain';
import { judgeCharge, judgePumpYards } from './judge-charge';
import { judgeConcrete } from './judge-concrete';
import { judgePumpTime, judgeWaiting } from './judge-time';
import { isFee, type LineCase, type Reckoning, type Taker } from './line-case';
import type { Taken } from './take';

function billed(at: LineCase): string {
  const { line } = at;
  const what = line.description || line.chargeKind;
  const when = line.date ? `, ${day(line.date)}` : '';
  return `${what}${when}, ${dollars(line.amount)}`;
}

/** Whether the sheet has anything that this line could be charging. */
function isAgreed(at: LineCase): boolean | null {
  if (!at.sheet) return null;
  const { line, sheet } = at;
  if (line.chargeKind === 'mix') return true;
  if (isFee(line.chargeKind)) {
    const fees = sheet.others.flatMap(({ clause }) =>
      clause.kind === 'perLoadFee' || clause.kind === 'perYardFee' ? [{ label: clause.name }] : [],
    );
    return bestNamed(line.description, fees) !== null;
  }
  const wanted = line.chargeKind === 'pumpMinimum' ? 'pumpTime' : line.chargeKind;
  return sheet.others.some(({ clause }) => clause.kind === wanted);
}

/** A charge that the rate sheet does not have at all. */
function notAgreed(at: LineCase): Judgement {
  const { line, name } = at;
  const sheet = at.sheet?.sheet.name ?? 'the rate sheet';
  const kind =
    line.chargeKind === 'shortLoad'
      ? 'shortLoadNotOwed'
      : line.chargeKind === 'waiting'
        ? 'waitingNotOwed'
        : 'feeNotAgreed';
  const sentence = `${name}: "${billed(at)}" is not on ${sheet}.`;
  return nothingOwed(kind, line.amount, sentence);
}

function notDelivered(at: LineCase): Judgement {
  const { line } = at;
  const why = line.ticketNumber
    ? `we have no delivery with number ${line.ticketNumber}`
    : 'no delivery of ours fits it';
  const sentence = `Line ${line.position} (${billed(at)}): ${why}.`;
  return nothingOwed('billedNotDelivered', line.amount, sentence);
}

function where({ line, isEarlier }: Taker): string {
  if (!isEarlier) return `on line ${line.position}`;
  return line.invoiceNumber ? `on earlier invoice ${line.invoiceNumber}` : 'on an earlier bill';
}

function twice(at: LineCase, taker: Taker): Judgement {
  const { line, name } = at;
  const isPumpTime = line.chargeKind === 'pumpMinimum' || line.chargeKind === 'pumpTime';
  const mixesTimeAndMinimum = isPumpTime && taker.line.chargeKind !== line.chargeKind;
  const amounts = `${dollars(taker.line.amount)} ${where(taker)}, ${dollars(line.amount)} again on line ${line.position}`;
  const clauseId = at.candidates[0]?.clauseId || null;
  const why = explain(at.candidates);
  if (mixesTimeAndMinimum || line.chargeKind === 'pumpMinimum') {
    const sentence = `${why.sentence} The hours or their minimum are owed once, not both: ${amounts}.`;
    return nothingOwed('pumpMinimumWrong', line.amount, sentence, why.steps, clauseId);
  }
  const otherMix = line.mixCode && taker.line.mixCode && !sameMix(line.mixCode, taker.line.mixCode);
  if (line.chargeKind === 'mix' && otherMix && !taker.isEarlier) {
    const sentence = `${name}: its concrete is billed ${where(taker)}; "${billed(at)}" on top is not on the rate sheet.`;
    return nothingOwed('feeNotAgreed', line.amount, sentence, [], clauseId);
  }
  const sentence = `${name} is billed twice: ${amounts}.`;
  return nothingOwed('billedTwice', line.amount, sentence, why.steps, clauseId);
}

function judgeAgainst(at: LineCase, taken: Taken, reckoning: Reckoning): Judgement {
  const { expected } = taken;
  switch (at.line.chargeKind) {
    case 'mix':
      return judgeConcrete(at, expected);
    case 'waiting':
      return judgeWaiting(at, expected);
    case 'pumpTime':
    case 'pumpMinimum':
      return judgePumpTime(at, expected, reckoning);
    case 'pumpYards':
      return judgePumpYards(at, expected);
    case 'shortLoad':
      return judgeCharge(at, expected, {
        notOwed: 'shortLoadNotOwed',
        wrong: 'shortLoadWrongAmount',
      });
    default:
      return judgeCharge(at, expected, { notOwed: 'feeNotAgreed', wrong: 'feeWrongAmount' });
  }
}

/** Deliveries that the sheet was not made for: a fee per load on a pump ticket, for one. */
function notRated(at: LineCase): Judgement {
  const isPump = (PUMP_KINDS as readonly string[]).includes(at.line.chargeKind);
  const what = isPump ? 'pump work' : 'this charge';
  return notCheckable(`${at.name}: no rate sheet says what ${what} should cost on that day.`);
}

/** Holds one billed line (not tax) against what was agreed and delivered. */
export function judge(at: LineCase, taken: Taken, reckoning: Reckoning): Judgement {
  const { line } = at;
  const isCredit = line.amount.isNegative() && line.chargeKind === 'other';
  if (isCredit) return notCheckable(`Line ${line.position}: a credit of ${dollars(line.amount)}.`);
  if (taken.sharedWith.length > 1) {
    const numbers = taken.sharedWith.map(({ position }) => position).join(' and ');
    const why = explain(taken.expected);
    const sentence = `${why.sentence} Lines ${numbers} come to that together.`;
    return { expectedAmount: line.amount, findings: [], sentence, steps: why.steps };
  }
  if (taken.takenBy) return twice(at, taken.takenBy);
  const isDelivered = at.tickets.length + at.pumpTickets.length > 0;
  const agreed = isAgreed(at);
  if (agreed === false) return notAgreed(at);
  if (!isDelivered && agreed === null && isFee(line.chargeKind) && !line.ticketNumber) {
    return notRated(at);
  }
  if (!isDelivered) return notDelivered(at);
  if (taken.expected.length > 0 || line.chargeKind === 'mix') {
    return judgeAgainst(at, taken, reckoning);
  }
  return notRated(at);
}
