import type { BillLineFacts, ChargeKind } from '../facts';
import { assignAtMinimumCost, type Edge } from './assign';
import type { MatchBook } from './book';
import { type Delivery, daysAround } from './delivery';
import { matchCost, scoreReason } from './score';

const MOST_DAYS_APART = 3;

const dayKey = (supplierId: string, date: string) => JSON.stringify([supplierId, date]);

/** Deliveries by supplier and day: the blocks within which matching looks. */
export function byDay(deliveries: readonly Delivery[]): Map<string, Delivery[]> {
  const days = new Map<string, Delivery[]>();
  for (const delivery of deliveries) {
    const key = dayKey(delivery.supplierId, delivery.date);
    const list = days.get(key) ?? [];
    list.push(delivery);
    days.set(key, list);
  }
  return days;
}

export function onDay(
  days: ReadonlyMap<string, Delivery[]>,
  supplierId: string,
  date: string,
): readonly Delivery[] {
  return days.get(dayKey(supplierId, date)) ?? [];
}

function edgesOf(
  lines: readonly BillLineFacts[],
  free: readonly Delivery[],
  reach: number,
): Edge[] {
  const days = byDay(free);
  const columnOf = new Map(free.map((delivery, column) => [delivery.id, column]));
  return lines.flatMap((line, row) => {
    if (line.date === null) return [];
    const near = daysAround(line.date, reach).flatMap((date) => onDay(days, line.supplierId, date));
    return near.flatMap((delivery) => {
      const cost = matchCost(line, delivery);
      const column = columnOf.get(delivery.id);
      return cost === null || column === undefined ? [] : [{ row, column, cost }];
    });
  });
}

function assignRound(
  book: MatchBook,
  chargeKind: ChargeKind,
  kind: Delivery['kind'],
  reach: number,
): void {
  const lines = book.lines.filter(
    (line) => line.chargeKind === chargeKind && !book.isSettled(line),
  );
  if (lines.length === 0) return;
  const free = book.deliveries.filter(
    (delivery) => delivery.kind === kind && book.isFree(delivery),
  );
  for (const { row, column, cost } of assignAtMinimumCost(edgesOf(lines, free, reach))) {
    const [line, delivery] = [lines[row], free[column]];
    if (!line || !delivery) continue;
    book.settle(line, [delivery], {
      method: 'score',
      confidence: Math.round(95 - cost / 10) / 100,
      reason: scoreReason(line, delivery),
    });
  }
}

/**
 * Step 3: lines whose number leads nowhere, by date, yards, mix, truck and job, all of a block at
 * once at minimum cost. Lines and deliveries of the same day first, then up to three days apart,
 * which keeps the blocks small.
 */
export function matchByScore(book: MatchBook): void {
  for (const reach of [0, MOST_DAYS_APART]) {
    assignRound(book, 'mix', 'ticket', reach);
    assignRound(book, 'pumpTime', 'pumpTicket', reach);
    assignRound(book, 'pumpMinimum', 'pumpTicket', reach);
  }
}
