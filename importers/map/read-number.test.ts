import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { detectDecimalMark, readNumber } from './read-number';

const text = (cell: string, mark: '.' | ',' = '.') => {
  const read = readNumber(cell, mark);
  return read.kind === 'number' ? read.text : read.kind;
};

describe('readNumber', () => {
  it.each([
    ['$1,234.50', '1234.50'],
    ['(12.00)', '-12.00'],
    ['($1,250.00)', '-1250.00'],
    ['12.00-', '-12.00'],
    ['12.00CR', '-12.00'],
    ['12.00 cr', '-12.00'],
    ['12.00 DR', '12.00'],
    ['-$5.25', '-5.25'],
    ['$-5.25', '-5.25'],
    ['$ (7.10)', '-7.10'],
    ['\u22125.00', '-5.00'],
    ['USD 99.95', '99.95'],
    ['+3', '3'],
    ['.50', '0.50'],
    ['0012.5', '12.5'],
    ['1 234.50', '1234.50'],
    ['-0.00', '0.00'],
  ])('reads %s as %s', (cell, expected) => expect(text(cell)).toBe(expected));

  it.each([
    ['1.234,50', '1234.50'],
    ['1.580,00 €', '1580.00'],
    ['12,5', '12.5'],
    ["1'234,50", '1234.50'],
  ])('reads %s with a decimal comma as %s', (cell, expected) =>
    expect(text(cell, ',')).toBe(expected),
  );

  it.each(['', ' ', '-', '—', 'n/a', '$ -', '$'])('takes %j as blank', (cell) =>
    expect(text(cell)).toBe('blank'),
  );

  it.each(['1.234,50', '12,34.5', '1,23', 'abc', '12.00x9', '1.2.3', '4.02E+11', '--5', '1e400'])(
    'refuses %s rather than guess',
    (cell) => expect(text(cell)).toBe('unreadable'),
  );

  it('keeps the unit that stands behind a quantity', () => {
    expect(readNumber('10.00 CY', '.')).toEqual({ kind: 'number', text: '10.00', unit: 'CY' });
  });

  it('reads back every amount in each of the styles', () => {
    const cents = fc.integer({ min: -99_999_999, max: 99_999_999 });
    fc.assert(
      fc.property(cents, (value) => {
        const whole = Math.floor(Math.abs(value) / 100);
        const rest = String(Math.abs(value) % 100).padStart(2, '0');
        const grouped = whole.toLocaleString('en-US');
        const expected = value === 0 ? '0.00' : `${value < 0 ? '-' : ''}${whole}.${rest}`;
        const us = `$${grouped}.${rest}`;
        const eu = `${grouped.replaceAll(',', '.')},${rest}`;
        const styles = value < 0 ? [`(${us})`, `${us}-`, `${us}CR`, `-${us}`] : [us, ` ${us} `];
        for (const style of styles) expect(text(style)).toBe(expected);
        expect(text(value < 0 ? `-${eu}` : eu, ',')).toBe(expected);
      }),
    );
  });
});

describe('detectDecimalMark', () => {
  it('takes what the cells prove', () => {
    expect(detectDecimalMark(['1,234.50', '8', '1,000'])).toMatchObject({
      mark: '.',
      ambiguous: false,
    });
    expect(detectDecimalMark(['1.234,50', '1.000'])).toMatchObject({ mark: ',', ambiguous: false });
  });

  it('says so where nothing decides', () => {
    expect(detectDecimalMark(['1,234', '5,000'])).toMatchObject({ mark: '.', ambiguous: true });
    expect(detectDecimalMark(['12', '7'])).toMatchObject({ mark: '.', ambiguous: false });
  });
});
