import type { BillLineFacts } from '../facts';
import { sameMix } from '../rating/mix-code';
import type { MatchBook } from './book';
import { type Delivery, daysApart, deliveryKindsOf, isMainCharge, sameTruck } from './delivery';
import type { MatchMethod } from './match';
import { coreNumber, foldedNumber, plainNumber } from './numbers';

interface Reading {
  readonly method: MatchMethod;
  readonly confidence: number;
  readonly keyOf: (number: string) => string | null;
  /** How far apart the dates may be; suppliers use numbers again after some months. */
  readonly reachDays: number;
  /** Whether a second main charge may be tied to the same delivery by this reading. */
  readonly mayRepeat: boolean;
  /** Whether something besides the number has to agree. */
  readonly wantsEvidence: boolean;
  readonly reason: (line: string, delivery: string) => string;
}

const READINGS: readonly Reading[] = [
  {
    method: 'number',
    confidence: 1,
    keyOf: (number) => number.trim(),
    reachDays: 120,
    mayRepeat: true,
    wantsEvidence: false,
    reason: (line) => `Same number ${line}`,
  },
  {
    method: 'normalizedNumber',
    confidence: 0.98,
    keyOf: plainNumber,
    reachDays: 30,
    mayRepeat: true,
    wantsEvidence: false,
    reason: (line, delivery) => `Number ${line} is ${delivery} written differently`,
  },
  {
    method: 'normalizedNumber',
    confidence: 0.95,
    keyOf: coreNumber,
    reachDays: 7,
    mayRepeat: true,
    wantsEvidence: false,
    reason: (line, delivery) => `Number ${line} is ${delivery} without prefix or suffix`,
  },
  {
    method: 'normalizedNumber',
    confidence: 0.9,
    keyOf: foldedNumber,
    reachDays: 0,
    mayRepeat: false,
    wantsEvidence: true,
    reason: (line, delivery) =>
      `Number ${line} is ${delivery} with characters that are easily confused`,
  },
];

const keyFor = (supplierId: string, number: string) => JSON.stringify([supplierId, number]);

function distance(line: BillLineFacts, delivery: Delivery): number {
  return line.date === null ? 0 : daysApart(line.date, delivery.date);
}

function agreesElsewhere(line: BillLineFacts, delivery: Delivery): boolean {
  if (delivery.kind === 'pumpTicket' || !isMainCharge(line.chargeKind)) return line.date !== null;
  if (sameTruck(line.truck, delivery.truck)) return true;
  const yards = delivery.quantityYd3;
  const sameYards = Boolean(line.quantity && yards && line.quantity.minus(yards).abs().lt('0.005'));
  const mixDiffers =
    line.mixCode && delivery.mixCode ? !sameMix(line.mixCode, delivery.mixCode) : false;
  return sameYards && !mixDiffers;
}

/** The one delivery that fits best by this reading; null where none or several do. */
function pick(
  line: BillLineFacts,
  candidates: readonly Delivery[],
  reading: Reading,
  book: MatchBook,
): Delivery | null {
  const kinds = deliveryKindsOf(line.chargeKind);
  const main = isMainCharge(line.chargeKind);
  const possible = candidates.filter(
    (delivery) =>
      kinds.includes(delivery.kind) &&
      distance(line, delivery) <= reading.reachDays &&
      (reading.mayRepeat || !main || book.isFree(delivery)) &&
      (!reading.wantsEvidence || agreesElsewhere(line, delivery)),
  );
  const rank = (delivery: Delivery) => [
    kinds.indexOf(delivery.kind),
    distance(line, delivery),
    main && !book.isFree(delivery) ? 1 : 0,
  ];
  const ranked = possible
    .map((delivery) => ({ delivery, rank: rank(delivery) }))
    .sort((one, other) => compareRanks(one.rank, other.rank));
  const [best, second] = ranked;
  if (!best) return null;
  const tied = second !== undefined && compareRanks(best.rank, second.rank) === 0;
  return tied && reading.wantsEvidence ? null : best.delivery;
}

function compareRanks(one: readonly number[], other: readonly number[]): number {
  const at = one.findIndex((value, index) => value !== other[index]);
  return at < 0 ? 0 : (one[at] ?? 0) - (other[at] ?? 0);
}

function reasonFor(
  line: BillLineFacts,
  delivery: Delivery,
  reading: Reading,
  again: boolean,
): string {
  const how = reading.reason(line.ticketNumber ?? '', delivery.number);
  const dates = distance(line, delivery) > 0 ? `; the dates differ (${delivery.date})` : '';
  return `${how}${dates}${again ? '; another line already bills this delivery' : ''}.`;
}

/** Step 1 and 2: by the number as printed, then by looser and looser readings of it. */
export function matchByNumber(book: MatchBook): void {
  for (const reading of READINGS) {
    const open = book.lines.filter((line) => line.ticketNumber && !book.isSettled(line));
    if (open.length === 0) return;
    const byKey = new Map<string, Delivery[]>();
    for (const delivery of book.deliveries) {
      const number = reading.keyOf(delivery.number);
      if (number === null || number === '') continue;
      const key = keyFor(delivery.supplierId, number);
      const list = byKey.get(key) ?? [];
      list.push(delivery);
      byKey.set(key, list);
    }
    for (const line of open) {
      const number = reading.keyOf(line.ticketNumber ?? '');
      const candidates = number ? byKey.get(keyFor(line.supplierId, number)) : undefined;
      const delivery = candidates && pick(line, candidates, reading, book);
      if (!delivery) continue;
      const again = isMainCharge(line.chargeKind) && !book.isFree(delivery);
      const late = distance(line, delivery) > 3 ? 0.1 : 0;
      book.settle(line, [delivery], {
        method: reading.method,
        confidence: reading.confidence - late,
        reason: reasonFor(line, delivery, reading, again),
      });
    }
  }
}
