import { describe, expect, test } from 'vitest';
import { type Quantity, quantity, sumQuantity } from '../money/money';
import { box, cylinder, frustum, trapezoidRun } from '../takeoff/shapes';
import { coverageFt2PerYd3 } from '../yield/measures';
import {
  feet,
  ft3FromYd3,
  m3FromFt3,
  m3FromYd3,
  roundUpTo,
  yardsToOrder,
  yd3FromFt3,
  yd3FromM3,
} from './volume';

/** Outside check values: each with the published source that it was read in. */

const q = (text: string) => quantity(text);
const near = (value: Quantity, wanted: string, within: string) =>
  expect(value.minus(wanted).abs().lte(within), `${value} is not ${wanted} ± ${within}`).toBe(true);
const inches = (text: string) => feet(q('0'), q(text));
const slabYd3 = (length: string, width: string, thicknessIn: string) =>
  yd3FromFt3(box(q(length), q(width), inches(thicknessIn)));

describe('walls, footings and buildings', () => {
  const footing = box(q('8.5'), q('75'), q('1.25'));
  const wall = (top: Quantity) =>
    trapezoidRun({ top, bottom: q('1'), height: q('14.75') }, q('75'));

  test('CV-01 retaining wall, 8 in taken as 0.67 ft (EN5466A, US Army Engineer School 1992, p. 2-45)', () => {
    const total = sumQuantity([wall(q('0.67')), footing]);
    near(total, '1720.6', '0.05');
    near(yd3FromFt3(total), '63.7', '0.05');
  });
  test('CV-02 the same wall with exactly 8 in', () => {
    const total = sumQuantity([wall(inches('8')), footing]);
    near(total, '1718.75', '0.01');
    near(yd3FromFt3(total), '63.657', '0.01');
  });
  test('CV-03 63.7 yd³ with 10 % waste (EN5466A; NAVEDTRA 14071 p. 17-10)', () => {
    near(yardsToOrder(q('63.7'), q('0.10'), q('0.01')), '70.07', '0.05');
  });
  test.each([
    ['CV-05 sacks of cement, 7.05 per yd³', '7.05', '494.2', '0.1'],
    ['CV-06 coarse aggregate, 1,768 lb per yd³', '1768', '123937', '1'],
    ['CV-06 fine aggregate, 1,083 lb per yd³', '1083', '75918', '1'],
  ])('%s × 70.1 yd³ (EN5466A p. 2-45)', (_, each, wanted, within) => {
    near(quantity(q(each).times('70.1')), wanted, within);
  });
  test('CV-05 494.2 sacks are ordered as 495', () => {
    expect(roundUpTo(q('494.205'), q('1')).toFixed()).toBe('495');
  });
  test('CV-07 fine aggregate, 1,153 lb × 70.07 yd³ (NAVEDTRA 14071 p. 17-10)', () => {
    near(quantity(q('1153').times('70.07')), '80790.7', '0.1');
  });
  const building = (thickness: Quantity, long: Quantity, short: Quantity, slab: Quantity) =>
    sumQuantity([
      quantity(box(q('32'), thickness, q('2')).times(2)),
      quantity(box(short, thickness, q('2')).times(2)),
      quantity(box(long, q('2'), q('1')).times(2)),
      quantity(box(quantity(short.minus(thickness.times(2))), q('2'), q('1')).times(2)),
      box(short, quantity(q('32').minus(thickness.times(2))), slab),
    ]);
  test('CV-08 20 × 32 ft building in the book decimals (NAVEDTRA 14070 p. 5-103)', () => {
    const total = sumQuantity([
      quantity(box(q('32'), q('0.67'), q('2')).times(2)),
      quantity(box(q('18.67'), q('0.67'), q('2')).times(2)),
      quantity(box(q('33.33'), q('2'), q('1')).times(2)),
      quantity(box(q('17.33'), q('2'), q('1')).times(2)),
      box(q('18.67'), q('30.67'), q('0.33')),
    ]);
    near(total, '527.40', '0.05');
    near(quantity(total.times('1.10')), '580.14', '0.05');
  });
  test('CV-09 the same with exact fractions, ordered up to the quarter yard', () => {
    const eight = inches('8');
    const long = feet(q('33'), q('4'));
    const short = feet(q('18'), q('8'));
    const total = building(eight, long, short, inches('4'));
    near(total, '528.59', '0.01');
    near(quantity(yd3FromFt3(total).times('1.10')), '21.535', '0.01');
    expect(yardsToOrder(yd3FromFt3(total), q('0.10'), q('0.25')).toFixed(2)).toBe('21.75');
  });
});

describe('coverage, 324 / t (engineeringtoolbox.com d_1702)', () => {
  test.each([
    ['2', '162'],
    ['3', '108'],
    ['4', '81'],
    ['6', '54'],
    ['8', '40.5'],
    ['9', '36'],
    ['10', '32.4'],
    ['12', '27'],
  ])('CV-10 %s in covers %s ft² per yd³', (thickness, wanted) => {
    expect(coverageFt2PerYd3(q(thickness)).toFixed()).toBe(wanted);
  });
  test.each([
    ['5', '65', '0.5'],
    ['7', '46.3', '0.05'],
    ['11', '29.5', '0.1'],
  ])('CV-11 %s in covers about %s ft² per yd³', (thickness, wanted, within) => {
    near(coverageFt2PerYd3(q(thickness)), wanted, within);
  });
});

describe('slabs, walls and shapes', () => {
  test('CV-12, CV-13 16 × 20 ft at 4 in (marshallconcreteproducts.com, node 42)', () => {
    near(box(q('16'), q('20'), inches('4')), '106.667', '0.005');
    const figured = slabYd3('16', '20', '4');
    near(figured, '3.95', '0.005');
    expect(yardsToOrder(figured, q('0'), q('0.25')).toFixed(2)).toBe('4.00');
    expect(yardsToOrder(figured, q('0.05'), q('0.25')).toFixed(2)).toBe('4.25');
    expect(yardsToOrder(figured, q('0.10'), q('0.25')).toFixed(2)).toBe('4.50');
  });
  test('CV-14 mat 120 × 80 × 2 ft with 8 % waste (Florida contractor examination page)', () => {
    const figured = slabYd3('120', '80', '24');
    near(figured, '711.11', '0.01');
    near(quantity(figured.times('1.08')), '768.00', '0.01');
  });
  test('CV-15 10 × 10 ft at 4 and 6 in (several producers)', () => {
    near(slabYd3('10', '10', '4'), '1.23', '0.005');
    near(slabYd3('10', '10', '6'), '1.85', '0.005');
  });
  test('CV-16 20 × 20 ft at 4 in, 10 %, to the half yard (producer page)', () => {
    const figured = slabYd3('20', '20', '4');
    near(figured, '4.94', '0.005');
    near(quantity(figured.times('1.10')), '5.43', '0.005');
    expect(yardsToOrder(figured, q('0.10'), q('0.5')).toFixed(1)).toBe('5.5');
  });
  test('CV-17 round pier 1 ft × 3 ft (colecountyconcrete.com, id19)', () => {
    const pier = yd3FromFt3(cylinder(q('1'), q('3')));
    near(pier, '0.087', '0.005');
    near(quantity(pier.times(10)), '0.87', '0.005');
  });
  test('CV-18 wall 10 in × 7 × 48 ft, topping 1 in × 24 × 40 ft (Griffith, Carpentry, 1916)', () => {
    const wall = box(q('48'), q('7'), inches('10'));
    near(wall, '280', '0.001');
    near(yd3FromFt3(wall), '10.370', '0.001');
    const topping = box(q('40'), q('24'), inches('1'));
    near(topping, '80', '0.001');
    near(yd3FromFt3(topping), '2.963', '0.001');
  });
  test('CV-19 curb 3 × 4 in and gutter 13 × 3 in, 10 ft; four of them', () => {
    const each = sumQuantity([
      box(q('10'), inches('3'), inches('4')),
      box(q('10'), inches('13'), inches('3')),
    ]);
    near(each, '3.54', '0.005');
    near(quantity(each.times(4)), '14.167', '0.005');
    near(yd3FromFt3(quantity(each.times(4))), '0.5247', '0.005');
  });
  test.each([
    ['1.20', '1.20', '0.30', '0.432'],
    ['0.30', '0.30', '3.6', '0.324'],
    ['0.30', '0.30', '3.9', '0.351'],
    ['0.30', '0.30', '2.7', '0.243'],
    ['3', '2', '0.15', '0.9'],
  ])('CV-20, CV-22 %s × %s × %s m (quantity sheets)', (length, width, height, wanted) => {
    near(box(q(length), q(width), q(height)), wanted, '0.0005');
  });
  test('CV-21 frustum, h 0.35, areas 1.2 and 0.209 m²', () => {
    near(frustum(q('1.2'), q('0.209'), q('0.35')), '0.2228', '0.0005');
  });
  test('CV-22 10 × 8 × 0.5 ft', () => {
    near(slabYd3('10', '8', '6'), '1.48', '0.005');
  });
});

describe('units', () => {
  test('CV-24 1 yd³ in m³ (NIST SP 811 B.8), and exactly', () => {
    near(m3FromYd3(q('1')), '0.7645549', '1e-7');
    expect(m3FromYd3(q('1')).toFixed()).toBe('0.764554857984');
    expect(m3FromFt3(q('1')).toFixed()).toBe('0.028316846592');
  });
  test('CV-25 10 yd³ and 1 m³', () => {
    near(m3FromYd3(q('10')), '7.6455', '5e-5');
    near(yd3FromM3(q('1')), '1.3080', '5e-5');
  });
  test('there and back again', () => {
    expect(yd3FromFt3(ft3FromYd3(q('10.5'))).toFixed()).toBe('10.5');
    near(yd3FromM3(m3FromYd3(q('10.5'))), '10.5', '1e-30');
  });
});
