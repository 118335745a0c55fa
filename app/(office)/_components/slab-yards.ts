import { decimalOrNull } from '@/components/forms/typed-form';
import { quantity, quantityText } from '@/lib/domain/money/money';
import { coverageFt2PerYd3 } from '@/lib/domain/yield/measures';

const NUMBER = /^\d{1,7}(\.\d{1,4})?$/;

/** What was typed, as a positive number; null where it is none (yet). */
function typed(text: string) {
  const plain = decimalOrNull(text);
  if (plain === null || !NUMBER.test(plain)) return null;
  const value = quantity(plain);
  return value.isZero() ? null : value;
}

/** Yards of an area at a thickness, to 0.01; null until both are typed. */
export function slabYards(areaFt2: string, thicknessIn: string): string | null {
  const [area, thickness] = [typed(areaFt2), typed(thicknessIn)];
  if (!area || !thickness) return null;
  return quantityText(area.dividedBy(coverageFt2PerYd3(thickness)));
}

/** Yards with the share for waste on top, to 0.01; null until both are typed. */
export function withWaste(figuredYd3: string, wastePercent: string): string | null {
  const [figured, waste] = [typed(figuredYd3), typed(wastePercent)];
  if (!figured || !waste) return null;
  return quantityText(figured.times(waste.dividedBy(100).plus(1)));
}
