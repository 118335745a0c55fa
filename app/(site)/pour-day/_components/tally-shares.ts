import Decimal from 'decimal.js';

interface Figures {
  readonly orderedYd3: string | null;
  readonly figuredYd3: string;
  readonly inYd3: string;
  readonly toCheckYd3: string;
}

/**
 * The lengths of the bar and the yards that are left. Of the order where one went out, else of
 * the figured yards; what is still to be checked fills no more than what is left of the bar.
 */
export function tallyShares(figures: Figures) {
  const whole = new Decimal(figures.orderedYd3 ?? figures.figuredYd3);
  const inYd3 = new Decimal(figures.inYd3);
  const percent = (yards: Decimal) =>
    whole.isZero() ? 0 : Math.min(100, yards.times(100).div(whole).toDecimalPlaces(2).toNumber());
  const inPercent = percent(inYd3);
  const left = whole.minus(inYd3);
  return {
    inPercent,
    toCheckPercent: Math.min(100 - inPercent, percent(new Decimal(figures.toCheckYd3))),
    /** Null where nothing was ordered: figured yards are no promise. */
    toGoYd3: figures.orderedYd3 === null ? null : left.abs().toFixed(2),
    isOver: figures.orderedYd3 !== null && left.isNegative(),
  };
}
