import { type Quantity, quantity } from '../money/money';

/** Up to and including this many yards the larger share of waste is added. */
const LARGE_PLACEMENT_YD3 = '200';

/**
 * The share to add for waste where nothing better is known: 10% up to 200 yd³, 5% beyond
 * (EN5466A, US Army Engineer School, p. 2-45; NAVEDTRA 14071 p. 17-10).
 */
export function usualWasteShare(figuredYd3: Quantity): Quantity {
  return quantity(figuredYd3.lte(LARGE_PLACEMENT_YD3) ? '0.10' : '0.05');
}

const BALANCE_STEPS: readonly { readonly underYd3: string; readonly allowanceYd3: string }[] = [
  { underYd3: '50', allowanceYd3: '6' },
  { underYd3: '100', allowanceYd3: '12' },
  { underYd3: '150', allowanceYd3: '18' },
  { underYd3: '200', allowanceYd3: '24' },
];

/**
 * How many yards an order may drift before suppliers want it booked anew: in steps up to 200 yd³,
 * 15% from there. A usual rule, not every supplier's.
 */
export function balanceAllowanceYd3(orderedYd3: Quantity): Quantity {
  const step = BALANCE_STEPS.find(({ underYd3 }) => orderedYd3.lt(underYd3));
  return quantity(step ? step.allowanceYd3 : orderedYd3.times('0.15'));
}
