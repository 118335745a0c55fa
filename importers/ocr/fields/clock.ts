import { asDigits } from './digits';
import type { FieldValue } from './field-kind';

const CLOCK = /^\D{0,2}(\d{1,2})\s?([:;.,]?)\s?(\d{2})(?::\d{2})?\s*([AP])?\.?\s?M?\.?\s*$/i;

/** "7:05 AM", "07:05A", "0705", "13:42" → "07:05", "13:42". */
export function readClock(text: string): FieldValue | null {
  const half = /([AP])\.?\s?M?\.?\s*$/i.exec(text)?.[0] ?? '';
  const { text: digits, repaired } = asDigits(text.slice(0, text.length - half.length));
  const found = CLOCK.exec(digits + half);
  if (!found) return null;
  // Three digits in a row are more often a misread word than a time.
  if (found[2] === '' && (found[1] ?? '').length < 2) return null;
  const [, hoursText = '', mark = '', minutesText = '', halfDay] = found;
  let hours = Number(hoursText);
  const minutes = Number(minutesText);
  if (minutes > 59 || hours > 23) return null;
  if (halfDay) {
    if (hours < 1 || hours > 12) return null;
    hours = (hours % 12) + (halfDay.toUpperCase() === 'P' ? 12 : 0);
  }
  const value = `${String(hours).padStart(2, '0')}:${minutesText}`;
  return { value, repaired: repaired || mark !== ':' };
}
