import type { Money, Quantity } from './money/money';
import type { ClockMinutes, PlainDate } from './time/clock-minutes';

/**
 * The facts that rating, matching and variance reason about: what the database's rows, a CSV
 * of the command line and a test table all become before the core sees them.
 */

/** One ready-mix load as delivered (the canary copy). */
export interface TicketFacts {
  readonly id: string;
  readonly number: string;
  readonly supplierId: string;
  readonly orderId: string | null;
  readonly jobId: string | null;
  readonly jobName: string | null;
  readonly date: PlainDate;
  readonly plant: string | null;
  readonly truck: string | null;
  readonly loadNumber: number | null;
  readonly mixCode: string;
  readonly quantityYd3: Quantity;
  readonly returnedYd3: Quantity | null;
  readonly batchedAt: ClockMinutes | null;
  readonly arrivedAt: ClockMinutes | null;
  readonly startedAt: ClockMinutes | null;
  readonly finishedAt: ClockMinutes | null;
  readonly leftAt: ClockMinutes | null;
}

/** One day's work of a concrete pump at one job. */
export interface PumpTicketFacts {
  readonly id: string;
  readonly number: string;
  readonly supplierId: string;
  readonly orderId: string | null;
  readonly jobId: string | null;
  readonly jobName: string | null;
  readonly date: PlainDate;
  readonly leftYardAt: ClockMinutes | null;
  readonly arrivedAt: ClockMinutes | null;
  readonly finishedAt: ClockMinutes | null;
  readonly leftAt: ClockMinutes | null;
  readonly backInYardAt: ClockMinutes | null;
  readonly pumpedYd3: Quantity;
  readonly setUps: number;
}

/** What was asked for (the white copy). */
export interface OrderFacts {
  readonly id: string;
  readonly number: string;
  readonly supplierId: string;
  readonly jobId: string | null;
  readonly jobName: string | null;
  readonly date: PlainDate;
  readonly mixCode: string | null;
  readonly orderedYd3: Quantity;
  readonly firstTruckAt: ClockMinutes | null;
  readonly spacingMinutes: number | null;
  /** False where the place of delivery is exempt from sales tax. */
  readonly taxable: boolean;
}

/** What a billed line charges for; `other` where the importer could not tell. */
export const CHARGE_KINDS = [
  'mix',
  'shortLoad',
  'waiting',
  'perLoadFee',
  'perYardFee',
  'pumpTime',
  'pumpMinimum',
  'pumpYards',
  'pumpSetUp',
  'tax',
  'other',
] as const;
export type ChargeKind = (typeof CHARGE_KINDS)[number];

/** One line of a supplier's statement or invoice (the pink copy). */
export interface BillLineFacts {
  readonly id: string;
  readonly supplierId: string;
  /** Order of appearance on the document, from 1. */
  readonly position: number;
  readonly invoiceNumber: string | null;
  readonly date: PlainDate | null;
  /** The delivery's number as the supplier printed it; null where the line has none. */
  readonly ticketNumber: string | null;
  readonly jobName: string | null;
  readonly truck: string | null;
  readonly chargeKind: ChargeKind;
  readonly description: string;
  readonly mixCode: string | null;
  readonly quantity: Quantity | null;
  readonly unit: string | null;
  readonly unitPrice: Money | null;
  readonly amount: Money;
}
