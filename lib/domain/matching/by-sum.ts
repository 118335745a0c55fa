import type { BillLineFacts } from '../facts';
import { sumQuantity } from '../money/money';
import { sameMix } from '../rating/mix-code';
import { counted, yards } from '../words';
import type { MatchBook } from './book';
import { byDay, onDay } from './by-score';
import { type Delivery, sameJob } from './delivery';

/** Yards by which a day's total may miss its tickets and still be them. */
const SLACK_HUNDREDTHS = 5;
/** Up to this share off, all of a day's loads are still taken as what the line totals. */
const WHOLE_DAY_SLACK = '0.1';
/** More loads than this in one day and job are not searched for a part that adds up. */
const MOST_LOADS_SEARCHED = 60;
/** More than one truck carries, so a number on such a line cannot be one load's. */
const MORE_THAN_A_TRUCK_YD3 = '13';

function hundredths(delivery: Delivery): number {
  return delivery.quantityYd3?.times(100).round().toNumber() ?? 0;
}

/**
 * The loads that add up to `target`: by subset sums, the first in order where several do. Null
 * where none do.
 */
function loadsAddingUpTo(loads: readonly Delivery[], target: number): Delivery[] | null {
  const reached = new Map<number, readonly number[]>([[0, []]]);
  for (const [at, load] of loads.entries()) {
    for (const [sum, parts] of [...reached]) {
      const next = sum + hundredths(load);
      if (next <= target + SLACK_HUNDREDTHS && !reached.has(next))
        reached.set(next, [...parts, at]);
    }
  }
  for (let off = 0; off <= SLACK_HUNDREDTHS; off += 1) {
    const parts = reached.get(target - off) ?? reached.get(target + off);
    if (parts && parts.length > 1) {
      return parts.flatMap((at) => loads[at] ?? []);
    }
  }
  return null;
}

function candidatesFor(
  line: BillLineFacts,
  days: ReadonlyMap<string, Delivery[]>,
  book: MatchBook,
): Delivery[] {
  const loads = onDay(days, line.supplierId, line.date ?? '').filter(
    (load) =>
      book.isFree(load) &&
      (!line.mixCode || !load.mixCode || sameMix(line.mixCode, load.mixCode)) &&
      sameJob(line.jobName, load.jobName) !== false,
  );
  const ofJob = loads.filter((load) => sameJob(line.jobName, load.jobName));
  return ofJob.length > 0 ? ofJob : loads;
}

function matchLine(line: BillLineFacts, loads: readonly Delivery[], book: MatchBook): void {
  const { quantity } = line;
  if (quantity === null || loads.length < 2) return;
  const target = quantity.times(100).round().toNumber();
  const total = sumQuantity(loads.flatMap((load) => load.quantityYd3 ?? []));
  const largest = Math.max(...loads.map(hundredths));
  if (line.ticketNumber && (quantity.lt(MORE_THAN_A_TRUCK_YD3) || target <= largest)) return;
  const apart = total.minus(quantity).abs();
  if (apart.times(100).lte(SLACK_HUNDREDTHS)) {
    book.settle(line, loads, {
      method: 'sum',
      confidence: 0.92,
      reason: `All ${counted(loads.length, 'load')} of that day add up to ${yards(total)}.`,
    });
    return;
  }
  const part = loads.length <= MOST_LOADS_SEARCHED ? loadsAddingUpTo(loads, target) : null;
  if (part) {
    book.settle(line, part, {
      method: 'sum',
      confidence: 0.8,
      reason: `${counted(part.length, 'load')} of that day add up to ${yards(quantity)}.`,
    });
  } else if (target > largest && apart.lte(quantity.times(WHOLE_DAY_SLACK))) {
    book.settle(line, loads, {
      method: 'sum',
      confidence: 0.7,
      reason: `The line totals a day: its ${counted(loads.length, 'load')} come to ${yards(total)}, not ${yards(quantity)}.`,
    });
  }
}

/** Step 4: one line for many loads: those of the same supplier, day, mix and job that add up to it. */
export function matchBySum(book: MatchBook): void {
  const open = book.lines.filter(
    (line) => line.chargeKind === 'mix' && line.date !== null && !book.isSettled(line),
  );
  if (open.length === 0) return;
  const days = byDay(
    book.deliveries.filter((delivery) => delivery.kind === 'ticket' && book.isFree(delivery)),
  );
  for (const line of open) matchLine(line, candidatesFor(line, days, book), book);
}
