import type { ChargeKind } from '../facts';
import { type Money, money, sumMoney, ZERO_MONEY } from '../money/money';

/** Part of a charge that falls to one delivery. */
export interface ChargeShare {
  readonly deliveryId: string;
  readonly chargeKind: ChargeKind;
  readonly amount: Money;
}

interface SpreadLine {
  readonly lineId: string;
  readonly invoiceId: string | null;
  readonly chargeKind: ChargeKind;
  readonly amount: Money;
  readonly deliveryIds: readonly string[];
}

interface InvoiceSums {
  readonly charges: Money;
  readonly tax: Money;
}

/**
 * Lays billed charges on the deliveries that they stand on: a line for several in equal parts,
 * an invoice's tax in proportion to the charges. Shares are exact and add up to what was billed;
 * they are rounded only where they are summed for the eye.
 */
export function spreadCharges(
  lines: readonly SpreadLine[],
  invoices: ReadonlyMap<string, InvoiceSums>,
): ChargeShare[] {
  return lines.flatMap((line) => {
    const parts = line.deliveryIds.length;
    if (parts === 0) return [];
    const amount = money(line.amount.dividedBy(parts));
    const sums = line.invoiceId === null ? undefined : invoices.get(line.invoiceId);
    const tax =
      sums && !sums.charges.isZero()
        ? money(amount.times(sums.tax).dividedBy(sums.charges))
        : ZERO_MONEY;
    return line.deliveryIds.flatMap((deliveryId): ChargeShare[] => [
      { deliveryId, chargeKind: line.chargeKind, amount },
      ...(tax.isZero() ? [] : [{ deliveryId, chargeKind: 'tax' as const, amount: tax }]),
    ]);
  });
}

/** The shares' sum, for checks that nothing is lost on the way. */
export function sumOfShares(shares: readonly ChargeShare[]): Money {
  return sumMoney(shares.map((share) => share.amount));
}
