import type Decimal from 'decimal.js';
import type { PumpTicketFacts, TicketFacts } from '../facts';
import { moneyText, quantityText } from '../money/money';

/** "$1,580.00": amounts as explanations write them. */
export function dollars(amount: Decimal): string {
  const text = moneyText(amount.abs()).replace(/\B(?=(\d{3})+(?!\d))/g, ',');
  return `${amount.isNegative() && !amount.isZero() ? '−' : ''}$${text}`;
}

/** A unit price with the places it was quoted in, two at least: "$2.25", "$0.0125". */
export function unitPrice(rate: Decimal): string {
  return `$${rate.toFixed(Math.max(2, rate.decimalPlaces()))}`;
}

export function yards(amount: Decimal): string {
  return `${quantityText(amount)} yd³`;
}

/** Minutes without needless places: "46 min", "31.5 min". */
export function minutes(amount: Decimal): string {
  return `${amount.toDecimalPlaces(2).toString()} min`;
}

/** "Load 447182, truck 214" */
export function loadName(load: TicketFacts): string {
  return load.truck ? `Load ${load.number}, truck ${load.truck}` : `Load ${load.number}`;
}

export function pumpName(pump: PumpTicketFacts): string {
  return `Pump ticket ${pump.number}`;
}
