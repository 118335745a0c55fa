import type { RowKind } from '../core/plan';

/** What is known of a row when its kind is told. */
export interface RowClues {
  /** The filled cells that are words, in order; the description first where there is one. */
  readonly words: readonly string[];
  readonly hasDate: boolean;
  readonly hasTicket: boolean;
  readonly hasQuantity: boolean;
  readonly hasPrice: boolean;
  readonly hasMoney: boolean;
  /** The amount as read, with its sign; null where there is none. */
  readonly negative: boolean;
  readonly inCreditColumn: boolean;
}

const OPENING =
  /\b(opening|previous|prior|beginning|starting|last) (statement )?balance\b|\bbalance (brought )?forward\b|\bbal(ance)? (b\/?f|fwd)\b|\bamount of last statement\b/i;
const CLOSING =
  /\b(closing|ending|new|current|statement|account) balance\b|\b(balance|amount|total) (now )?due\b|\bplease pay\b|\bpay this amount\b|\bbalance carried forward\b/i;
const SUBTOTAL =
  /^\W*(sub|grand|page|invoice|statement|report|job|ticket|customer|account|day|daily)?[- ]?totals?\b|\btotals?\W*$|\btotal for\b/i;
const PAYMENT =
  /\bpayments?\b|\bpmt\b|\bthank you\b|\bremittance\b|\bach (credit|received)\b|\bche(ck|que) ?(#|no|\d)|\bpaid by\b|\bwire received\b/i;
const NOT_PAYMENT =
  /\b(prompt|early)[- ]pay(ment)?\b|\bpayment (terms|discount|due)\b|\bdiscount\b/i;
const CREDIT =
  /\bcredit memo\b|\bcredits?\b|\bc\/?m\b|\brefund\b|\badjustment\b|\brebate\b|\bdiscount\b|\breturn(ed)?\b|\brevers(al|ed)\b/i;
const NOT_CREDIT =
  /\bcredit card\b|\breturn(ed)? (concrete|mix|material|load)\b|\bcredit (app|check)/i;
const TAX = /\btax(es)?\b/i;
const NOT_TAX = /\btax(able)? exempt\b|\bnon-?tax/i;

/** Tells what a row of the bill is: a charge, or one of the rows that stand between charges. */
export function readRowKind(clues: RowClues): RowKind {
  const text = clues.words.join(' · ');
  const says = (pattern: RegExp) => clues.words.some((word) => pattern.test(word));
  const isDelivery = clues.hasTicket && (clues.hasQuantity || clues.hasPrice);
  if (!isDelivery) {
    if (says(OPENING)) return 'opening';
    if (says(CLOSING)) return 'closing';
    if (says(SUBTOTAL) && !clues.hasTicket && !clues.hasPrice) return 'subtotal';
  }
  const figures = clues.hasMoney || clues.hasQuantity || clues.hasPrice;
  if (!figures && !clues.hasTicket && !clues.hasDate) {
    return 'note';
  }
  if (!isDelivery && PAYMENT.test(text) && !NOT_PAYMENT.test(text)) return 'payment';
  if (TAX.test(text) && !NOT_TAX.test(text) && !clues.negative) return 'tax';
  if (clues.negative || clues.inCreditColumn) return 'credit';
  if (!isDelivery && CREDIT.test(text) && !NOT_CREDIT.test(text)) return 'credit';
  return 'line';
}
