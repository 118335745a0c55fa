import type { ChargeKind } from '../facts';
import type { Money, Quantity } from '../money/money';
import type { PlainDate } from '../time/clock-minutes';

/** One step of the arithmetic as a person would write it: "Free 5 min × 10.00 yd³" = "50 min". */
export interface ExplanationStep {
  readonly label: string;
  readonly value: string;
}

export interface Explanation {
  /** One sentence fit to send to the supplier's clerk. */
  readonly sentence: string;
  readonly steps: readonly ExplanationStep[];
}

interface ExpectedLineBase {
  /** Stable for the same facts and sheet: `${clauseId}:${ticketId…}`. */
  readonly key: string;
  readonly chargeKind: ChargeKind;
  readonly clauseId: string;
  readonly rateSheetId: string;
  readonly supplierId: string;
  readonly label: string;
  readonly date: PlainDate;
  readonly ticketIds: readonly string[];
  readonly pumpTicketIds: readonly string[];
  readonly orderId: string | null;
  readonly jobId: string | null;
  readonly explanation: Explanation;
}

/** What the rate sheet and the tickets say a supplier should charge. */
export type ExpectedLine =
  | (ExpectedLineBase & {
      readonly status: 'owed';
      readonly quantity: Quantity;
      readonly unit: string;
      readonly rate: Money;
      readonly amount: Money;
    })
  | (ExpectedLineBase & {
      /** A fact is missing; nothing is guessed, the range it could take is given. */
      readonly status: 'notProvable';
      readonly missing: readonly string[];
      readonly lowest: Money;
      readonly highest: Money | null;
    });

/** A delivery that no sheet or clause covers: said, never silently rated at zero. */
export interface UnratedDelivery {
  readonly ticketId: string | null;
  readonly pumpTicketId: string | null;
  readonly reason: string;
}

export interface ExpectedBill {
  readonly lines: readonly ExpectedLine[];
  /** Clauses that come to nothing for a delivery (a load that is not short), with the reason. */
  readonly notOwed: readonly ExpectedLine[];
  readonly unrated: readonly UnratedDelivery[];
}
