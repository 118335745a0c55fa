import Decimal from 'decimal.js';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { moneyText, sumMoney } from '../../lib/domain/money/money';
import { expectedBill } from '../../lib/domain/rating/expected-bill';
import { reconcile } from '../../lib/domain/variance/reconcile';
import { draws, SHEETS, scenario, shuffled } from './scenario';

type Scenario = typeof scenario extends fc.Arbitrary<infer S> ? S : never;

const reconciled = (month: Scenario) =>
  reconcile({
    ...month,
    rateSheets: SHEETS,
    earlierLines: [],
    handMatches: [],
    tolerances: {},
    statement: null,
  });

/** Works out "10.50 yd × $158.00" or "$56.25 − $32.63"; null where the words are no arithmetic. */
function workOut(words: string): Decimal | null {
  const factors = words.split(/([×−])/).map((part) => part.trim());
  const read = (part: string | undefined) => {
    const digits = /-?[\d,]+(\.\d+)?/.exec((part ?? '').replace('$', ''))?.[0];
    if (digits === undefined) return null;
    const value = new Decimal(digits.replaceAll(',', ''));
    return part?.includes('%') ? value.dividedBy(100) : value;
  };
  const [left, right] = [read(factors[0]), read(factors[2])];
  if (factors.length !== 3 || left === null || right === null) return null;
  return factors[1] === '×' ? left.times(right) : left.minus(right);
}

/** Every "a × b = c" of a step, held against what a and b come to. */
function checkArithmetic(value: string): number {
  let checked = 0;
  for (const equation of value.split(/[;:,] /)) {
    const [words, result, more] = equation.split('=');
    if (words === undefined || result === undefined || more !== undefined) continue;
    const worked = workOut(words);
    const said = /-?\$?-?[\d,]+(\.\d+)?/.exec(result)?.[0];
    if (worked === null || said === undefined) continue;
    const printed = new Decimal(said.replaceAll(/[$,]/g, ''));
    const rounded = worked.toDecimalPlaces(Math.max(2, printed.decimalPlaces()));
    expect(rounded.toFixed(4), value).toBe(printed.toFixed(4));
    checked += 1;
  }
  return checked;
}

describe('rating', () => {
  test('every explanation works out to the amount of its line', () => {
    let checked = 0;
    fc.assert(
      fc.property(scenario, (month) => {
        const bill = expectedBill({ ...month, rateSheets: SHEETS });
        for (const line of [...bill.lines, ...bill.notOwed]) {
          for (const step of line.explanation.steps) checked += checkArithmetic(step.value);
          const last = line.explanation.steps.at(-1)?.value ?? '';
          if (line.status === 'owed' && last.includes('=') && !line.amount.isZero()) {
            expect(
              last.endsWith(
                `= $${Number(line.amount).toLocaleString('en-US', { minimumFractionDigits: 2 })}`,
              ),
              last,
            ).toBe(true);
          }
        }
      }),
      { numRuns: 200 },
    );
    expect(checked).toBeGreaterThan(1000);
  });

  test('does not depend on the order of the tickets, and covers each or says why not', () => {
    fc.assert(
      fc.property(scenario, draws, (month, order) => {
        const bill = expectedBill({ ...month, rateSheets: SHEETS });
        const other = expectedBill({
          ...month,
          rateSheets: shuffled(SHEETS, order),
          tickets: shuffled(month.tickets, order),
          pumpTickets: shuffled(month.pumpTickets, order),
        });
        expect(other).toEqual(bill);
        for (const { id } of month.tickets) {
          const priced = [...bill.lines, ...bill.notOwed].some(
            (line) => line.chargeKind === 'mix' && line.ticketIds.includes(id),
          );
          expect(priced).toBe(!bill.unrated.some(({ ticketId }) => ticketId === id));
        }
      }),
      { numRuns: 200 },
    );
  });
});

describe('reconciling', () => {
  test('the lines add up to the bill, and their findings to their differences', () => {
    fc.assert(
      fc.property(scenario, (month) => {
        const { lines, totals, findings } = reconciled(month);
        const billed = sumMoney(month.billLines.map(({ amount }) => amount));
        const { difference, expected } = totals;
        expect(moneyText(totals.billed)).toBe(moneyText(billed));
        expect(moneyText(billed.minus(expected))).toBe(moneyText(difference));
        expect(lines.filter(({ billLineId }) => billLineId).map(({ key }) => key)).toEqual(
          month.billLines.map(({ id }) => id),
        );
        for (const line of lines) {
          const sum = sumMoney(line.findings.map((finding) => finding.difference));
          if (line.findings.length > 0) expect(moneyText(sum)).toBe(moneyText(line.difference));
          else expect(line.difference.abs().lte('0.02'), JSON.stringify(line)).toBe(true);
        }
        expect(new Set(findings.map(({ key }) => key)).size).toBe(findings.length);
      }),
      { numRuns: 400 },
    );
  });

  test('every explanation of a finding works out', () => {
    fc.assert(
      fc.property(scenario, (month) => {
        for (const finding of reconciled(month).findings) {
          for (const step of finding.steps) checkArithmetic(step.value);
        }
      }),
      { numRuns: 300 },
    );
  });

  test('does not depend on the order of the input, and a second run finds the same', () => {
    fc.assert(
      fc.property(scenario, draws, (month, order) => {
        const other = {
          orders: shuffled(month.orders, order),
          billLines: shuffled(month.billLines, order),
          tickets: shuffled(month.tickets, order),
          pumpTickets: shuffled(month.pumpTickets, order),
        };
        expect(reconciled(other)).toEqual(reconciled(month));
      }),
      { numRuns: 200 },
    );
  });

  test('a bill made of exactly what is expected has no finding', () => {
    fc.assert(
      fc.property(scenario, (month) => {
        const tickets = month.tickets.filter(({ mixCode }) => mixCode !== 'FLOWFILL');
        const rated = expectedBill({ ...month, tickets, orders: [], rateSheets: SHEETS });
        const numbers = new Map(
          [...month.tickets, ...month.pumpTickets].map(({ id, number }) => [id, number]),
        );
        const billLines = rated.lines.flatMap((line, at) => {
          if (line.status !== 'owed') return [];
          const [id = ''] = [...line.ticketIds, ...line.pumpTicketIds];
          return [
            {
              id: `l-${at}`,
              supplierId: line.supplierId,
              position: at + 1,
              invoiceNumber: null,
              date: line.date,
              ticketNumber: line.chargeKind === 'tax' ? null : (numbers.get(id) ?? null),
              jobName: null,
              truck: null,
              chargeKind: line.chargeKind,
              description: line.label,
              mixCode: null,
              quantity: line.chargeKind === 'tax' ? null : line.quantity,
              unit: line.unit,
              unitPrice: line.chargeKind === 'tax' ? null : line.rate,
              amount: line.amount,
            },
          ];
        });
        const { findings } = reconciled({ ...month, orders: [], tickets, billLines });
        expect(findings.map(({ sentence }) => sentence)).toEqual([]);
      }),
      { numRuns: 200 },
    );
  });
});
