import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { money, moneyText, sumMoney } from '../money/money';
import { spreadCharges, sumOfShares } from './spread';

describe('spreadCharges', () => {
  it('parts a line equally and an invoice’s tax by what it taxes', () => {
    const shares = spreadCharges(
      [
        {
          lineId: 'a',
          invoiceId: 'i',
          chargeKind: 'mix',
          amount: money('100.00'),
          deliveryIds: ['one', 'two'],
        },
      ],
      new Map([['i', { charges: money('200.00'), tax: money('13.00') }]]),
    );
    expect(shares.map((one) => [one.deliveryId, one.chargeKind, moneyText(one.amount)])).toEqual([
      ['one', 'mix', '50.00'],
      ['one', 'tax', '3.25'],
      ['two', 'mix', '50.00'],
      ['two', 'tax', '3.25'],
    ]);
  });

  it('charges nothing for a line without a delivery, and no tax where an invoice has none', () => {
    const line = { lineId: 'a', invoiceId: null, chargeKind: 'waiting', amount: money('9.00') };
    expect(spreadCharges([{ ...line, chargeKind: 'waiting', deliveryIds: [] }], new Map())).toEqual(
      [],
    );
    expect(
      spreadCharges([{ ...line, chargeKind: 'waiting', deliveryIds: ['one'] }], new Map()),
    ).toHaveLength(1);
  });

  it('loses and makes no cent: shares add up to the charges and their tax', () => {
    const cents = fc.integer({ min: 1, max: 5_000_000 });
    fc.assert(
      fc.property(
        fc.array(fc.tuple(cents, fc.integer({ min: 1, max: 9 })), { minLength: 1 }),
        cents,
        (rows, tax) => {
          const lines = rows.map(([amount, parts], index) => ({
            lineId: String(index),
            invoiceId: 'i',
            chargeKind: 'mix' as const,
            amount: money((amount / 100).toFixed(2)),
            deliveryIds: Array.from({ length: parts }, (_, part) => `${index}:${part}`),
          }));
          const charges = sumMoney(lines.map((line) => line.amount));
          const taxed = money((tax / 100).toFixed(2));
          const shares = spreadCharges(lines, new Map([['i', { charges, tax: taxed }]]));
          const off = sumOfShares(shares).minus(charges).minus(taxed).abs();
          expect(off.lt('0.000001')).toBe(true);
        },
      ),
    );
  });
});
