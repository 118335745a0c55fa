import { describe, expect, it } from 'vitest';
import { readRowKind } from './row-kind';

const row = {
  hasDate: true,
  hasTicket: false,
  hasQuantity: false,
  hasPrice: false,
  hasMoney: true,
  negative: false,
  inCreditColumn: false,
};

describe('readRowKind', () => {
  it.each([
    ['Previous balance', 'opening'],
    ['Balance forward', 'opening'],
    ['Balance due', 'closing'],
    ['Ending Balance', 'closing'],
    ['Grand total', 'subtotal'],
    ['Job total', 'subtotal'],
    ['TOTAL:', 'subtotal'],
    ['Payment - thank you', 'payment'],
    ['Check #1044', 'payment'],
    ['Credit memo 17', 'credit'],
    ['Prompt payment discount', 'credit'],
    ['Credit card fee', 'line'],
    ['Returned concrete', 'line'],
    ['Sales tax', 'tax'],
    ['Tax exempt delivery fee', 'line'],
    ['Total station rental', 'line'],
  ] as const)('%s is %s', (words, kind) => {
    const rental = words.includes('rental');
    expect(readRowKind({ ...row, hasPrice: rental, words: [words] })).toBe(kind);
  });

  it('never takes a delivery for a total or a payment because of its words', () => {
    const delivery = { ...row, hasTicket: true, hasQuantity: true, hasPrice: true };
    expect(readRowKind({ ...delivery, words: ['Total mix 4000'] })).toBe('line');
    expect(readRowKind({ ...delivery, words: ['Payment Plaza 4000 psi'] })).toBe('line');
  });

  it('takes a negative amount as a credit', () => {
    expect(readRowKind({ ...row, negative: true, words: ['4000 psi'] })).toBe('credit');
  });
});
