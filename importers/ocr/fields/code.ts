import { asDigits } from './digits';
import type { FieldValue } from './field-kind';

const CODE = /^[A-Z]{0,4}[-/]?\d[A-Z0-9]*(?:-[A-Z0-9]+)*$/;

/** Characters set far apart are sometimes taken for words of one letter each. */
function closedUp(text: string): string {
  const words = text.split(/\s+/);
  return words.length >= 3 && words.every((word) => word.length <= 2) ? words.join('') : text;
}

/** A number such as "558801", "H-40311", "CR-1187", "26-044", "C12". */
export function readCode(text: string): FieldValue | null {
  const joined = closedUp(
    text
      .trim()
      .toUpperCase()
      .replace(/\s*-\s*/g, '-'),
  );
  const first = joined.split(/\s+/)[0]?.replace(/^[#.:]+|[.,:;|]+$/g, '') ?? '';
  if (first.length > 14) return null;
  if (CODE.test(first)) {
    // Letters after digits are rare in numbers, and usual in misread ones.
    const odd = /\d[A-Z]/.test(first) || joined !== text.trim().toUpperCase();
    const plain = odd && !first.includes('-') ? asDigits(first) : { text: first, repaired: false };
    return { value: plain.text, repaired: odd };
  }
  return null;
}

/** A mix's code: the first word, in capitals, with at least one digit. */
export function readMixCode(text: string): FieldValue | null {
  const first =
    text
      .trim()
      .split(/\s+/)[0]
      ?.toUpperCase()
      .replace(/[.,:;|]+$/g, '') ?? '';
  if (!/^[A-Z0-9][A-Z0-9./-]{1,13}$/.test(first) || !/\d/.test(first)) return null;
  return { value: first, repaired: false };
}

/** A small whole number: which load of the order this is. "3 of 6" is load 3. */
export function readWholeNumber(text: string): FieldValue | null {
  const { text: digits, repaired } = asDigits(text.trim());
  const found = /^[#.]?(\d{1,3})(?:\s*(?:of|\/)\s*\d{1,3})?[.,]?$/i.exec(digits);
  if (!found || Number(found[1]) === 0) return null;
  return { value: String(Number(found[1])), repaired };
}
