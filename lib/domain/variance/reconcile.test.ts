import { describe, expect, test } from 'vitest';
import {
  aLine,
  anOrder,
  aPumpTicket,
  aSheet,
  aTicket,
  type LineSketch,
  type PumpSketch,
  type TicketSketch,
} from '../../../tests/support/facts';
import { money, moneyText, sumMoney } from '../money/money';
import type { EarlierLine } from './line-case';
import { type ReconcileInput, reconcile } from './reconcile';

const READY = aSheet([
  { kind: 'mixPrice', mixCode: '4000A', dollarsPerYd3: '158' },
  { kind: 'mixPrice', mixCode: '4500', dollarsPerYd3: '165' },
  {
    kind: 'shortLoad',
    thresholdYd3: '6',
    charge: { basis: 'perShortYd3', dollarsPerYd3: '40' },
    balanceLoadExempt: false,
  },
  {
    kind: 'waiting',
    free: { basis: 'perYd3', minutesPerYd3: '3' },
    dollarsPerMinute: '2.25',
    until: 'finished',
  },
  { kind: 'perLoadFee', name: 'Environmental fee', dollars: '18' },
  { kind: 'perYardFee', name: 'Fuel surcharge', dollarsPerYd3: '2.5' },
  { kind: 'tax', ratePercent: '7.25', taxes: ['mixPrice', 'shortLoad', 'perYardFee'] },
]);
const PUMP = aSheet(
  [
    { kind: 'pumpTime', dollarsPerHour: '185', minimumHours: '4' },
    { kind: 'pumpYards', dollarsPerYd3: '3.5' },
    { kind: 'pumpSetUp', dollarsEach: '150' },
  ],
  { id: 'pump-sheet', supplierId: 'pump', name: 'Pump rates' },
);

interface Case {
  readonly tickets?: readonly TicketSketch[];
  readonly pumps?: readonly PumpSketch[];
  readonly lines: readonly LineSketch[];
  readonly more?: Partial<ReconcileInput>;
}

function run({ tickets = [], pumps = [], lines, more = {} }: Case) {
  return reconcile({
    rateSheets: [READY, PUMP],
    orders: [],
    tickets: tickets.map(aTicket),
    pumpTickets: pumps.map(aPumpTicket),
    billLines: lines.map(aLine),
    earlierLines: [],
    handMatches: [],
    tolerances: {},
    statement: null,
    ...more,
  });
}

/** "kind@line difference" of every finding, and the property that must hold of every result. */
function found(it: Case): string[] {
  const result = run(it);
  for (const line of result.lines) {
    if (line.findings.length === 0) continue;
    const sum = sumMoney(line.findings.map((one) => one.difference));
    expect(moneyText(sum)).toBe(moneyText(line.difference));
  }
  const { billed, expected, difference } = result.totals;
  expect(moneyText(billed.minus(expected))).toBe(moneyText(difference));
  for (const finding of result.findings) {
    expect(moneyText(finding.billed.minus(finding.expected))).toBe(moneyText(finding.difference));
    expect(finding.sentence).toMatch(/^[A-Z0-9].*[.]$/);
  }
  return result.findings.map(
    ({ kind, billLineId, difference: apart }) => `${kind}@${billLineId} ${moneyText(apart)}`,
  );
}

const MIX: LineSketch = {
  at: 1,
  ticket: '447182',
  quantity: '10',
  price: '158',
  amount: '1580',
  mix: '4000A',
};
const LOAD: TicketSketch = { number: '447182' };
const mix = (change: Partial<LineSketch>): LineSketch => ({ ...MIX, ...change });

describe('concrete', () => {
  test.each<[string, Case, string[]]>([
    ['agrees', { tickets: [LOAD], lines: [MIX] }, []],
    [
      'too many yards',
      { tickets: [LOAD], lines: [mix({ quantity: '10.5', amount: '1659' })] },
      ['yardsDiffer@l-1 79.00'],
    ],
    [
      'too few yards, shown too',
      { tickets: [LOAD], lines: [mix({ quantity: '9.5', amount: '1501' })] },
      ['yardsDiffer@l-1 -79.00'],
    ],
    [
      'price differs',
      { tickets: [LOAD], lines: [mix({ price: '161', amount: '1610' })] },
      ['priceDiffers@l-1 30.00'],
    ],
    [
      'yards and price: each its own dollars, none twice',
      { tickets: [LOAD], lines: [mix({ quantity: '10.5', price: '161', amount: '1690.5' })] },
      ['yardsDiffer@l-1 79.00', 'priceDiffers@l-1 31.50'],
    ],
    [
      'mix differs at its own price',
      { tickets: [LOAD], lines: [mix({ mix: '4500', price: '165', amount: '1650' })] },
      ['mixDiffers@l-1 70.00'],
    ],
    [
      'mix differs and its price too',
      { tickets: [LOAD], lines: [mix({ mix: '4500', price: '166', amount: '1660' })] },
      ['mixDiffers@l-1 70.00', 'priceDiffers@l-1 10.00'],
    ],
    [
      'the wrong mix for the same money',
      { tickets: [LOAD], lines: [mix({ mix: '4500' })] },
      ['mixDiffers@l-1 0.00'],
    ],
    [
      'a mix code written differently is the same mix',
      { tickets: [LOAD], lines: [mix({ mix: '4000-a' })] },
      [],
    ],
    [
      'arithmetic wrong',
      { tickets: [LOAD], lines: [mix({ amount: '1590' })] },
      ['arithmeticWrong@l-1 10.00'],
    ],
    ['two cents are rounding', { tickets: [LOAD], lines: [mix({ amount: '1580.02' })] }, []],
    [
      'three cents are not',
      { tickets: [LOAD], lines: [mix({ amount: '1580.03' })] },
      ['arithmeticWrong@l-1 0.03'],
    ],
    ['not delivered', { lines: [MIX] }, ['billedNotDelivered@l-1 1580.00']],
    [
      'billed twice, the better fit is the charge',
      { tickets: [LOAD], lines: [mix({ quantity: '10.5', amount: '1659' }), mix({ at: 2 })] },
      ['billedTwice@l-1 1659.00'],
    ],
    [
      'without a number, found by fit',
      { tickets: [LOAD], lines: [mix({ ticket: null, truck: '214' })] },
      [],
    ],
    [
      'one line for a whole day',
      {
        tickets: [LOAD, { number: '447183', yards: '9.5' }, { number: '447184', yards: '4' }],
        lines: [mix({ ticket: null, quantity: '23.5', amount: '3713' })],
      },
      [],
    ],
    [
      'delivered, not billed',
      { tickets: [LOAD, { number: '447183' }], lines: [MIX] },
      // 10 yd × 158 + 18 environmental + 10 × 2.5 fuel
      ['deliveredNotBilled@null -1623.00'],
    ],
  ])('%s', (_, it, expected) => {
    expect(found(it)).toEqual(expected);
  });

  test('a load of an earlier bill is billed twice; the left-out one of another period is not', () => {
    const earlier: EarlierLine = {
      ...aLine(mix({ at: 9 })),
      ticketIds: ['t-447182'],
      pumpTicketIds: [],
    };
    const it: Case = {
      tickets: [LOAD, { number: '440001', date: '2026-08-12' }],
      lines: [MIX],
      more: {
        earlierLines: [{ ...earlier, id: 'old', invoiceNumber: '20100' }],
        statement: { periodStart: '2026-09-01', periodEnd: '2026-09-30' },
      },
    };
    expect(found(it)).toEqual(['billedTwice@l-1 1580.00']);
    expect(run(it).findings[0]?.sentence).toContain('earlier invoice 20100');
  });

  test('without a rate sheet yards are still held against the ticket, at the billed price', () => {
    const more = { rateSheets: [] };
    expect(found({ tickets: [LOAD], lines: [MIX], more })).toEqual([]);
    expect(run({ tickets: [LOAD], lines: [MIX], more }).lines[0]?.expectedAmount).toBeNull();
    const wrong = mix({ quantity: '11', amount: '1738' });
    expect(found({ tickets: [LOAD], lines: [wrong], more })).toEqual(['yardsDiffer@l-1 158.00']);
    expect(found({ tickets: [LOAD], lines: [MIX, mix({ at: 2 })], more })).toEqual([
      'billedTwice@l-2 1580.00',
    ]);
  });
});

const short = (change: Partial<LineSketch>): LineSketch => ({
  at: 2,
  kind: 'shortLoad',
  ticket: '447182',
  amount: '80',
  ...change,
});
const waiting = (change: Partial<LineSketch>): LineSketch => ({
  at: 2,
  kind: 'waiting',
  ticket: '447182',
  amount: '36',
  ...change,
});
const fee = (change: Partial<LineSketch>): LineSketch => ({
  at: 2,
  kind: 'perLoadFee',
  ticket: '447182',
  quantity: '1',
  amount: '18',
  says: 'ENV SRCHG',
  ...change,
});
const FOUR_YARDS = mix({ quantity: '4', amount: '632' });
const LATE: TicketSketch = { ...LOAD, finished: '08:12' };

describe('charges on a load', () => {
  test.each<[string, Case, string[]]>([
    [
      'short load as agreed: 2 yd short × 40',
      { tickets: [{ ...LOAD, yards: '4' }], lines: [FOUR_YARDS, short({})] },
      [],
    ],
    [
      'short load not owed',
      { tickets: [LOAD], lines: [MIX, short({})] },
      ['shortLoadNotOwed@l-2 80.00'],
    ],
    [
      'short load at the threshold is not owed',
      {
        tickets: [{ ...LOAD, yards: '6' }],
        lines: [mix({ quantity: '6', amount: '948' }), short({})],
      },
      ['shortLoadNotOwed@l-2 80.00'],
    ],
    [
      'short load of the wrong amount',
      { tickets: [{ ...LOAD, yards: '4' }], lines: [FOUR_YARDS, short({ amount: '120' })] },
      ['shortLoadWrongAmount@l-2 40.00'],
    ],
    [
      'waiting as agreed: 46 − 30 = 16 × 2.25',
      { tickets: [LATE], lines: [MIX, waiting({ quantity: '16', unit: 'min', price: '2.25' })] },
      [],
    ],
    [
      'waiting as agreed, in hours',
      {
        tickets: [{ ...LATE, finished: '08:11' }],
        lines: [MIX, waiting({ quantity: '0.25', unit: 'HR', price: '135', amount: '33.75' })],
      },
      [],
    ],
    [
      'waiting not owed',
      { tickets: [LOAD], lines: [MIX, waiting({})] },
      ['waitingNotOwed@l-2 36.00'],
    ],
    [
      'waiting minutes wrong',
      {
        tickets: [LATE],
        lines: [MIX, waiting({ quantity: '26', unit: 'min', price: '2.25', amount: '58.5' })],
      },
      ['waitingWrongMinutes@l-2 22.50'],
    ],
    [
      'waiting minutes wrong, as a lump sum',
      { tickets: [LATE], lines: [MIX, waiting({ amount: '58.5' })] },
      ['waitingWrongMinutes@l-2 22.50'],
    ],
    [
      'waiting rate wrong',
      {
        tickets: [LATE],
        lines: [MIX, waiting({ quantity: '16', unit: 'min', price: '2.5', amount: '40' })],
      },
      ['waitingWrongAmount@l-2 4.00'],
    ],
    [
      'waiting not provable without an arrival',
      { tickets: [{ ...LATE, arrived: null }], lines: [MIX, waiting({})] },
      ['waitingNotProvable@l-2 36.00'],
    ],
    ['fee as agreed, by its short name', { tickets: [LOAD], lines: [MIX, fee({})] }, []],
    [
      'fee of the wrong amount',
      { tickets: [LOAD], lines: [MIX, fee({ amount: '22' })] },
      ['feeWrongAmount@l-2 4.00'],
    ],
    [
      'fee not agreed',
      { tickets: [LOAD], lines: [MIX, fee({ says: 'Winter service', amount: '45' })] },
      ['feeNotAgreed@l-2 45.00'],
    ],
    [
      'fee billed twice',
      { tickets: [LOAD], lines: [MIX, fee({}), fee({ at: 3 })] },
      ['billedTwice@l-3 18.00'],
    ],
    [
      'yards wrong on the mix and on the fee per yard: a finding each',
      {
        tickets: [LOAD],
        lines: [
          mix({ quantity: '10.5', amount: '1659' }),
          fee({
            kind: 'perYardFee',
            says: 'Fuel surcharge',
            quantity: '10.5',
            price: '2.5',
            amount: '26.25',
          }),
        ],
      },
      ['yardsDiffer@l-1 79.00', 'feeWrongAmount@l-2 1.25'],
    ],
    [
      'fees without a number follow the load above them',
      {
        tickets: [LOAD, { number: '447183' }],
        lines: [
          MIX,
          fee({ ticket: null }),
          mix({ at: 3, ticket: '447183' }),
          fee({ at: 4, ticket: null }),
        ],
      },
      [],
    ],
    [
      'fees for the whole day at the end of the bill',
      {
        tickets: [LOAD, { number: '447183' }],
        lines: [
          MIX,
          mix({ at: 2, ticket: '447183' }),
          fee({ at: 3, ticket: null, quantity: '2', amount: '36' }),
        ],
      },
      [],
    ],
    [
      'one fee line per load at the end of the bill, and one too many',
      {
        tickets: [LOAD, { number: '447183' }],
        lines: [
          MIX,
          mix({ at: 2, ticket: '447183' }),
          fee({ at: 3, ticket: null }),
          fee({ at: 4, ticket: null }),
          fee({ at: 5, ticket: null }),
        ],
      },
      ['billedTwice@l-5 18.00'],
    ],
  ])('%s', (_, it, expected) => {
    expect(found(it)).toEqual(expected);
  });
});

const time = (change: Partial<LineSketch>): LineSketch => ({
  at: 1,
  kind: 'pumpTime',
  supplier: 'pump',
  ticket: '3301',
  quantity: '5',
  unit: 'hr',
  price: '185',
  amount: '925',
  ...change,
});
const minimum = (change: Partial<LineSketch>): LineSketch =>
  time({ at: 2, kind: 'pumpMinimum', quantity: '4', amount: '740', ...change });
const FIVE_HOURS: PumpSketch = { number: '3301' };
const TWO_HOURS: PumpSketch = { number: '3301', left: '09:00' };

describe('pumps', () => {
  test.each<[string, Case, string[]]>([
    ['hours agree', { pumps: [FIVE_HOURS], lines: [time({})] }, []],
    [
      'hours differ',
      { pumps: [FIVE_HOURS], lines: [time({ quantity: '6', amount: '1110' })] },
      ['pumpHoursDiffer@l-1 185.00'],
    ],
    [
      'a minimum on top of hours that exceed it',
      { pumps: [FIVE_HOURS], lines: [time({}), minimum({})] },
      ['pumpMinimumWrong@l-2 740.00'],
    ],
    ['the minimum in place of the hours', { pumps: [TWO_HOURS], lines: [minimum({})] }, []],
    [
      'the minimum billed as hours',
      { pumps: [TWO_HOURS], lines: [time({ quantity: '4', amount: '740' })] },
      [],
    ],
    [
      'hours and a top-up to the minimum',
      {
        pumps: [TWO_HOURS],
        lines: [time({ quantity: '2', amount: '370' }), minimum({ quantity: '2', amount: '370' })],
      },
      [],
    ],
    [
      'hours and the whole minimum',
      { pumps: [TWO_HOURS], lines: [time({ quantity: '2', amount: '370' }), minimum({})] },
      ['pumpMinimumWrong@l-1 370.00'],
    ],
    [
      'the minimum twice the same day',
      { pumps: [TWO_HOURS], lines: [minimum({}), minimum({ at: 3 })] },
      ['pumpMinimumWrong@l-3 740.00'],
    ],
    [
      'a larger minimum than agreed',
      { pumps: [TWO_HOURS], lines: [minimum({ quantity: '5', amount: '925' })] },
      ['pumpMinimumWrong@l-2 185.00'],
    ],
    [
      'yards pumped differ',
      {
        pumps: [FIVE_HOURS],
        lines: [
          time({}),
          time({
            at: 2,
            kind: 'pumpYards',
            quantity: '63',
            unit: 'yd',
            price: '3.5',
            amount: '220.5',
          }),
        ],
      },
      ['pumpYardsDiffer@l-2 10.50'],
    ],
    [
      'set-up as agreed and twice',
      {
        pumps: [FIVE_HOURS],
        lines: [
          time({}),
          time({
            at: 2,
            kind: 'pumpSetUp',
            quantity: '1',
            unit: null,
            price: '150',
            amount: '150',
          }),
          time({
            at: 3,
            kind: 'pumpSetUp',
            quantity: '1',
            unit: null,
            price: '150',
            amount: '150',
          }),
        ],
      },
      ['billedTwice@l-3 150.00'],
    ],
    [
      'price per hour differs',
      { pumps: [FIVE_HOURS], lines: [time({ price: '195', amount: '975' })] },
      ['priceDiffers@l-1 50.00'],
    ],
    ['without a number', { pumps: [FIVE_HOURS], lines: [time({ ticket: null })] }, []],
  ])('%s', (_, it, expected) => {
    expect(found(it)).toEqual(expected);
  });
});

const tax = (change: Partial<LineSketch>): LineSketch => ({
  at: 9,
  kind: 'tax',
  amount: '114.55',
  ...change,
});

describe('tax and sums', () => {
  test.each<[string, Case, string[]]>([
    ['agrees: 1580 × 7.25%', { tickets: [LOAD], lines: [MIX, tax({})] }, []],
    [
      'another rate',
      { tickets: [LOAD], lines: [MIX, tax({ amount: '122.45' })] },
      ['taxWrong@l-9 7.90'],
    ],
    [
      'on a fee that is not taxable',
      { tickets: [LOAD], lines: [MIX, fee({}), tax({ amount: '115.86' })] },
      ['taxWrong@l-9 1.31'],
    ],
    [
      'wrong yards do not come back on the tax line',
      {
        tickets: [LOAD],
        lines: [mix({ quantity: '10.5', amount: '1659' }), tax({ amount: '120.28' })],
      },
      ['yardsDiffer@l-1 79.00'],
    ],
    [
      'on an exempt order',
      {
        tickets: [{ ...LOAD, order: 'school' }],
        lines: [MIX, tax({})],
        more: { orders: [anOrder({ id: 'school', taxable: false })] },
      },
      ['taxWrong@l-9 114.55'],
    ],
    [
      'per invoice, and one invoice without',
      {
        tickets: [LOAD, { number: '447183' }],
        lines: [
          mix({ invoice: 'A' }),
          tax({ invoice: 'A' }),
          mix({ at: 20, invoice: 'B', ticket: '447183' }),
        ],
      },
      ['taxWrong@null -114.55'],
    ],
    [
      'in two lines, state and county',
      {
        tickets: [LOAD],
        lines: [MIX, tax({ amount: '98.75' }), tax({ at: 10, amount: '15.80' })],
      },
      [],
    ],
    [
      'a wrong subtotal that runs on into the total is one finding',
      {
        tickets: [LOAD],
        lines: [MIX],
        more: {
          statement: {
            periodStart: '2026-09-01',
            periodEnd: '2026-09-30',
            subtotal: money('1600'),
            total: money('1600'),
          },
        },
      },
      ['arithmeticWrong@null 20.00'],
    ],
  ])('%s', (_, it, expected) => {
    expect(found(it)).toEqual(expected);
  });

  test('tolerances: the larger bound counts and is inclusive', () => {
    const tolerances = { yardsDiffer: { absolute: money('79'), percent: '1' } };
    const at = (quantity: string, amount: string) =>
      run({ tickets: [LOAD], lines: [mix({ quantity, amount })], more: { tolerances } }).findings[0]
        ?.withinTolerance;
    expect(at('10.5', '1659')).toBe(true);
    expect(at('10.51', '1660.58')).toBe(false);
  });
});
