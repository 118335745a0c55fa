import type { BillLineFacts } from '../facts';
import { extend, type Money, money, type Quantity, quantity, roundCents } from '../money/money';
import { figure, price } from '../words';
import { withinSlack } from './draft';

/** What a line prints, in the unit that its clause counts in. */
export interface BilledFigures {
  /** Null where neither printed nor to be had from amount and price. */
  readonly quantity: Quantity | null;
  readonly unitPrice: Money | null;
  /** Quantity × price to the cent, where both are printed. */
  readonly extended: Money | null;
  /** "10.5 × $158.00", for the arithmetic finding. */
  readonly arithmetic: string;
}

const NO_UNIT = new Set(['', 'ea', 'each', 'ls', 'lot', 'lump', 'load', 'ld', 'job', 'chg']);
const HOURS = new Set(['h', 'hr', 'hrs', 'hour', 'hours']);
const MINUTES = new Set(['m', 'mn', 'min', 'mins', 'minute', 'minutes']);

const unitOf = ({ unit }: BillLineFacts) => (unit ?? '').toLowerCase().replace(/[^a-z]/g, '');

/** A single thing at the whole amount says nothing about minutes or hours. */
function isLump(line: BillLineFacts): boolean {
  const one = line.quantity === null || line.quantity.eq(1);
  const whole = line.unitPrice === null || withinSlack(line.unitPrice, line.amount);
  return one && whole && NO_UNIT.has(unitOf(line));
}

function asPrinted(line: BillLineFacts): Pick<BilledFigures, 'extended' | 'arithmetic'> {
  if (line.quantity === null || line.unitPrice === null) return { extended: null, arithmetic: '' };
  return {
    extended: roundCents(extend(line.quantity, line.unitPrice)),
    arithmetic: `${figure(line.quantity)} × ${price(line.unitPrice)}`,
  };
}

/** Quantity and price as printed, the missing one of the two from the amount. */
export function billedFigures(line: BillLineFacts): BilledFigures {
  const { amount } = line;
  let { quantity: billed, unitPrice } = line;
  if (billed === null && unitPrice !== null && !unitPrice.isZero()) {
    billed = quantity(amount.dividedBy(unitPrice).toDecimalPlaces(4));
  } else if (unitPrice === null && billed !== null && !billed.isZero()) {
    unitPrice = money(amount.dividedBy(billed).toDecimalPlaces(4));
  }
  return { quantity: billed, unitPrice, ...asPrinted(line) };
}

/**
 * The same in minutes or hours, whatever unit the line is in. A lump sum is read at the agreed
 * rate where that comes to quarters, as it would if only the time were wrong.
 */
export function billedTime(
  line: BillLineFacts,
  unit: 'min' | 'h',
  agreedRate: Money,
): BilledFigures {
  if (isLump(line)) {
    const implied = line.amount.dividedBy(agreedRate);
    const plausible = !agreedRate.isZero() && implied.times(4).isInteger();
    return {
      quantity: plausible ? quantity(implied) : null,
      unitPrice: plausible ? agreedRate : null,
      extended: null,
      arithmetic: '',
    };
  }
  const figures = billedFigures(line);
  const printed = unitOf(line);
  const toMinutes = unit === 'min' && HOURS.has(printed);
  const toHours = unit === 'h' && MINUTES.has(printed);
  if (!toMinutes && !toHours) return figures;
  const factor = toMinutes ? quantity('60') : quantity('1').dividedBy(60);
  return {
    ...figures,
    quantity: figures.quantity && quantity(figures.quantity.times(factor)),
    unitPrice: figures.unitPrice && money(figures.unitPrice.dividedBy(factor)),
  };
}
