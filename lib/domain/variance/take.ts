import type { BillLineFacts } from '../facts';
import { type Money, roundCents, sumMoney } from '../money/money';
import type { ExpectedLine } from '../rating/expected-line';
import { withinSlack } from './draft';
import {
  candidatesFor,
  type EarlierLine,
  type LineCase,
  type Reckoning,
  type Taker,
} from './line-case';

/** Which expected lines a billed line stands for. */
export interface Taken {
  readonly expected: readonly ExpectedLine[];
  /** Set where the charge is agreed, but another line has it already. */
  readonly takenBy: Taker | null;
  /** Pump time in several lines (hours and a top-up to the minimum) that come out right together. */
  readonly sharedWith: readonly BillLineFacts[];
}

const NOTHING: Taken = { expected: [], takenBy: null, sharedWith: [] };

/** The amount of an expected line, its lowest where it is not provable. */
export function amountOf(expected: ExpectedLine): Money {
  return expected.status === 'owed' ? expected.amount : expected.lowest;
}

function takenByEarlier(earlier: readonly EarlierLine[], reckoning: Reckoning) {
  const takers = new Map<string, Taker>();
  for (const line of earlier) {
    const ids = [...line.ticketIds, ...line.pumpTicketIds];
    for (const { key } of candidatesFor(line, ids, reckoning)) {
      if (!takers.has(key)) takers.set(key, { line, isEarlier: true });
    }
  }
  return takers;
}

/** Closest to what is owed first; on a tie pump hours before a minimum, then as printed. */
function byFit(owed: Money) {
  return (one: LineCase, other: LineCase) => {
    const off = (at: LineCase) => roundCents(at.line.amount.minus(owed).abs());
    const byAmount = off(one).comparedTo(off(other));
    const isMinimum = (at: LineCase) => Number(at.line.chargeKind === 'pumpMinimum');
    return byAmount || isMinimum(one) - isMinimum(other) || one.line.position - other.line.position;
  };
}

class Allocation {
  readonly taken = new Map<string, Taken>();

  constructor(readonly takers: Map<string, Taker>) {}

  give(at: LineCase, expected: readonly ExpectedLine[], sharedWith: readonly BillLineFacts[] = []) {
    for (const { key } of expected) this.takers.set(key, { line: at.line, isEarlier: false });
    this.taken.set(at.line.id, { expected, takenBy: null, sharedWith });
  }

  refuse(at: LineCase) {
    const [first] = at.candidates;
    const takenBy = (first && this.takers.get(first.key)) ?? null;
    this.taken.set(at.line.id, { ...NOTHING, takenBy });
  }

  free(at: LineCase): ExpectedLine[] {
    return at.candidates.filter(({ key }) => !this.takers.has(key));
  }

  /** Lines that all charge one and the same expected line: the best fit has it. */
  single(rivals: readonly LineCase[], expected: ExpectedLine) {
    if (this.takers.has(expected.key)) {
      for (const at of rivals) this.refuse(at);
      return;
    }
    const together = sumMoney(rivals.map(({ line }) => line.amount));
    const isTopUp = rivals.some(({ line }) => line.chargeKind === 'pumpMinimum');
    if (rivals.length > 1 && isTopUp && withinSlack(together, amountOf(expected))) {
      const lines = rivals.map(({ line }) => line);
      for (const at of rivals) this.give(at, [expected], lines);
      return;
    }
    const [best, ...others] = [...rivals].sort(byFit(amountOf(expected)));
    if (best) this.give(best, [expected]);
    for (const at of others) this.refuse(at);
  }

  /**
   * A line that may charge several deliveries: the one whose amount it has to the cent, else all
   * that no other line charges.
   */
  several(rivals: readonly LineCase[]) {
    const rest = rivals.filter((at) => {
      const exact = this.free(at).find(
        (expected) => !amountOf(expected).isZero() && amountOf(expected).eq(at.line.amount),
      );
      if (exact) this.give(at, [exact]);
      return !exact;
    });
    for (const at of rest) {
      const free = this.free(at);
      if (free.length > 0) this.give(at, free);
      else this.refuse(at);
    }
  }
}

function grouped(cases: readonly LineCase[]): LineCase[][] {
  const groups = new Map<string, LineCase[]>();
  for (const at of cases) {
    const key = JSON.stringify(at.candidates.map((candidate) => candidate.key));
    const group = groups.get(key) ?? [];
    group.push(at);
    groups.set(key, group);
  }
  return [...groups.values()];
}

/**
 * Gives every expected line to at most one billed line: to the earlier bill that charges it
 * already, else to the line that fits best, so that only the surplus is billed twice. Lines for
 * one delivery choose before lines for a whole day, which have what is left.
 */
export function takeCharges(
  cases: readonly LineCase[],
  earlier: readonly EarlierLine[],
  reckoning: Reckoning,
): ReadonlyMap<string, Taken> {
  const allocation = new Allocation(takenByEarlier(earlier, reckoning));
  const groups = grouped(cases.filter(({ candidates }) => candidates.length > 0));
  for (const group of groups) {
    const [expected, second] = group[0]?.candidates ?? [];
    if (expected && !second) allocation.single(group, expected);
  }
  for (const group of groups) {
    if ((group[0]?.candidates.length ?? 0) > 1) allocation.several(group);
  }
  return allocation.taken;
}

export function takenFor(at: LineCase, taken: ReadonlyMap<string, Taken>): Taken {
  return taken.get(at.line.id) ?? NOTHING;
}
