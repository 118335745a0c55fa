import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { detectDateOrder, readDate } from './read-date';

describe('readDate', () => {
  it.each([
    ['06/14/26'],
    ['6/14/2026'],
    ['06-14-2026'],
    ['2026-06-14'],
    ['2026/6/14'],
    ['20260614'],
    ['14-JUN-2026'],
    ['14 June 2026'],
    ['14-Jun-26'],
    ['Jun 14, 2026'],
    ['June 14 2026'],
    ['Sun Jun 14, 2026'],
    ['6/14/2026 12:00:00 AM'],
    ['2026-06-14T00:00:00'],
    ['2026-06-14T00:00:00.000Z'],
  ])('reads %s', (cell) => expect(readDate(cell, 'MDY')).toBe('2026-06-14'));

  it('obeys the order', () => {
    expect(readDate('03/04/26', 'MDY')).toBe('2026-03-04');
    expect(readDate('03/04/26', 'DMY')).toBe('2026-04-03');
    expect(readDate('26/04/03', 'YMD')).toBe('2026-04-03');
  });

  it.each([
    '',
    '06/31/26',
    '2026-02-29',
    '13/13/2026',
    '40213',
    '1,580.00',
    'soon',
    '00/10/2026',
    '6/14',
    '6-14/26',
    '14-XYZ-2026',
    '06/14/1785',
  ])('refuses %j', (cell) => {
    expect(readDate(cell, 'MDY')).toBeNull();
    expect(readDate(cell, 'DMY')).toBeNull();
  });

  it('reads back every day in every style', () => {
    const day = fc.date({
      min: new Date('2000-01-01'),
      max: new Date('2079-12-31'),
      noInvalidDate: true,
    });
    fc.assert(
      fc.property(day, (date) => {
        const iso = date.toISOString().slice(0, 10);
        const [year = '', month = '', dayOfMonth = ''] = iso.split('-');
        const name = date.toLocaleString('en-US', { month: 'short', timeZone: 'UTC' });
        expect(readDate(`${month}/${dayOfMonth}/${year.slice(2)}`, 'MDY')).toBe(iso);
        expect(readDate(`${dayOfMonth}.${month}.${year}`, 'DMY')).toBe(iso);
        expect(readDate(`${dayOfMonth}-${name.toUpperCase()}-${year}`, 'DMY')).toBe(iso);
        expect(readDate(`${name} ${Number(dayOfMonth)}, ${year}`, 'MDY')).toBe(iso);
      }),
    );
  });
});

describe('detectDateOrder', () => {
  it('is decided by one number above twelve', () => {
    expect(detectDateOrder(['06/01/26', '06/14/26'])).toMatchObject({
      order: 'MDY',
      ambiguous: false,
    });
    expect(detectDateOrder(['01/06/26', '14/06/26'])).toMatchObject({
      order: 'DMY',
      ambiguous: false,
    });
  });

  it("lets the document's own period bear witness", () => {
    const guess = detectDateOrder(['06/01/26', '06/02/26'], ['06/30/26']);
    expect(guess).toMatchObject({ order: 'MDY', ambiguous: false });
  });

  it('says that it guesses where both orders are possible', () => {
    expect(detectDateOrder(['06/01/26', '06/02/26'])).toMatchObject({
      order: 'MDY',
      ambiguous: true,
    });
    expect(detectDateOrder(['01/06/26', '02/06/26'])).toMatchObject({
      order: 'DMY',
      ambiguous: true,
    });
  });

  it('does not call it a guess where both orders give the same days', () => {
    expect(detectDateOrder(['06/06/26', '2026-06-14'])).toMatchObject({ ambiguous: false });
  });

  it('says so where the column contradicts itself', () => {
    expect(detectDateOrder(['06/14/26', '06/15/26', '16/06/26'])).toMatchObject({
      order: 'MDY',
      mixed: true,
    });
  });
});
