import { describe, expect, test } from 'vitest';
import { aLine, aSheet, aTicket } from '../../../tests/support/facts';
import { type Quantity, quantity } from '../money/money';
import { ft3FromYd3, yd3FromFt3 } from '../units/volume';
import { reconcile } from '../variance/reconcile';
import { batchYieldFt3, impliedThicknessIn, overrunShare, relativeYield } from './measures';

const q = (text: string) => quantity(text);
const near = (value: Quantity, wanted: string, within: string) =>
  expect(value.minus(wanted).abs().lte(within), `${value} is not ${wanted} ± ${within}`).toBe(true);

describe('yield', () => {
  test('CV-23 an eighth of an inch on 4 in: 3.125 %, 1 yd³ in 32 (NRMCA CIP 8)', () => {
    const area = q('2592');
    expect(impliedThicknessIn(q('32'), area).toFixed()).toBe('4');
    expect(impliedThicknessIn(q('33'), area).toFixed()).toBe('4.125');
    expect(overrunShare(q('32'), q('33'), q('0')).toFixed()).toBe('0.03125');
  });
  test('CV-27 3,886 lb at 145.0 lb/ft³ (ASTM C138 field-testing tuition page)', () => {
    const batch = batchYieldFt3(q('3886'), q('145'));
    near(batch, '26.80', '0.001');
    near(yd3FromFt3(batch), '0.993', '0.001');
    const measured = relativeYield(batch, q('1'));
    near(measured.ratio, '0.993', '0.001');
    expect(measured.verdict).toBe('short');
  });
  test('CV-28 8 yd³ billed, 210 ft³ measured (concreteconstruction.net, What yield can do for you)', () => {
    const measured = relativeYield(q('210'), q('8'));
    near(measured.ratio, '0.9722', '0.0005');
    near(measured.ft3PerYd3, '26.25', '0.0005');
    near(measured.shortageYd3, '0.2222', '0.0005');
  });
  test('CV-29 a quarter yard on 9 yd; 31.25 ft³ called 32 (concreteconstruction.net)', () => {
    near(quantity(overrunShare(q('9'), q('9.25'), q('0')).times(100)), '2.8', '0.05');
    near(quantity(overrunShare(q('31.25'), q('32'), q('0')).times(100)), '2.4', '0.05');
  });
  test('CV-30 one percent more air moves a yard by 0.27 ft³ (concreteconstruction.net)', () => {
    near(quantity(ft3FromYd3(q('1')).times('0.01')), '0.27', '0.005');
  });
  test.each([
    ['27', 'exact'],
    ['26.99', 'short'],
    ['27.01', 'over'],
  ])('CV-31 %s ft³ to the yard is %s (concreteconstruction.net)', (measured, verdict) => {
    expect(relativeYield(q(measured), q('1')).verdict).toBe(verdict);
  });
  test('CV-32 ordered 100, delivered 90, billed 100 (OASIS UBL 2.0 example documents)', () => {
    expect(overrunShare(q('100'), q('90'), q('0')).toFixed()).toBe('-0.1');
    const { findings } = reconcile({
      rateSheets: [aSheet([{ kind: 'mixPrice', mixCode: null, dollarsPerYd3: '1.00' }])],
      orders: [],
      tickets: [aTicket({ number: '565899', yards: '90' })],
      pumpTickets: [],
      billLines: [
        aLine({ at: 1, ticket: '565899', quantity: '100', price: '1.00', amount: '100.00' }),
      ],
      earlierLines: [],
      handMatches: [],
      tolerances: {},
      statement: null,
    });
    expect(findings.map(({ kind, difference }) => [kind, difference.toFixed(2)])).toEqual([
      ['yardsDiffer', '10.00'],
    ]);
  });
});
