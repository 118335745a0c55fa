import type { Decimal } from 'decimal.js';
import type { PlainDate } from './time/clock-minutes';

/** How figures stand in the core's own sentences: plain text that can be mailed to a clerk. */

const MONTHS = 'Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec'.split(' ');

function grouped(digits: string): string {
  const [whole = '0', fraction] = digits.split('.');
  const withCommas = whole.replace(/\B(?=(\d{3})+$)/g, ',');
  return fraction === undefined ? withCommas : `${withCommas}.${fraction}`;
}

function signed(value: Decimal, digits: string, before: string): string {
  return `${value.isNegative() && !value.isZero() ? '-' : ''}${before}${digits}`;
}

/** 1580 → "$1,580.00", rounded to the cent. */
export function dollars(value: Decimal): string {
  const cents = value.toDecimalPlaces(2);
  return signed(cents, grouped(cents.abs().toFixed(2)), '$');
}

/** A unit price with two to four places: 158 → "$158.00", 1.58333 → "$1.5833". */
export function price(value: Decimal): string {
  const kept = value.toDecimalPlaces(4);
  const digits = kept.abs().toFixed(Math.max(2, kept.decimalPlaces()));
  return signed(kept, grouped(digits), '$');
}

/** A bare number without needless zeros, to four places: 31.50 → "31.5". */
export function figure(value: Decimal): string {
  const kept = value.toDecimalPlaces(4);
  return signed(kept, grouped(kept.abs().toFixed()), '');
}

/** 10.5 → "10.50 yd" (cubic yards, as the trade writes them). */
export function yards(value: Decimal): string {
  return `${grouped(value.toDecimalPlaces(2).toFixed(2))} yd`;
}

/** "2026-09-03" → "3 Sep 2026". */
export function day(date: PlainDate): string {
  const [year, month, dayOfMonth] = date.split('-');
  return `${Number(dayOfMonth)} ${MONTHS[Number(month) - 1]} ${year}`;
}

/** "1 load", "3 loads". */
export function counted(amount: number, one: string, many = `${one}s`): string {
  return `${amount} ${amount === 1 ? one : many}`;
}
