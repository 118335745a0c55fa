import { describe, expect, test } from 'vitest';
import { aLine, aSheet, aTicket, type TicketSketch } from '../../../tests/support/facts';
import { extend, money, quantity, roundCents } from '../money/money';
import { reconcile } from '../variance/reconcile';
import { expectedBill } from './expected-bill';

/** Charges by the observed conventions OC-nn: parameters as published, amounts worked out. */
function charged(clause: object, ticket: Omit<TicketSketch, 'number'>): string {
  const bill = expectedBill({
    rateSheets: [aSheet([clause, { kind: 'mixPrice', mixCode: null, dollarsPerYd3: '0' }])],
    orders: [],
    tickets: [aTicket({ number: '1', ...ticket })],
    pumpTickets: [],
  });
  const amounts = bill.lines.map((line) => (line.status === 'owed' ? line.amount.toFixed(2) : '?'));
  return amounts.length === 0 ? '0.00' : amounts.join(' ');
}

const waiting = (free: object, dollarsPerMinute: string) => ({
  kind: 'waiting',
  free,
  dollarsPerMinute,
});
const perYd3 = (minutesPerYd3: string) => ({ basis: 'perYd3', minutesPerYd3 });
const perLoad = (minutes: string) => ({ basis: 'perLoad', minutes });

describe('waiting', () => {
  test.each([
    ['CV-39 OC-10 9 yd, 90 min', waiting(perYd3('7'), '2.1667'), '9', '09:30', '58.50'],
    [
      'CV-40 OC-10 9 yd, 63 min: the boundary',
      waiting(perYd3('7'), '2.1667'),
      '9',
      '09:03',
      '0.00',
    ],
    ['CV-41 OC-11 10 yd, 85 min', waiting(perYd3('6'), '1.00'), '10', '09:25', '25.00'],
    ['CV-42 OC-12 4 yd, 40 min', waiting(perYd3('6'), '1.5833'), '4', '08:40', '25.33'],
    ['CV-43 OC-13 62 min', waiting(perLoad('45'), '3.30'), '10', '09:02', '56.10'],
    ['CV-44 OC-14 75 min', waiting(perLoad('60'), '3.00'), '10', '09:15', '45.00'],
    ['CV-44 OC-15 47 min', waiting(perLoad('30'), '2.00'), '10', '08:47', '34.00'],
  ])('%s', (_, clause, yards, finished, wanted) => {
    expect(charged(clause, { yards, arrived: '08:00', finished })).toBe(wanted);
  });
});

const perShort = (thresholdYd3: string, dollarsPerYd3: string) => ({
  kind: 'shortLoad',
  thresholdYd3,
  charge: { basis: 'perShortYd3', dollarsPerYd3 },
});

describe('short load', () => {
  test.each([
    ['CV-49 OC-02 1.4 short of 3', perShort('3', '30'), '1.4', '48.00'],
    ['CV-51 OC-04', perShort('8', '75'), '3.0', '375.00'],
    ['CV-51 OC-04', perShort('8', '75'), '5.0', '225.00'],
    ['CV-51 OC-04', perShort('8', '75'), '6.5', '112.50'],
    ['CV-51 OC-04', perShort('8', '75'), '7.5', '37.50'],
    ['CV-51 OC-04 at the threshold', perShort('8', '75'), '8.0', '0.00'],
  ])('%s, %#', (_, clause, yards, wanted) => {
    expect(charged(clause, { yards })).toBe(wanted);
  });
});

/** Tax on lines of these amounts in one invoice. */
function taxOn(ratePercent: string, amounts: readonly string[]): string {
  const bill = expectedBill({
    rateSheets: [
      aSheet([
        ...amounts.map((dollarsPerYd3, at) => ({
          kind: 'mixPrice',
          mixCode: `M${at}`,
          dollarsPerYd3,
        })),
        { kind: 'tax', ratePercent, taxes: ['mixPrice'] },
      ]),
    ],
    orders: [],
    tickets: amounts.map((_, at) => aTicket({ number: String(at), mix: `M${at}`, yards: '1' })),
    pumpTickets: [],
  });
  const tax = bill.lines.find((line) => line.chargeKind === 'tax');
  return tax?.status === 'owed' ? tax.amount.toFixed(2) : 'none';
}

describe('tax and rounding (SSUTA section 324: up when the third decimal is over 4)', () => {
  test.each([
    ['CV-65', '6.5', ['1.00'], '0.07'],
    ['CV-65', '5', ['0.90'], '0.05'],
    ['CV-66 no double rounding', '5', ['0.89'], '0.04'],
    ['CV-67 invoice basis', '5', ['0.90', '0.90', '0.90'], '0.14'],
    ['CV-68', '7', ['1234.50'], '86.42'],
  ])('%s: %s%% of %j is %s', (_, rate, amounts, wanted) => {
    expect(taxOn(rate, amounts)).toBe(wanted);
  });
  test('CV-67 item basis, as three lines rounded apart', () => {
    const each = roundCents(extend(quantity('0.90'), money('0.05')));
    expect(each.times(3).toFixed(2)).toBe('0.15');
  });
});

/** Findings of a line against a delivery of the same quantity at the same price. */
function findings(billed: string, price: string, amount: string): string[] {
  const rateSheets = [aSheet([{ kind: 'mixPrice', mixCode: null, dollarsPerYd3: price }])];
  const { findings: found } = reconcile({
    rateSheets,
    orders: [],
    tickets: [aTicket({ number: '1', yards: billed })],
    pumpTickets: [],
    billLines: [aLine({ at: 1, ticket: '1', quantity: billed, price, amount })],
    earlierLines: [],
    handMatches: [],
    tolerances: {},
    statement: null,
  });
  return found.map(({ kind, difference }) => `${kind} ${difference.toFixed(2)}`);
}

describe('extension check (EN 16931 examples; Peppol rule with slack 0.02)', () => {
  test('CV-80 2 × 1,273.00 printed as 1,273.00 (EN example2, line 1)', () => {
    expect(findings('2', '1273.00', '1273.00')).toEqual(['arithmeticWrong -1273.00']);
  });
  test('CV-80 6 × 18.33 printed as −109.98 (EN example1, line 20)', () => {
    expect(findings('6', '18.33', '-109.98')).toEqual(['arithmeticWrong -219.96']);
  });
  test('CV-81 off by 0.02 passes, by 0.03 does not', () => {
    expect(findings('10', '158', '1580.02')).toEqual([]);
    expect(findings('10', '158', '1580.03')).toEqual(['arithmeticWrong 0.03']);
  });
});
