import type { ClockMinutes, PlainDate } from '../domain/time/clock-minutes';
import type { Locale } from './locale';

/**
 * How figures, days and times are written on every screen. Amounts and quantities come in as
 * decimal text and are never made into binary floats: digits are grouped and rounded as text.
 */

export type ClockStyle = '12' | '24';

const MINUS = '−';
const DECIMAL = /^([+-]?)(\d+)(?:\.(\d+))?$/;

interface Digits {
  readonly negative: boolean;
  /** Whole part and `places` decimals, as digits without a point. */
  readonly scaled: bigint;
}

/** Rounds half away from zero to `places`; throws on text that is not a plain decimal. */
function readDecimal(text: string, places: number): Digits {
  const found = DECIMAL.exec(text.trim());
  if (!found) throw new Error(`not a decimal: ${JSON.stringify(text)}`);
  const [, sign, whole = '0', fraction = ''] = found;
  const kept = fraction.slice(0, places).padEnd(places, '0');
  const roundUp = (fraction[places] ?? '0') >= '5';
  const scaled = BigInt(whole + kept) + (roundUp ? 1n : 0n);
  return { negative: sign === '-' && scaled !== 0n, scaled };
}

function writeDigits(scaled: bigint, places: number): string {
  const digits = scaled.toString().padStart(places + 1, '0');
  const whole = digits.slice(0, digits.length - places);
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ',');
  return places === 0 ? grouped : `${grouped}.${digits.slice(-places)}`;
}

/** "1234.5" → "1,234.50"; negatives with a true minus sign. */
export function decimalFigure(text: string, places = 2): string {
  const { negative, scaled } = readDecimal(text, places);
  return `${negative ? MINUS : ''}${writeDigits(scaled, places)}`;
}

/** "1234.5" → "$1,234.50"; "-12" → "−$12.00". */
export function moneyFigure(text: string): string {
  const { negative, scaled } = readDecimal(text, 2);
  return `${negative ? MINUS : ''}$${writeDigits(scaled, 2)}`;
}

/** A unit price with at least two and at most four places: "158" → "$158.00", "2.2575" → "$2.2575". */
export function rateFigure(text: string): string {
  const { negative, scaled } = readDecimal(text, 4);
  const written = writeDigits(scaled, 4).replace(/0{1,2}$/, '');
  return `${negative ? MINUS : ''}$${written}`;
}

/** Yards to 0.01 without the unit, for ruled columns: "10.5" → "10.50". */
export function yardsFigure(text: string): string {
  return decimalFigure(text, 2);
}

/** Yards with their unit, for sentences: "10.50 yd³". */
export function yardsWithUnit(text: string): string {
  return `${yardsFigure(text)} yd³`;
}

/** A signed difference: "103.5" → "+103.50", "-12" → "−12.00", "0" → "0.00". */
export function differenceFigure(text: string): string {
  const { negative, scaled } = readDecimal(text, 2);
  if (scaled === 0n) return writeDigits(scaled, 2);
  return `${negative ? MINUS : '+'}${writeDigits(scaled, 2)}`;
}

/** Whether a difference is against us (positive), in our favour (negative) or nothing, to the cent. */
export function signOf(text: string): 'positive' | 'negative' | 'zero' {
  const { negative, scaled } = readDecimal(text, 2);
  if (scaled === 0n) return 'zero';
  return negative ? 'negative' : 'positive';
}

/** A share between 0 and 1 as a percentage: "0.0725" → "7.25%" with `places` 2. */
export function percentFigure(text: string, places = 0): string {
  const { negative, scaled } = readDecimal(text, places + 2);
  return `${negative ? MINUS : ''}${writeDigits(scaled, places)}%`;
}

const MONTHS: Record<Locale, readonly string[]> = {
  en: ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'],
  es: ['ene', 'feb', 'mar', 'abr', 'may', 'jun', 'jul', 'ago', 'sep', 'oct', 'nov', 'dic'],
};
const WEEKDAYS: Record<Locale, readonly string[]> = {
  en: ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat'],
  es: ['dom', 'lun', 'mar', 'mié', 'jue', 'vie', 'sáb'],
};

function readDay(day: PlainDate) {
  const found = /^(\d{4})-(\d{2})-(\d{2})$/.exec(day);
  if (!found) throw new Error(`not a day: ${JSON.stringify(day)}`);
  return { year: Number(found[1]), month: Number(found[2]), date: Number(found[3]) };
}

/** "2026-06-14" → "14 Jun" */
export function dayWithoutYear(day: PlainDate, locale: Locale = 'en'): string {
  const { month, date } = readDay(day);
  const named = MONTHS[locale][month - 1];
  if (!named) throw new Error(`not a month: ${JSON.stringify(day)}`);
  return `${date} ${named}`;
}

/** "2026-06-14" → "14 Jun 2026" */
export function dayText(day: PlainDate, locale: Locale = 'en'): string {
  return `${dayWithoutYear(day, locale)} ${readDay(day).year}`;
}

/** "2026-06-14" → "Sun 14 Jun": for days close to today, where the weekday is what people go by. */
export function weekdayText(day: PlainDate, locale: Locale = 'en'): string {
  const { year, month, date } = readDay(day);
  const weekday = new Date(Date.UTC(year, month - 1, date)).getUTCDay();
  return `${WEEKDAYS[locale][weekday]} ${dayWithoutYear(day, locale)}`;
}

/** "1–30 Sep 2026", "28 Aug – 27 Sep 2026", "28 Dec 2025 – 27 Jan 2026" */
export function periodText(from: PlainDate, to: PlainDate, locale: Locale = 'en'): string {
  const first = readDay(from);
  const last = readDay(to);
  if (first.year !== last.year) return `${dayText(from, locale)} – ${dayText(to, locale)}`;
  if (first.month !== last.month) return `${dayWithoutYear(from, locale)} – ${dayText(to, locale)}`;
  if (first.date === last.date) return dayText(from, locale);
  return `${first.date}–${dayText(to, locale)}`;
}

/** Minutes after midnight as the company writes the time: 446 → "07:26" or "7:26 am". */
export function clockFigure(minutes: ClockMinutes, style: ClockStyle): string {
  const inDay = ((minutes % 1440) + 1440) % 1440;
  const hours = Math.floor(inDay / 60);
  const rest = String(inDay % 60).padStart(2, '0');
  if (style === '24') return `${String(hours).padStart(2, '0')}:${rest}`;
  return `${hours % 12 === 0 ? 12 : hours % 12}:${rest} ${hours < 12 ? 'am' : 'pm'}`;
}

/** A length of time in minutes: 46 → "46 min", 135 → "2 h 15 min". */
export function durationText(minutes: number): string {
  if (minutes < 60) return `${minutes} min`;
  const rest = minutes % 60;
  return rest === 0 ? `${Math.floor(minutes / 60)} h` : `${Math.floor(minutes / 60)} h ${rest} min`;
}

/** Day and clock minutes of a moment (ISO 8601) in a time zone. */
function localParts(moment: string, timeZone: string): { day: PlainDate; minutes: ClockMinutes } {
  const parts = new Intl.DateTimeFormat('en-CA', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  }).formatToParts(new Date(moment));
  const part = (type: string) => parts.find((one) => one.type === type)?.value ?? '';
  return {
    day: `${part('year')}-${part('month')}-${part('day')}`,
    minutes: Number(part('hour')) * 60 + Number(part('minute')),
  };
}

/** The calendar day of a moment (ISO 8601) in a time zone, "2026-06-14". */
export function dayOfMoment(moment: string, timeZone: string): PlainDate {
  return localParts(moment, timeZone).day;
}

/** The clock time of a moment in the company's time zone: "7:26 am". */
export function clockOfMoment(
  moment: string,
  where: { readonly timeZone: string; readonly clock: ClockStyle },
): string {
  return clockFigure(localParts(moment, where.timeZone).minutes, where.clock);
}

/** A moment (ISO 8601) in the company's time zone: "14 Jun 2026, 7:26 am". */
export function momentText(
  moment: string,
  where: { readonly timeZone: string; readonly clock: ClockStyle; readonly locale?: Locale },
): string {
  const { day, minutes } = localParts(moment, where.timeZone);
  return `${dayText(day, where.locale)}, ${clockFigure(minutes, where.clock)}`;
}

const AGES: Record<Locale, { now: string; ago: (count: number, unit: AgeUnit) => string }> = {
  en: {
    now: 'just now',
    ago: (count, unit) => `${count} ${unit}${count === 1 ? '' : 's'} ago`,
  },
  es: {
    now: 'hace un momento',
    ago: (count, unit) => {
      const [one, many] = {
        minute: ['minuto', 'minutos'],
        hour: ['hora', 'horas'],
        day: ['día', 'días'],
      }[unit];
      return `hace ${count} ${count === 1 ? one : many}`;
    },
  },
};
type AgeUnit = 'minute' | 'hour' | 'day';

/** How long ago a moment was, both ISO 8601: "just now", "5 minutes ago", "3 days ago". */
export function ageText(moment: string, now: string, locale: Locale = 'en'): string {
  const minutes = Math.floor((Date.parse(now) - Date.parse(moment)) / 60_000);
  const words = AGES[locale];
  if (minutes < 1) return words.now;
  if (minutes < 60) return words.ago(minutes, 'minute');
  if (minutes < 1440) return words.ago(Math.floor(minutes / 60), 'hour');
  return words.ago(Math.floor(minutes / 1440), 'day');
}
