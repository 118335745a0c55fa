import Decimal from 'decimal.js';
import { type Quantity, quantity } from '../money/money';

/** Exact by definition: 1 yd = 0.9144 m, 1 ft = 0.3048 m, 1 in = 25.4 mm. */
export const FT3_PER_YD3 = new Decimal(27);
const M3_PER_YD3 = new Decimal('0.9144').pow(3);
const M3_PER_FT3 = new Decimal('0.3048').pow(3);
const IN_PER_FT = new Decimal(12);

const scaled = (value: Quantity, factor: Decimal) => quantity(value.times(factor));
const divided = (value: Quantity, factor: Decimal) => quantity(value.dividedBy(factor));

export const yd3FromFt3 = (ft3: Quantity) => divided(ft3, FT3_PER_YD3);
export const ft3FromYd3 = (yd3: Quantity) => scaled(yd3, FT3_PER_YD3);
export const m3FromYd3 = (yd3: Quantity) => scaled(yd3, M3_PER_YD3);
export const yd3FromM3 = (m3: Quantity) => divided(m3, M3_PER_YD3);
export const m3FromFt3 = (ft3: Quantity) => scaled(ft3, M3_PER_FT3);

/** A length in feet from feet and inches; either may have decimals. */
export function feet(wholeFt: Quantity, inches: Quantity): Quantity {
  return quantity(wholeFt.plus(inches.dividedBy(IN_PER_FT)));
}

/** The next multiple of `increment` (0.25 or 0.5 yd), as suppliers sell: never down. */
export function roundUpTo(value: Quantity, increment: Quantity): Quantity {
  if (increment.lte(0)) throw new Error(`an increment is positive, got ${increment}`);
  return quantity(
    value.dividedBy(increment).toDecimalPlaces(0, Decimal.ROUND_CEIL).times(increment),
  );
}

/** figured × (1 + waste), up to the supplier's increment. Waste as a share: "0.08" is 8%. */
export function yardsToOrder(figuredYd3: Quantity, waste: Quantity, increment: Quantity): Quantity {
  return roundUpTo(quantity(figuredYd3.times(waste.plus(1))), increment);
}
