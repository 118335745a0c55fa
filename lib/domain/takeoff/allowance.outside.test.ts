import { expect, test } from 'vitest';
import { quantity } from '../money/money';
import { balanceAllowanceYd3, usualWasteShare } from './allowance';

test.each([
  ['200', '0.1'],
  ['200.01', '0.05'],
])('CV-04 waste for %s yd³ (EN5466A; NAVEDTRA 14071 p. 17-10)', (figured, share) => {
  expect(usualWasteShare(quantity(figured)).toFixed()).toBe(share);
});

test.each([
  ['49', '6'],
  ['50', '12'],
  ['99', '12'],
  ['100', '18'],
  ['150', '24'],
  ['200', '30'],
])('CV-26 balance allowance for %s yd³ ordered (a producer guideline)', (ordered, allowance) => {
  expect(balanceAllowanceYd3(quantity(ordered)).toFixed()).toBe(allowance);
});
