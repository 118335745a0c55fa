import fc from 'fast-check';
import { type BillLineFacts, CHARGE_KINDS } from '../../lib/domain/facts';
import { clockText } from '../../lib/domain/time/clock-minutes';
import { aLine, anOrder, aPumpTicket, aSheet, aTicket } from '../support/facts';

/** Small months in which everything that can go wrong does: few numbers, so that they collide. */

const MIXES = ['4000A', '4500', 'FLOWFILL'] as const;
const date = fc.constantFrom('2026-09-03', '2026-09-04', '2026-09-08');
const yards = fc.constantFrom('10', '10.5', '9', '4.5', '4');
const number = fc.constantFrom('447180', '447181', '447182', '447183', '447190', '447191');
const maybe = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: null });
const cents = fc.integer({ min: 0, max: 300_000 }).map((amount) => (amount / 100).toFixed(2));

const clock = fc.integer({ min: 300, max: 1439 });
const ticket = fc
  .record({
    number,
    yards,
    date,
    mix: fc.constantFrom(...MIXES),
    truck: maybe(fc.constantFrom('214', '208')),
    order: maybe(fc.constantFrom('A', 'B')),
    arrived: maybe(clock),
    stay: fc.integer({ min: 0, max: 120 }),
    finish: fc.boolean(),
  })
  .map(({ arrived, stay, finish, ...sketch }) =>
    aTicket({
      ...sketch,
      arrived: arrived === null ? null : clockText(arrived),
      finished: finish ? clockText((arrived ?? 600) + stay) : null,
    }),
  );

const pumpTicket = fc
  .record({
    number: fc.constantFrom('3301', '3302'),
    date,
    yards,
    stay: fc.integer({ min: 30, max: 500 }),
  })
  .map(({ stay, ...sketch }) => aPumpTicket({ ...sketch, left: clockText(420 + stay) }));

const line = fc.record({
  kind: fc.constantFrom(...CHARGE_KINDS),
  ticket: maybe(fc.oneof(number, fc.constantFrom('0447181', 'T-447182', '44718Z', '3301', '999'))),
  date: maybe(date),
  truck: maybe(fc.constantFrom('214', '208', '300')),
  invoice: maybe(fc.constantFrom('I1', 'I2')),
  quantity: maybe(fc.oneof(yards, fc.constantFrom('1', '14.5', '20', '24'))),
  unit: maybe(fc.constantFrom('YD', 'MIN', 'HR', 'EA')),
  price: maybe(fc.constantFrom('158', '165', '2.25', '18', '2.5', '185')),
  mix: maybe(fc.constantFrom(...MIXES)),
  says: fc.constantFrom('', 'ENV SRCHG', 'Fuel surcharge', 'Winter service'),
  amount: cents,
});

export const SHEETS = [
  aSheet([
    { kind: 'mixPrice', mixCode: '4000A', dollarsPerYd3: '158' },
    { kind: 'mixPrice', mixCode: '4500', dollarsPerYd3: '165.1234' },
    {
      kind: 'shortLoad',
      thresholdYd3: '6',
      charge: { basis: 'perShortYd3', dollarsPerYd3: '40' },
      balanceLoadExempt: true,
    },
    {
      kind: 'waiting',
      free: { basis: 'perYd3', minutesPerYd3: '3' },
      dollarsPerMinute: '2.2567',
    },
    { kind: 'perLoadFee', name: 'Environmental fee', dollars: '18' },
    { kind: 'perYardFee', name: 'Fuel surcharge', dollarsPerYd3: '2.5' },
    { kind: 'tax', ratePercent: '7.25', taxes: ['mixPrice', 'shortLoad'] },
  ]),
  aSheet(
    [
      { kind: 'pumpTime', dollarsPerHour: '185', minimumHours: '4' },
      { kind: 'pumpYards', dollarsPerYd3: '3.5', beyondYd3: '5' },
      { kind: 'pumpSetUp', dollarsEach: '150' },
    ],
    { id: 'pump-sheet', supplierId: 'pump' },
  ),
];

const PUMP_KINDS = ['pumpTime', 'pumpMinimum', 'pumpYards', 'pumpSetUp'];

export const scenario = fc
  .record({
    tickets: fc.uniqueArray(ticket, { maxLength: 6, selector: (one) => one.number }),
    pumpTickets: fc.uniqueArray(pumpTicket, { maxLength: 2, selector: (one) => one.number }),
    sketches: fc.array(line, { maxLength: 12 }),
    exempt: fc.boolean(),
  })
  .map(({ sketches, exempt, ...deliveries }) => ({
    ...deliveries,
    orders: [anOrder({ id: 'A', taxable: !exempt }), anOrder({ id: 'B' })],
    billLines: sketches.map((sketch, at): BillLineFacts => {
      const supplier = PUMP_KINDS.includes(sketch.kind) ? 'pump' : 'ready';
      return aLine({ ...sketch, supplier, at: at + 1 });
    }),
  }));

/** The same things in another order, decided by the numbers drawn. */
export function shuffled<T>(things: readonly T[], draws: readonly number[]): T[] {
  return things
    .map((thing, at) => ({ thing, rank: draws[at % Math.max(1, draws.length)] ?? 0, at }))
    .sort((one, other) => one.rank - other.rank || other.at - one.at)
    .map(({ thing }) => thing);
}

export const draws = fc.array(fc.integer({ min: 0, max: 1000 }), { minLength: 1, maxLength: 12 });
