import type { Decimal } from 'decimal.js';
import type { ChargeKind, PumpTicketFacts, TicketFacts } from '../../facts';
import type { Money, Quantity } from '../../money/money';
import type { Clause, ClauseKind } from '../clauses';
import type { Explanation } from '../expected-line';

/** What one clause makes of one delivery. An amount is always quantity × rate, to the cent. */
export type Rated =
  | {
      readonly status: 'owed';
      readonly label: string;
      readonly quantity: Quantity;
      readonly unit: string;
      readonly rate: Money;
      readonly explanation: Explanation;
    }
  | {
      readonly status: 'notProvable';
      readonly label: string;
      readonly missing: readonly string[];
      readonly lowest: Money;
      readonly highest: Money | null;
      readonly explanation: Explanation;
    };

export type ClauseOf<K extends ClauseKind> = Extract<Clause, { kind: K }>;

/** One ready-mix load with what its order says about it. */
export interface LoadFacts {
  readonly ticket: TicketFacts;
  /** Whether it is the last of several loads of its order; null while its order is not known. */
  readonly isBalanceLoad: boolean | null;
}

/** The taxable charges of one invoice (or one statement) added up. */
export interface TaxBase {
  readonly taxable: Money;
  /** What the base is of, for the sentence: "invoice 20931", "this statement". */
  readonly name: string;
}

/** The small interface that every kind of clause has: in plain words, and as an amount. */
export interface ClauseRule<C, Facts> {
  readonly chargeKind: ChargeKind;
  describe(clause: C): string;
  rate(clause: C, facts: Facts): Rated;
}

export type LoadRule<K extends ClauseKind> = ClauseRule<ClauseOf<K>, LoadFacts>;
export type PumpRule<K extends ClauseKind> = ClauseRule<ClauseOf<K>, PumpTicketFacts>;

/** "Load 447182, truck 214". */
export function loadName(ticket: TicketFacts): string {
  return ticket.truck ? `Load ${ticket.number}, truck ${ticket.truck}` : `Load ${ticket.number}`;
}

export function atLeastZero(value: Decimal): Quantity {
  return (value.isNegative() ? value.times(0) : value) as Quantity;
}
