import { type Quantity, quantity } from '../money/money';
import { FT3_PER_YD3, ft3FromYd3 } from '../units/volume';

/** Square feet that a cubic yard covers at one inch: 27 ft³ × 12 in. */
const FT2_INCHES_PER_YD3 = 324;

/** Square feet covered by one cubic yard at a thickness in inches: 324 / t. */
export function coverageFt2PerYd3(thicknessIn: Quantity): Quantity {
  return quantity(quantity(String(FT2_INCHES_PER_YD3)).dividedBy(thicknessIn));
}

/** The average thickness, in inches, at which the delivered yards cover the area. */
export function impliedThicknessIn(deliveredYd3: Quantity, areaFt2: Quantity): Quantity {
  return quantity(deliveredYd3.times(FT2_INCHES_PER_YD3).dividedBy(areaFt2));
}

/** (delivered − returned − figured) / figured, as a share: 0.05 is five percent over. */
export function overrunShare(
  figuredYd3: Quantity,
  deliveredYd3: Quantity,
  returnedYd3: Quantity,
): Quantity {
  return quantity(deliveredYd3.minus(returnedYd3).minus(figuredYd3).dividedBy(figuredYd3));
}

export interface RelativeYield {
  /** Measured volume over billed volume: 1 is what was billed. */
  readonly ratio: Quantity;
  readonly ft3PerYd3: Quantity;
  readonly shortageYd3: Quantity;
  readonly verdict: 'short' | 'exact' | 'over';
}

/** What a billed volume really measured (ASTM C138: relative yield, 27.00 ft³ to the yard). */
export function relativeYield(measuredFt3: Quantity, billedYd3: Quantity): RelativeYield {
  const ft3PerYd3 = quantity(measuredFt3.dividedBy(billedYd3));
  const sign = ft3PerYd3.comparedTo(FT3_PER_YD3);
  return {
    ratio: quantity(measuredFt3.dividedBy(ft3FromYd3(billedYd3))),
    ft3PerYd3,
    shortageYd3: quantity(billedYd3.minus(measuredFt3.dividedBy(FT3_PER_YD3))),
    verdict: sign === 0 ? 'exact' : sign < 0 ? 'short' : 'over',
  };
}

/** Fresh volume of a batch in ft³: total mass over density (ASTM C138). */
export function batchYieldFt3(batchMassLb: Quantity, densityLbPerFt3: Quantity): Quantity {
  return quantity(batchMassLb.dividedBy(densityLbPerFt3));
}
