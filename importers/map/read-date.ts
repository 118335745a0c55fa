import type { PlainDate } from '@/lib/domain/time/clock-minutes';
import type { DateOrder } from '../core/layout';

/** Reads the ways in which bills print dates, and tells day first from month first. */

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];
const FIRST_YEAR = 1990;
const LAST_YEAR = 2099;

/** The three numbers of a date in the order printed, or a date that is sure whatever the order. */
type Parts =
  | { readonly kind: 'sure'; readonly date: PlainDate }
  | { readonly kind: 'numbers'; readonly a: number; readonly b: number; readonly year: string }
  | { readonly kind: 'shortYmd'; readonly a: number; readonly b: number; readonly c: number };

function fullYear(text: string): number {
  return text.length <= 2 ? 2000 + Number(text) : Number(text);
}

function plainDate(year: number, month: number, day: number): PlainDate | null {
  if (year < FIRST_YEAR || year > LAST_YEAR || month < 1 || month > 12 || day < 1) return null;
  const leap = (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
  const lengths = [31, leap ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  if (day > (lengths[month - 1] ?? 0)) return null;
  return `${year}-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;
}

function monthOf(word: string): number {
  return MONTHS.indexOf(word.slice(0, 3).toLowerCase()) + 1;
}

/** Takes off weekday, and clock time behind the date. */
function bareDate(cell: string): string {
  return cell
    .trim()
    .replace(/^(mon|tue|wed|thu|fri|sat|sun)[a-z]*[,.]?\s+/i, '')
    .replace(
      /(?:T|\s+)\d{1,2}:\d{2}(:\d{2}(\.\d+)?)?\s*([ap]\.?m\.?)?\s*(Z|[+-]\d{2}:?\d{2})?$/i,
      '',
    )
    .trim();
}

function sure(date: PlainDate | null): Parts | null {
  return date === null ? null : { kind: 'sure', date };
}

function namedMonth(text: string): Parts | null {
  const dayFirst = /^(\d{1,2})[-\s./]*([a-z]{3,9})\.?[-\s.,/]*(\d{4}|\d{2})$/i.exec(text);
  const monthFirst = /^([a-z]{3,9})\.?[-\s/]*(\d{1,2})(?:st|nd|rd|th)?[-\s,/]+(\d{4}|\d{2})$/i.exec(
    text,
  );
  if (dayFirst) {
    const [, day = '', month = '', year = ''] = dayFirst;
    return sure(plainDate(fullYear(year), monthOf(month), Number(day)));
  }
  if (monthFirst) {
    const [, month = '', day = '', year = ''] = monthFirst;
    return sure(plainDate(fullYear(year), monthOf(month), Number(day)));
  }
  return null;
}

function partsOf(cell: string): Parts | null {
  if (cell.length > 60) return null;
  const text = bareDate(cell);
  const iso = /^(\d{4})([-/.]?)(\d{1,2})\2(\d{1,2})$/.exec(text);
  if (iso && (iso[2] !== '' || text.length === 8)) {
    return sure(plainDate(Number(iso[1]), Number(iso[3]), Number(iso[4])));
  }
  const numbers = /^(\d{1,2})([-/. ])(\d{1,2})\2(\d{4}|\d{2})$/.exec(text);
  if (!numbers) return namedMonth(text);
  const [, first = '', , second = '', third = ''] = numbers;
  if (third.length === 4) return { kind: 'numbers', a: +first, b: +second, year: third };
  return { kind: 'shortYmd', a: +first, b: +second, c: +third };
}

function inOrder(parts: Parts, order: DateOrder): PlainDate | null {
  if (parts.kind === 'sure') return parts.date;
  const { a, b } = parts;
  if (parts.kind === 'shortYmd' && order === 'YMD') return plainDate(2000 + a, b, parts.c);
  const year = parts.kind === 'shortYmd' ? 2000 + parts.c : Number(parts.year);
  return order === 'DMY' ? plainDate(year, b, a) : plainDate(year, a, b);
}

/** Reads one date cell; null where it is no date in this order. */
export function readDate(cell: string, order: DateOrder): PlainDate | null {
  const parts = partsOf(cell);
  return parts === null ? null : inOrder(parts, order);
}

/** Whether the cell is a date in any order: for telling columns apart. */
export function looksLikeDate(cell: string): boolean {
  return readDate(cell, 'MDY') !== null || readDate(cell, 'DMY') !== null;
}

export interface DateOrderGuess {
  readonly order: DateOrder;
  /** True where dates read differently in both orders and nothing decides for sure. */
  readonly ambiguous: boolean;
  /** True where some dates can only be month first and others only day first. */
  readonly mixed: boolean;
  readonly why: string;
}

/** Months between the first and the last date: a bill covers one or two. */
function spanMonths(dates: readonly PlainDate[]): number {
  const months = dates.map((date) => Number(date.slice(0, 4)) * 12 + Number(date.slice(5, 7)));
  let lowest = Number.POSITIVE_INFINITY;
  let highest = Number.NEGATIVE_INFINITY;
  for (const month of months) {
    lowest = Math.min(lowest, month);
    highest = Math.max(highest, month);
  }
  return dates.length === 0 ? 0 : highest - lowest;
}

/**
 * Decides the order from the whole column, with the document's own dates (its period) as
 * further witnesses. One date past the twelfth decides; without any, the order in which the
 * dates lie closer together is taken, and said to be a guess.
 */
export function detectDateOrder(
  cells: readonly string[],
  witnesses: readonly string[] = [],
): DateOrderGuess {
  const parts = [...cells, ...witnesses].map(partsOf).filter((part) => part !== null);
  // A date that no order makes sense of says nothing about the order.
  const open = parts.filter(
    (part) =>
      part.kind !== 'sure' &&
      (inOrder(part, 'MDY') ?? inOrder(part, 'DMY') ?? inOrder(part, 'YMD')),
  );
  if (open.length === 0) {
    return { order: 'MDY', ambiguous: false, mixed: false, why: 'the dates read only one way' };
  }
  const count = (order: DateOrder) => open.filter((part) => inOrder(part, order) !== null).length;
  const [mdy, dmy, ymd] = [count('MDY'), count('DMY'), count('YMD')];
  if (ymd > mdy && ymd > dmy) {
    return { order: 'YMD', ambiguous: false, mixed: false, why: 'the first number is the year' };
  }
  if (mdy !== dmy) {
    const order = mdy > dmy ? 'MDY' : 'DMY';
    const mixed = mdy < open.length && dmy < open.length;
    return { order, ambiguous: false, mixed, why: 'a number above 12 can only be a day' };
  }
  const read = (order: DateOrder) =>
    open.map((part) => inOrder(part, order)).filter((date) => date !== null);
  const [asMdy, asDmy] = [read('MDY'), read('DMY')];
  const same = asMdy.length === asDmy.length && asMdy.every((date, at) => date === asDmy[at]);
  const mixed = mdy < open.length;
  const order = spanMonths(asDmy) < spanMonths(asMdy) ? 'DMY' : 'MDY';
  const why = same
    ? 'both orders give the same days'
    : spanMonths(asDmy) === spanMonths(asMdy)
      ? 'month first is usual here'
      : 'the dates lie closer together that way';
  return { order, ambiguous: !same, mixed, why };
}
