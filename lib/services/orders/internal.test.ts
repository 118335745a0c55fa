import { describe, expect, it } from 'vitest';
import { lineInWords, nextOrderNumber } from './internal';

describe('nextOrderNumber', () => {
  it('counts on from the highest number, keeping its letters and its zeros', () => {
    expect(nextOrderNumber(['CR-1187', 'CR-1201', 'CR-0999'])).toBe('CR-1202');
    expect(nextOrderNumber(['A-0099'])).toBe('A-0100');
    expect(nextOrderNumber(['A-1', 'B-7', 'no digits'])).toBe('B-8');
  });
  it('begins a series, and goes past a number that was taken meanwhile', () => {
    expect(nextOrderNumber([])).toBe('P-1001');
    expect(nextOrderNumber(['P-1001'], 2)).toBe('P-1004');
  });
});

describe('lineInWords', () => {
  it('says how much of what', () => {
    const line = { code: '4000P', description: '', quantity: '42', unit: 'yd³' };
    expect(lineInWords(line)).toBe('42.00 yd³ of 4000P');
    expect(lineInWords({ ...line, description: 'pump mix' })).toBe('42.00 yd³ of 4000P, pump mix');
  });
});
