import type { BillLineFacts } from '../facts';
import { sameMix } from '../rating/mix-code';
import { type Delivery, daysApart, sameJob, sameTruck } from './delivery';
import { isMistyped } from './numbers';

/**
 * How badly a billed line and a delivery fit, in whole points: 0 is a fit in everything that both
 * print, `UNMATCHED_COST` is what leaving the line without a delivery costs. Whole numbers, so
 * that the sum over an assignment is exact.
 */
export const UNMATCHED_COST = 500;

const MISSING_POINTS = { mix: 60, truck: 60, job: 40, quantity: 150 };
const DIFFERENT_POINTS = { mix: 350, truck: 250, job: 300 };
const DATE_POINTS = [0, 120, 220, 300];
const MISTYPED_POINTS = 100;

function points(same: boolean | null, fact: 'mix' | 'truck' | 'job'): number {
  if (same === null) return MISSING_POINTS[fact];
  return same ? 0 : DIFFERENT_POINTS[fact];
}

function mixAgrees(line: BillLineFacts, delivery: Delivery): boolean | null {
  if (!line.mixCode || !delivery.mixCode) return null;
  return sameMix(line.mixCode, delivery.mixCode);
}

/** Points for yards that differ; null where they differ too much for the same load. */
function quantityPoints(line: BillLineFacts, delivery: Delivery): number | null {
  if (delivery.quantityYd3 === null) return 0;
  if (line.quantity === null) return MISSING_POINTS.quantity;
  const apart = line.quantity.minus(delivery.quantityYd3).abs();
  if (apart.lt('0.005')) return 0;
  if (apart.lte('0.25')) return 100;
  if (apart.lte('0.5')) return 180;
  return apart.lte('1') ? 280 : null;
}

/**
 * A line whose printed number is no delivery's may still be a mistyped one, but only where all
 * else agrees: a neighbour's number on the same day proves nothing.
 */
function numberPoints(line: BillLineFacts, delivery: Delivery, others: number): number | null {
  if (!line.ticketNumber) return 0;
  const truck = sameTruck(line.truck, delivery.truck);
  const agrees = others === 0 || (truck === null && others === MISSING_POINTS.truck);
  const mistyped = isMistyped(line.ticketNumber, delivery.number);
  if (!agrees || !(truck === true || mistyped)) return null;
  return MISTYPED_POINTS;
}

/** The cost of putting a line and a delivery together; null where they cannot belong together. */
export function matchCost(line: BillLineFacts, delivery: Delivery): number | null {
  if (line.supplierId !== delivery.supplierId || line.date === null) return null;
  const datePoints = DATE_POINTS[daysApart(line.date, delivery.date)];
  const yardPoints = quantityPoints(line, delivery);
  if (datePoints === undefined || yardPoints === null) return null;
  const isLoad = delivery.kind === 'ticket';
  const mix = isLoad ? points(mixAgrees(line, delivery), 'mix') : 0;
  const truck = isLoad ? points(sameTruck(line.truck, delivery.truck), 'truck') : 0;
  const job = points(sameJob(line.jobName, delivery.jobName), 'job');
  const number = numberPoints(line, delivery, datePoints + yardPoints + mix + truck);
  if (number === null) return null;
  const cost = datePoints + yardPoints + mix + truck + job + number;
  return cost < UNMATCHED_COST ? cost : null;
}

/** What agreed and what did not, for the reason of a match by score. */
export function scoreReason(line: BillLineFacts, delivery: Delivery): string {
  const same: string[] = [];
  const different: string[] = [];
  const note = (name: string, agrees: boolean | null) => {
    if (agrees !== null) (agrees ? same : different).push(name);
  };
  note('date', line.date === null ? null : line.date === delivery.date);
  if (delivery.kind === 'ticket') {
    const yards = delivery.quantityYd3;
    note('yards', line.quantity && yards ? line.quantity.minus(yards).abs().lt('0.005') : null);
    note('mix', mixAgrees(line, delivery));
    note('truck', sameTruck(line.truck, delivery.truck));
  }
  note('job', sameJob(line.jobName, delivery.jobName));
  const number = line.ticketNumber
    ? `number ${line.ticketNumber} is no delivery of ours, but may be ${delivery.number}`
    : 'the line has no number';
  const agreeing = same.length > 0 ? `; same ${same.join(', ')}` : '';
  const differing = different.length > 0 ? `; different ${different.join(', ')}` : '';
  return `Best fit: ${number}${agreeing}${differing}.`;
}
