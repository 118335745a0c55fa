import { asDigits } from './digits';
import type { FieldValue } from './field-kind';

const MOST_YARDS = 20_000;

/**
 * Yards as printed, without the unit: "10.00 yd" → "10.00". A lost point ("10 00") is put back
 * before the last two digits only where a gap shows its place.
 */
export function readYards(text: string): FieldValue | null {
  const { text: digits, repaired } = asDigits(text.split(/\s*(?:yds?|cy|cu|yards?)\b/i)[0] ?? '');
  const found = /^\D{0,2}(\d{1,5})(?:\s?([.,:])\s?|(\s))(\d{1,2})\D{0,2}$/.exec(digits.trim());
  if (found) {
    const [, whole = '', mark, , part = ''] = found;
    if (Number(whole) > MOST_YARDS) return null;
    return { value: `${whole}.${part}`, repaired: repaired || mark !== '.' };
  }
  const whole = /^(\d{1,4})\.?$/.exec(digits.trim());
  if (!whole) return null;
  // A number without decimals is rare on a ticket and often one whose point was lost.
  return { value: whole[1] ?? '', repaired: true };
}

/** Gallons of water, whole or with one or two decimals. */
export function readGallons(text: string): FieldValue | null {
  const { text: digits, repaired } = asDigits(text.split(/\s*gal/i)[0] ?? '');
  const found = /^\D{0,1}(\d{1,3}(?:\.\d{1,2})?)\D{0,1}$/.exec(digits.trim());
  return found ? { value: found[1] ?? '', repaired } : null;
}
