import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  ageText,
  clockFigure,
  clockOfMoment,
  dayOfMoment,
  dayText,
  dayWithoutYear,
  decimalFigure,
  differenceFigure,
  durationText,
  momentText,
  moneyFigure,
  percentFigure,
  periodText,
  rateFigure,
  signOf,
  weekdayText,
  yardsFigure,
  yardsWithUnit,
} from './format';

describe('figures', () => {
  it.each([
    ['1234.5', '$1,234.50'],
    ['0', '$0.00'],
    ['-12', '−$12.00'],
    ['999999999999.99', '$999,999,999,999.99'],
    ['1000', '$1,000.00'],
    ['0.005', '$0.01'],
    ['-0.005', '−$0.01'],
    ['0.0049', '$0.00'],
    ['-0.0049', '$0.00'],
    ['99.995', '$100.00'],
    ['007.10', '$7.10'],
    ['+3', '$3.00'],
  ])('money %s is written %s', (text, written) => {
    expect(moneyFigure(text)).toBe(written);
  });

  it.each([
    ['158', '$158.00'],
    ['2.25', '$2.25'],
    ['2.2575', '$2.2575'],
    ['2.257', '$2.257'],
    ['2.2500', '$2.25'],
    ['1200.5', '$1,200.50'],
    ['-0.125', '−$0.125'],
  ])('a rate of %s is written %s', (text, written) => {
    expect(rateFigure(text)).toBe(written);
  });

  it.each([
    ['10.5', '10.50'],
    ['0.125', '0.13'],
    ['1234', '1,234.00'],
  ])('%s yards are written %s', (text, written) => {
    expect(yardsFigure(text)).toBe(written);
  });

  it('names the unit where no column head does', () => {
    expect(yardsWithUnit('39.5')).toBe('39.50 yd³');
  });

  it.each([
    ['103.5', '+103.50', 'positive'],
    ['-12', '−12.00', 'negative'],
    ['0', '0.00', 'zero'],
    ['-0.00', '0.00', 'zero'],
    ['0.004', '0.00', 'zero'],
    ['-1264', '−1,264.00', 'negative'],
  ])('a difference of %s is written %s and is %s', (text, written, sign) => {
    expect(differenceFigure(text)).toBe(written);
    expect(signOf(text)).toBe(sign);
  });

  it.each([
    ['0.0725', 2, '7.25%'],
    ['0.5', 0, '50%'],
    ['1', 0, '100%'],
    ['-0.031', 1, '−3.1%'],
    ['12.5', 0, '1,250%'],
  ] as const)('a share of %s to %i places is %s', (text, places, written) => {
    expect(percentFigure(text, places)).toBe(written);
  });

  it.each(['', 'abc', '1e5', '1,000', '1.', '.5', 'NaN', '--1', '1.2.3', 'Infinity'])(
    'refuses %j, which is no plain decimal',
    (text) => {
      expect(() => moneyFigure(text)).toThrow(/not a decimal/);
    },
  );

  it('keeps every digit of amounts that a binary float cannot hold', () => {
    expect(moneyFigure('1234567890123456.78')).toBe('$1,234,567,890,123,456.78');
  });

  it('says the same amount as the text it was given, grouped in threes', () => {
    const cents = fc.bigInt({ min: -(10n ** 18n), max: 10n ** 18n });
    fc.assert(
      fc.property(cents, (value) => {
        const digits = (value < 0n ? -value : value).toString().padStart(3, '0');
        const text = `${value < 0n ? '-' : ''}${digits.slice(0, -2)}.${digits.slice(-2)}`;
        const written = decimalFigure(text);
        expect(written.replaceAll(',', '').replace('−', '-')).toBe(text);
        expect(written.replace('−', '')).toMatch(/^\d{1,3}(,\d{3})*\.\d{2}$/);
      }),
    );
  });
});

describe('days', () => {
  it('are unambiguous', () => {
    expect(dayText('2026-06-14')).toBe('14 Jun 2026');
    expect(dayText('2026-01-02', 'es')).toBe('2 ene 2026');
    expect(dayWithoutYear('2026-09-03')).toBe('3 Sep');
  });

  it('carry their weekday where people go by it', () => {
    expect(weekdayText('2026-09-03')).toBe('Thu 3 Sep');
    expect(weekdayText('2028-02-29')).toBe('Tue 29 Feb');
    expect(weekdayText('2026-06-14', 'es')).toBe('dom 14 jun');
  });

  it('refuse what is no day', () => {
    expect(() => dayText('14/06/2026')).toThrow(/not a day/);
    expect(() => dayText('2026-13-01')).toThrow(/not a month/);
  });

  it.each([
    ['2026-09-01', '2026-09-30', '1–30 Sep 2026'],
    ['2026-08-28', '2026-09-27', '28 Aug – 27 Sep 2026'],
    ['2025-12-28', '2026-01-27', '28 Dec 2025 – 27 Jan 2026'],
    ['2026-09-03', '2026-09-03', '3 Sep 2026'],
  ])('from %s to %s is %s', (from, to, written) => {
    expect(periodText(from, to)).toBe(written);
  });
});

describe('times', () => {
  it.each([
    [0, '00:00', '12:00 am'],
    [446, '07:26', '7:26 am'],
    [720, '12:00', '12:00 pm'],
    [779, '12:59', '12:59 pm'],
    [780, '13:00', '1:00 pm'],
    [1439, '23:59', '11:59 pm'],
    [1450, '00:10', '12:10 am'],
  ])('minute %i is %s or %s', (minutes, of24, of12) => {
    expect(clockFigure(minutes, '24')).toBe(of24);
    expect(clockFigure(minutes, '12')).toBe(of12);
  });

  it('are the company’s own, on both sides of the change to summer time', () => {
    const chicago = { timeZone: 'America/Chicago', clock: '12' } as const;
    expect(momentText('2026-06-14T12:26:00Z', chicago)).toBe('14 Jun 2026, 7:26 am');
    expect(momentText('2026-12-14T12:26:00Z', chicago)).toBe('14 Dec 2026, 6:26 am');
    expect(momentText('2026-06-14T03:05:00Z', { ...chicago, clock: '24' })).toBe(
      '13 Jun 2026, 22:05',
    );
    expect(momentText('2026-06-14T05:00:00Z', { ...chicago, clock: '24' })).toBe(
      '14 Jun 2026, 00:00',
    );
    expect(dayOfMoment('2026-06-14T03:05:00Z', 'America/Chicago')).toBe('2026-06-13');
    expect(dayOfMoment('2026-06-14T03:05:00Z', 'UTC')).toBe('2026-06-14');
    expect(clockOfMoment('2026-06-14T12:26:00Z', chicago)).toBe('7:26 am');
  });

  it.each([
    [0, '0 min'],
    [46, '46 min'],
    [60, '1 h'],
    [135, '2 h 15 min'],
  ])('%i minutes last %s', (minutes, written) => {
    expect(durationText(minutes)).toBe(written);
  });

  it.each([
    ['2026-06-14T12:00:30Z', 'just now', 'hace un momento'],
    ['2026-06-14T11:59:00Z', '2 minutes ago', 'hace 2 minutos'],
    ['2026-06-14T11:00:00Z', '1 hour ago', 'hace 1 hora'],
    ['2026-06-13T11:00:00Z', '1 day ago', 'hace 1 día'],
    ['2026-06-01T12:00:00Z', '13 days ago', 'hace 13 días'],
    ['2026-06-14T12:05:00Z', 'just now', 'hace un momento'],
  ])('%s was %s', (moment, en, es) => {
    expect(ageText(moment, '2026-06-14T12:01:00Z')).toBe(en);
    expect(ageText(moment, '2026-06-14T12:01:00Z', 'es')).toBe(es);
  });
});
