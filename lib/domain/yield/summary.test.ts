import { expect, test } from 'vitest';
import { aTicket } from '../../../tests/support/facts';
import { money, quantity } from '../money/money';
import { type PlacementFacts, summarizeYield } from './summary';

const placement = (change: Partial<PlacementFacts>): PlacementFacts => ({
  figuredYd3: quantity('28'),
  areaFt2: quantity('2268'),
  orderedYd3: quantity('30'),
  billedYd3: quantity('30'),
  tickets: ['1', '2', '3'].map((number) =>
    aTicket({ number, arrived: '07:00', finished: number === '3' ? null : '07:24' }),
  ),
  charges: [
    { chargeKind: 'mix', amount: money('4740') },
    { chargeKind: 'perLoadFee', amount: money('54') },
    { chargeKind: 'pumpMinimum', amount: money('740') },
  ],
  ...change,
});

test('a placement: overrun, thickness, time of the timed loads, cost by its parts', () => {
  const summary = summarizeYield([placement({})]);
  // (30 − 28) / 28; 30 × 324 / 2268; two timed loads of 24 min and 10 yd each; 5534 / 30
  expect(summary.overrun?.toFixed(4)).toBe('0.0714');
  expect(summary.impliedThicknessIn?.toFixed(4)).toBe('4.2857');
  expect([summary.timedLoads, summary.onSiteMinutes]).toEqual([2, 48]);
  expect([summary.minutesPerLoad?.toFixed(1), summary.minutesPerYd3?.toFixed(1)]).toEqual([
    '24.0',
    '2.4',
  ]);
  expect([summary.cost.toFixed(2), summary.costPerYd3?.toFixed(2)]).toEqual(['5534.00', '184.47']);
  expect(summary.costParts.map(({ part, perYd3 }) => [part, perYd3?.toFixed(2)])).toEqual([
    ['concrete', '158.00'],
    ['fees', '1.80'],
    ['pump', '24.67'],
  ]);
  expect(summary.smallSample).toBe(true);
});

test('several placements: a figure that one of them lacks is not summed without it', () => {
  const summary = summarizeYield([placement({}), placement({ figuredYd3: null })]);
  expect(summary.loads).toBe(6);
  expect(summary.smallSample).toBe(false);
  expect([summary.figuredYd3, summary.overrun]).toEqual([null, null]);
  expect(summary.orderedYd3?.toFixed()).toBe('60');
});

test('nothing delivered yet has no overrun and no cost per yard', () => {
  const summary = summarizeYield([placement({ tickets: [], charges: [], billedYd3: null })]);
  expect([summary.overrun, summary.impliedThicknessIn, summary.costPerYd3]).toEqual([
    null,
    null,
    null,
  ]);
});
