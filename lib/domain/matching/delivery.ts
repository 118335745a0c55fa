import type { ChargeKind, PumpTicketFacts, TicketFacts } from '../facts';
import type { Quantity } from '../money/money';
import type { PlainDate } from '../time/clock-minutes';
import type { Match } from './match';

/** A ticket or pump ticket, as far as matching looks at it. */
export interface Delivery {
  readonly kind: Match['delivery']['kind'];
  readonly id: string;
  readonly number: string;
  readonly supplierId: string;
  readonly date: PlainDate;
  readonly jobName: string | null;
  readonly truck: string | null;
  readonly mixCode: string | null;
  /** Yards of a load; null for a pump, whose hours the ticket does not print. */
  readonly quantityYd3: Quantity | null;
}

export function loadDelivery(ticket: TicketFacts): Delivery {
  const { id, number, supplierId, date, jobName, truck, mixCode, quantityYd3 } = ticket;
  return { kind: 'ticket', id, number, supplierId, date, jobName, truck, mixCode, quantityYd3 };
}

export function pumpDelivery(ticket: PumpTicketFacts): Delivery {
  const { id, number, supplierId, date, jobName } = ticket;
  return {
    kind: 'pumpTicket',
    id,
    number,
    supplierId,
    date,
    jobName,
    truck: null,
    mixCode: null,
    quantityYd3: null,
  };
}

const PUMP_KINDS: ReadonlySet<ChargeKind> = new Set([
  'pumpTime',
  'pumpMinimum',
  'pumpYards',
  'pumpSetUp',
]);

/** Which deliveries a charge can be for, likeliest first. */
export function deliveryKindsOf(kind: ChargeKind): readonly Delivery['kind'][] {
  if (PUMP_KINDS.has(kind)) return ['pumpTicket'];
  return kind === 'mix' ? ['ticket'] : ['ticket', 'pumpTicket'];
}

/** The charges by which a delivery counts as billed: its concrete, or its pump time. */
export function isMainCharge(kind: ChargeKind): boolean {
  return kind === 'mix' || kind === 'pumpTime' || kind === 'pumpMinimum';
}

const DAY_MS = 86_400_000;

/** Days from `one` to `other`, never negative. */
export function daysApart(one: PlainDate, other: PlainDate): number {
  return Math.abs(dayNumber(one) - dayNumber(other));
}

function dayNumber(date: PlainDate): number {
  return Date.parse(`${date}T00:00:00Z`) / DAY_MS;
}

/** The days up to `reach` before and after `date`, nearest first. */
export function daysAround(date: PlainDate, reach: number): PlainDate[] {
  const middle = dayNumber(date);
  const days: PlainDate[] = [date];
  for (let step = 1; step <= reach; step += 1) {
    for (const at of [middle - step, middle + step]) {
      days.push(new Date(at * DAY_MS).toISOString().slice(0, 10));
    }
  }
  return days;
}

function words(name: string): string[] {
  return name.toUpperCase().match(/[A-Z0-9]+/g) ?? [];
}

/** Whether two job names agree: one's words are all in the other. Null where either is missing. */
export function sameJob(one: string | null, other: string | null): boolean | null {
  const [first, second] = [words(one ?? ''), words(other ?? '')];
  if (first.length === 0 || second.length === 0) return null;
  const [fewer, more] = first.length <= second.length ? [first, second] : [second, first];
  return fewer.every((word) => more.includes(word));
}

/** Whether two trucks are the same, leading zeros and case aside. Null where either is missing. */
export function sameTruck(one: string | null, other: string | null): boolean | null {
  const plain = (truck: string | null) =>
    (truck ?? '')
      .toUpperCase()
      .replace(/[^A-Z0-9]/g, '')
      .replace(/^0+(?=.)/, '');
  const [first, second] = [plain(one), plain(other)];
  return first === '' || second === '' ? null : first === second;
}
