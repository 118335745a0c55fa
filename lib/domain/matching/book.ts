import type { BillLineFacts } from '../facts';
import { type Delivery, isMainCharge } from './delivery';
import type { Match, MatchMethod } from './match';

interface Made {
  readonly method: MatchMethod;
  readonly confidence: number;
  readonly reason: string;
}

/** What the steps of matching share: which line has its deliveries, which delivery its line. */
export interface MatchBook {
  readonly lines: readonly BillLineFacts[];
  readonly deliveries: readonly Delivery[];
  /** Lines that a person or an earlier step has settled, also those settled as "no delivery". */
  isSettled(line: BillLineFacts): boolean;
  /** Whether a delivery has no main charge yet, on this bill or an earlier one. */
  isFree(delivery: Delivery): boolean;
  deliveriesOf(lineId: string): readonly Delivery[];
  settle(line: BillLineFacts, deliveries: readonly Delivery[], made: Made): void;
  settleWithout(line: BillLineFacts): void;
  matches(): Match[];
}

export function openBook(
  lines: readonly BillLineFacts[],
  deliveries: readonly Delivery[],
  alreadyBilled: ReadonlySet<string>,
): MatchBook {
  const settled = new Map<string, readonly Delivery[]>();
  const made = new Map<string, Match[]>();
  const billedHere = new Set<string>();
  return {
    lines,
    deliveries,
    isSettled: (line) => settled.has(line.id),
    isFree: ({ id }) => !billedHere.has(id) && !alreadyBilled.has(id),
    deliveriesOf: (lineId) => settled.get(lineId) ?? [],
    settle(line, found, how) {
      settled.set(line.id, found);
      made.set(
        line.id,
        found.map(({ kind, id }) => ({
          billLineId: line.id,
          delivery: { kind, id },
          ...how,
        })),
      );
      if (isMainCharge(line.chargeKind)) for (const { id } of found) billedHere.add(id);
    },
    settleWithout(line) {
      settled.set(line.id, []);
    },
    matches: () => lines.flatMap((line) => made.get(line.id) ?? []),
  };
}
