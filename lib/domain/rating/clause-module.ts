import type { ChargeKind, PumpTicketFacts, TicketFacts } from '../facts';
import type { Money, Quantity } from '../money/money';
import type { Clause, ClauseKind } from './clauses';
import type { Explanation } from './expected-line';

/** What one clause makes of one delivery. */
export type Charge =
  | {
      readonly status: 'owed';
      readonly label: string;
      readonly quantity: Quantity;
      readonly unit: string;
      readonly rate: Money;
      readonly amount: Money;
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

export type ClauseOf<Kind extends ClauseKind> = Extract<Clause, { kind: Kind }>;

/** What a load's place in its order adds to the load itself. */
export interface LoadContext {
  /** True for the last load of an order of several: the one called in to finish. */
  readonly isBalanceLoad: boolean;
}

/** The interface of every clause kind: a new kind is one such module and one registration. */
export interface ClauseModule<Kind extends ClauseKind> {
  readonly kind: Kind;
  readonly chargeKind: ChargeKind;
  /** The clause in a person's words: "Short load: $120.00 a load under 5.00 yd³". */
  describe(clause: ClauseOf<Kind>): string;
  /** Null where the clause charges nothing for the load. */
  rateLoad?(clause: ClauseOf<Kind>, load: TicketFacts, context: LoadContext): Charge | null;
  ratePumpTicket?(clause: ClauseOf<Kind>, pump: PumpTicketFacts): Charge | null;
}
