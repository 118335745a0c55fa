import { asDigits } from './digits';
import type { FieldValue } from './field-kind';

const MONTHS = ['JAN', 'FEB', 'MAR', 'APR', 'MAY', 'JUN', 'JUL', 'AUG', 'SEP', 'OCT', 'NOV', 'DEC'];
const DAYS_IN_MONTH = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

function plainDate(year: string, month: number, day: number): string | null {
  const full = year.length === 2 ? `20${year}` : year;
  if (!/^20\d\d$/.test(full) || month < 1 || month > 12) return null;
  if (day < 1 || day > (DAYS_IN_MONTH[month - 1] ?? 0)) return null;
  return `${full}-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;
}

function monthByName(text: string): number {
  return MONTHS.indexOf(text.slice(0, 3).toUpperCase()) + 1;
}

/** "19-Nov-2026", "NOV 19, 2026", "November 19 2026" */
function namedDate(text: string): string | null {
  const dayFirst = /^(\d{1,2})[\s./-]*([A-Za-z]{3,9})[\s.,/-]*(\d{4}|\d{2})\b/.exec(text);
  if (dayFirst) {
    const [, day = '', month = '', year = ''] = dayFirst;
    return plainDate(year, monthByName(month), Number(day));
  }
  const monthFirst = /^([A-Za-z]{3,9})[\s./-]*(\d{1,2})[\s.,/-]+(\d{4}|\d{2})\b/.exec(text);
  if (!monthFirst) return null;
  const [, month = '', day = '', year = ''] = monthFirst;
  return plainDate(year, monthByName(month), Number(day));
}

/** "2026-11-19", "11/19/2026", "11/19/26"; numbers alone are month first, as the trade writes. */
function numberedDate(text: string): string | null {
  const iso = /^(20\d\d)[-/.](\d{1,2})[-/.](\d{1,2})\b/.exec(text);
  if (iso) {
    const [, year = '', month = '', day = ''] = iso;
    return plainDate(year, Number(month), Number(day));
  }
  const american = /^(\d{1,2})\s?[-/.]\s?(\d{1,2})\s?[-/.]\s?(\d{4}|\d{2})\b/.exec(text);
  if (!american) return null;
  const [, month = '', day = '', year = ''] = american;
  return plainDate(year, Number(month), Number(day));
}

/** Any of the usual ways to write a day → "2026-11-19". */
export function readDate(text: string): FieldValue | null {
  const trimmed = text.trim().replace(/^(mon|tue|wed|thu|fri|sat|sun)[a-z]*[,.]?\s+/i, '');
  const plain = numberedDate(trimmed) ?? namedDate(trimmed);
  if (plain) return { value: plain, repaired: false };
  const { text: digits, repaired } = asDigits(trimmed);
  const mended = repaired ? numberedDate(digits) : null;
  return mended ? { value: mended, repaired: true } : null;
}
