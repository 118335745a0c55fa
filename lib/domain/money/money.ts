import Decimal from 'decimal.js';

Decimal.set({ precision: 40, rounding: Decimal.ROUND_HALF_UP });

declare const moneyBrand: unique symbol;
declare const quantityBrand: unique symbol;

/** An amount in dollars; exact until a rule says `roundCents`. */
export type Money = Decimal & { readonly [moneyBrand]: true };
/** A measured amount of anything (yards, minutes, pieces); exact until a rule rounds it. */
export type Quantity = Decimal & { readonly [quantityBrand]: true };

/** What is accepted where a decimal comes in; binary floats are only for whole numbers. */
export type DecimalInput = string | Decimal;

/** Makes a `Money` from a decimal string ("12.50"). Throws on anything that is not a number. */
export function money(value: DecimalInput): Money {
  return new Decimal(value) as Money;
}

/** Makes a `Quantity` from a decimal string ("10.50"). Throws on anything that is not a number. */
export function quantity(value: DecimalInput): Quantity {
  return new Decimal(value) as Quantity;
}

/** A whole number of something (minutes, loads) as a `Quantity`. */
export function count(value: number): Quantity {
  if (!Number.isSafeInteger(value)) throw new Error(`count wants a whole number, got ${value}`);
  return new Decimal(value) as Quantity;
}

export const ZERO_MONEY = money('0');

/** Rounds to the cent, half away from zero: the only rounding of money in the product. */
export function roundCents(value: Decimal): Money {
  return value.toDecimalPlaces(2, Decimal.ROUND_HALF_UP) as Money;
}

/** quantity × rate, not rounded. */
export function extend(amountOf: Quantity, rate: Money): Money {
  return amountOf.times(rate) as Money;
}

export function sumMoney(values: Iterable<Money>): Money {
  let total: Decimal = ZERO_MONEY;
  for (const value of values) total = total.plus(value);
  return total as Money;
}

export function sumQuantity(values: Iterable<Quantity>): Quantity {
  let total: Decimal = new Decimal(0);
  for (const value of values) total = total.plus(value);
  return total as Quantity;
}

/** "-1234.5" → "-1234.50": the form in which amounts cross the database and the wire. */
export function moneyText(value: Decimal): string {
  return roundCents(value).toFixed(2);
}

/** Yards, hours and pieces as kept: two places. */
export function quantityText(value: Decimal): string {
  return value.toDecimalPlaces(2, Decimal.ROUND_HALF_UP).toFixed(2);
}
