import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { assignAtMinimumCost, type Edge } from '../../lib/domain/matching/assign';
import { isMainCharge } from '../../lib/domain/matching/delivery';
import { matchBill } from '../../lib/domain/matching/match-bill';
import { UNMATCHED_COST } from '../../lib/domain/matching/score';
import { draws, scenario, shuffled } from './scenario';

type Scenario = typeof scenario extends fc.Arbitrary<infer S> ? S : never;

const matchAll = ({ billLines, tickets, pumpTickets }: Scenario) =>
  matchBill({ lines: billLines, tickets, pumpTickets, handMatches: [] });

const pairs = (matches: ReturnType<typeof matchAll>['matches']) =>
  matches.map(({ billLineId, delivery }) => `${billLineId} ${delivery.id}`).sort();

describe('matching', () => {
  test('does not depend on the order of lines and deliveries', () => {
    fc.assert(
      fc.property(scenario, draws, (month, order) => {
        const other = {
          ...month,
          billLines: shuffled(month.billLines, order),
          tickets: shuffled(month.tickets, order),
          pumpTickets: shuffled(month.pumpTickets, order),
        };
        expect(matchAll(other)).toEqual(matchAll(month));
      }),
      { numRuns: 300 },
    );
  });

  test('accounts for every line and every delivery, once', () => {
    fc.assert(
      fc.property(scenario, (month) => {
        const result = matchAll(month);
        const matched = new Set(result.matches.map(({ billLineId }) => billLineId));
        const unmatched = new Set(result.unmatchedLineIds);
        for (const { id } of month.billLines) expect(matched.has(id)).toBe(!unmatched.has(id));
        const mains = new Set(
          month.billLines.filter((line) => isMainCharge(line.chargeKind)).map(({ id }) => id),
        );
        const billed = new Set(
          result.matches.filter((one) => mains.has(one.billLineId)).map((one) => one.delivery.id),
        );
        for (const { id } of month.tickets) {
          expect(billed.has(id)).toBe(!result.unbilledTicketIds.includes(id));
        }
        for (const { id } of month.pumpTickets) {
          expect(billed.has(id)).toBe(!result.unbilledPumpTicketIds.includes(id));
        }
        expect(result.matches.every(({ reason }) => reason.length > 0)).toBe(true);
      }),
      { numRuns: 300 },
    );
  });

  test('gives a delivery to a second concrete line only by its own number', () => {
    fc.assert(
      fc.property(scenario, (month) => {
        const mixes = new Set(
          month.billLines.filter((line) => line.chargeKind === 'mix').map(({ id }) => id),
        );
        const seen = new Set<string>();
        const found = matchAll(month).matches.filter(({ billLineId }) => mixes.has(billLineId));
        const bySearch = found.filter(({ method }) => method === 'score' || method === 'sum');
        const byNumber = new Set(
          found.filter((one) => !bySearch.includes(one)).map(({ delivery }) => delivery.id),
        );
        for (const { delivery } of bySearch) {
          expect(seen.has(delivery.id) || byNumber.has(delivery.id)).toBe(false);
          seen.add(delivery.id);
        }
      }),
      { numRuns: 300 },
    );
  });

  test("keeps a person's matches, and finds nothing new when its own are confirmed", () => {
    fc.assert(
      fc.property(scenario, (month) => {
        const first = matchAll(month);
        const confirmed = [
          ...first.matches,
          ...first.unmatchedLineIds.map((billLineId) => ({ billLineId, delivery: null })),
        ];
        const again = matchBill({
          lines: month.billLines,
          tickets: month.tickets,
          pumpTickets: month.pumpTickets,
          handMatches: confirmed,
        });
        expect(pairs(again.matches)).toEqual(pairs(first.matches));
        expect(again.matches.every(({ method }) => method === 'hand')).toBe(true);
      }),
      { numRuns: 300 },
    );
  });
});

/** The least total cost by trying every assignment. */
function leastCost(edges: readonly Edge[], row: number, rows: number, used: Set<number>): number {
  if (row === rows) return 0;
  let least = UNMATCHED_COST + leastCost(edges, row + 1, rows, used);
  for (const edge of edges) {
    if (edge.row !== row || used.has(edge.column)) continue;
    used.add(edge.column);
    least = Math.min(least, edge.cost + leastCost(edges, row + 1, rows, used));
    used.delete(edge.column);
  }
  return least;
}

test('the assignment costs as little as the best of all that there are', () => {
  const size = 6;
  const cell = fc.option(fc.integer({ min: 0, max: UNMATCHED_COST - 1 }), { nil: null });
  const table = fc.array(fc.array(cell, { maxLength: size }), { maxLength: size });
  fc.assert(
    fc.property(table, (cells) => {
      const edges = cells.flatMap((costs, row) =>
        costs.flatMap((cost, column) => (cost === null ? [] : [{ row, column, cost }])),
      );
      const chosen = assignAtMinimumCost(edges);
      const rows = new Set(chosen.map(({ row }) => row));
      expect(rows.size).toBe(chosen.length);
      expect(new Set(chosen.map(({ column }) => column)).size).toBe(chosen.length);
      const cost =
        chosen.reduce((sum, edge) => sum + edge.cost, 0) +
        (cells.length - chosen.length) * UNMATCHED_COST;
      expect(cost).toBe(leastCost(edges, 0, cells.length, new Set()));
    }),
    { numRuns: 500 },
  );
});
