import { describe, expect, test } from 'vitest';
import { anOrder, aPumpTicket, aSheet, aTicket } from '../../../tests/support/facts';
import { checkClauses } from './check-clauses';
import { describeClause } from './clauses-by-kind/registry';
import { expectedBill, type RatingInput } from './expected-bill';

const PRICE = { kind: 'mixPrice', mixCode: '4000A', dollarsPerYd3: '158' };
const WAITING = {
  kind: 'waiting',
  free: { basis: 'perYd3', minutesPerYd3: '3' },
  dollarsPerMinute: '2.25',
};

function lines(input: Partial<RatingInput>) {
  const bill = expectedBill({
    rateSheets: [aSheet([PRICE, WAITING])],
    orders: [],
    tickets: [],
    pumpTickets: [],
    ...input,
  });
  return bill.lines.map((line) =>
    line.status === 'owed'
      ? `${line.chargeKind} ${line.amount.toFixed(2)}`
      : `${line.chargeKind} ${line.lowest.toFixed(2)}–${line.highest?.toFixed(2) ?? '?'}`,
  );
}

describe('sheets', () => {
  const ticket = aTicket({ number: '1', job: 'dock', finished: '07:30' });
  const priced = (dollarsPerYd3: string) => [{ ...PRICE, dollarsPerYd3 }];
  const general = aSheet(priced('158'), { id: 'general' });
  test.each([
    ['the only one', [general], 'mix 1580.00'],
    [
      "the job's own",
      [general, aSheet(priced('150'), { id: 'own', jobId: 'dock' })],
      'mix 1500.00',
    ],
    [
      'the newest version',
      [general, aSheet(priced('160'), { id: 'v2', version: 2 })],
      'mix 1600.00',
    ],
    [
      'not one that starts the day after',
      [general, aSheet(priced('160'), { id: 'v2', version: 2, effectiveFrom: '2026-09-04' })],
      'mix 1580.00',
    ],
    [
      'one that starts the same day',
      [general, aSheet(priced('160'), { id: 'v2', version: 2, effectiveFrom: '2026-09-03' })],
      'mix 1600.00',
    ],
  ])('%s', (_, rateSheets, wanted) => {
    expect(lines({ rateSheets, tickets: [ticket] })).toEqual([wanted]);
  });

  test('a delivery that no sheet or price covers is told, not rated at nothing', () => {
    const tickets = [
      aTicket({ number: '1', mix: 'GROUT' }),
      aTicket({ number: '2', supplier: 'x' }),
    ];
    const bill = expectedBill({ rateSheets: [general], orders: [], tickets, pumpTickets: [] });
    expect(bill.unrated.map(({ ticketId }) => ticketId)).toEqual(['t-1', 't-2']);
    expect(bill.unrated[0]?.reason).toBe('Rate sheet 2026 has no price for mix GROUT of load 1.');
  });
});

describe('waiting', () => {
  test.each([
    ['over midnight', { arrived: '23:40', finished: '00:25' }, 'waiting 33.75'],
    [
      'arrival missing, bounded by batching',
      { batched: '07:00', arrived: null, started: '07:20', finished: '08:00' },
      'waiting 22.50–67.50',
    ],
    ['arrival missing, not bounded', { arrived: null, finished: '08:00' }, 'waiting 0.00–?'],
    [
      'finish missing, bounded by leaving',
      { arrived: '07:00', finished: null, left: '08:00' },
      'waiting 0.00–67.50',
    ],
  ])('%s', (_, times, wanted) => {
    expect(lines({ tickets: [aTicket({ number: '1', ...times })] })).toEqual([
      'mix 1580.00',
      wanted,
    ]);
  });

  test('a missing time that cannot have cost anything leaves nothing to prove', () => {
    const ticket = aTicket({ number: '1', batched: '07:40', arrived: null, finished: '08:00' });
    expect(lines({ tickets: [ticket] })).toEqual(['mix 1580.00']);
  });

  test('says how it came about', () => {
    const ticket = aTicket({ number: '447182', yards: '10.5', finished: '08:12' });
    const bill = expectedBill({
      rateSheets: [aSheet([PRICE, WAITING])],
      orders: [],
      tickets: [ticket],
      pumpTickets: [],
    });
    expect(bill.lines[1]?.explanation.sentence).toBe(
      'Load 447182, truck 214: on site 07:26 to 08:12 = 46 min; free 3 min × 10.50 yd = 31.5; 14.5 charged × $2.25 = $32.63.',
    );
  });
});

test('the balance load is exempt where agreed, a lone short load is not', () => {
  const clause = {
    kind: 'shortLoad',
    thresholdYd3: '6',
    charge: { basis: 'flatPerLoad', dollars: '90' },
    balanceLoadExempt: true,
  };
  const load = (number: string, order: string | null, at: number) =>
    aTicket({ number, order, load: at, yards: '4', finished: '07:30' });
  const rated = (tickets: ReturnType<typeof load>[]) =>
    lines({ rateSheets: [aSheet([PRICE, clause])], tickets }).filter((line) =>
      line.startsWith('short'),
    );
  expect(rated([load('1', 'A', 1), load('2', 'A', 2)])).toEqual(['shortLoad 90.00']);
  expect(rated([load('1', 'A', 1)])).toEqual(['shortLoad 90.00']);
  expect(rated([load('1', null, 1)])).toEqual(['shortLoad 0.00–90.00']);
});

test.each([
  ['hours beyond the minimum, up to the quarter', '12:05', 'pumpTime 971.25'],
  ['the minimum in their place', '08:40', 'pumpTime 740.00'],
  ['exactly the minimum', '11:00', 'pumpTime 740.00'],
])('pump time: %s', (_, left, wanted) => {
  const sheet = aSheet([{ kind: 'pumpTime', dollarsPerHour: '185', minimumHours: '4' }], {
    supplierId: 'pump',
  });
  expect(lines({ rateSheets: [sheet], pumpTickets: [aPumpTicket({ number: '1', left })] })).toEqual(
    [wanted],
  );
});

test('tax skips exempt orders and counts once per invoice', () => {
  const sheet = aSheet([PRICE, { kind: 'tax', ratePercent: '7.25', taxes: ['mixPrice'] }]);
  const tickets = ['1', '2', '3'].map((number) =>
    aTicket({ number, order: number === '3' ? 'school' : null }),
  );
  const orders = [anOrder({ id: 'school', taxable: false })];
  const taxes = (invoiceOf?: ReadonlyMap<string, string>) =>
    lines({ rateSheets: [sheet], tickets, orders, invoiceOf }).filter((one) =>
      one.startsWith('tax'),
    );
  expect(taxes()).toEqual(['tax 229.10']);
  expect(taxes(new Map([['t-1', 'A']]))).toEqual(['tax 114.55', 'tax 114.55']);
});

test('clauses in plain words, and the issues of a sheet', () => {
  const { clauses } = aSheet([PRICE, WAITING, { ...PRICE, mixCode: '4000-a' }, WAITING]);
  expect(clauses.map(({ clause }) => describeClause(clause))[1]).toBe(
    'Waiting: 3 minutes a yard free, then $2.25 a minute, from arrival until the load is finished.',
  );
  const issues = checkClauses(clauses.map(({ clause }) => clause));
  expect(issues.map(({ clauseIndex, field, code }) => [clauseIndex, field, code])).toEqual([
    [2, 'mixCode', 'mixTwice'],
    [3, 'kind', 'clauseTwice'],
  ]);
});
