import type { YieldFigures } from '../../contracts/yield';
import {
  moneyText,
  type Quantity,
  quantity,
  quantityText,
  sumQuantity,
} from '../../domain/money/money';
import { summarizeYield } from '../../domain/yield/summary';
import type { PlacedFacts } from './work-out';

const text = (value: Quantity | null) => (value === null ? null : quantityText(value));

/** Area-weighted, over the placements that have an area and a thickness. */
function plannedThickness(placed: readonly PlacedFacts[]): Quantity | null {
  const known = placed.flatMap(({ placement: { areaFt2, thicknessIn } }) =>
    areaFt2 && thicknessIn ? [{ area: quantity(areaFt2), thickness: quantity(thicknessIn) }] : [],
  );
  const area = sumQuantity(known.map((one) => one.area));
  if (known.length !== placed.length || area.isZero()) return null;
  const weighted = sumQuantity(known.map((one) => quantity(one.area.times(one.thickness))));
  return quantity(weighted.dividedBy(area));
}

function sourceOf(placed: readonly PlacedFacts[]): YieldFigures['costFrom'] {
  const sources = new Set(placed.map((one) => one.costFrom).filter((source) => source !== 'none'));
  if (sources.size === 0) return 'none';
  const [only] = sources;
  return sources.size === 1 && only ? only : 'both';
}

/** The figures of placements together, as text for the wire. */
export function yieldFigures(placed: readonly PlacedFacts[]): YieldFigures {
  const sum = summarizeYield(placed.map((one) => one.facts));
  const { figuredYd3, deliveredYd3, returnedYd3 } = sum;
  const costFrom = sourceOf(placed);
  const over =
    figuredYd3 && sum.loads > 0
      ? quantity(deliveredYd3.minus(returnedYd3).minus(figuredYd3))
      : null;
  return {
    loads: sum.loads,
    figuredYd3: text(figuredYd3),
    orderedYd3: text(sum.orderedYd3),
    deliveredYd3: quantityText(deliveredYd3),
    returnedYd3: quantityText(returnedYd3),
    billedYd3: text(sum.billedYd3),
    overrunYd3: text(over),
    overrunShare: sum.overrun === null ? null : sum.overrun.toDecimalPlaces(4).toFixed(4),
    plannedThicknessIn: text(plannedThickness(placed)),
    impliedThicknessIn: text(sum.impliedThicknessIn),
    timedLoads: sum.timedLoads,
    onSiteMinutes: sum.onSiteMinutes,
    minutesPerLoad: text(sum.minutesPerLoad),
    minutesPerYd3: text(sum.minutesPerYd3),
    cost: moneyText(sum.cost),
    costPerYd3: costFrom === 'none' || sum.costPerYd3 === null ? null : moneyText(sum.costPerYd3),
    costParts: sum.costParts.map(({ part, amount, perYd3 }) => ({
      part,
      amount: moneyText(amount),
      perYd3: perYd3 === null ? null : moneyText(perYd3),
    })),
    costFrom,
    unpriced: placed.reduce((count, one) => count + one.unpriced, 0),
    smallSample: sum.smallSample,
  };
}
