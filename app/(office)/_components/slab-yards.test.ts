import { describe, expect, it } from 'vitest';
import { slabYards, withWaste } from './slab-yards';

describe('slabYards', () => {
  it('is area × thickness in cubic yards', () => {
    // 2,592 ft² at 5 in: 2592 × 5 / 324.
    expect(slabYards('2592', '5')).toBe('40.00');
    expect(slabYards('81', '4')).toBe('1.00');
    expect(slabYards('1,5', '12')).toBe('0.06');
  });
  it('waits for both, and takes nothing that is no number', () => {
    for (const [area, thickness] of [
      ['', '5'],
      ['2592', ''],
      ['abc', '5'],
      ['0', '5'],
      ['-4', '5'],
    ] as const) {
      expect(slabYards(area, thickness)).toBeNull();
    }
  });
});

describe('withWaste', () => {
  it('adds the share', () => {
    expect(withWaste('40', '5')).toBe('42.00');
    expect(withWaste('40', '0')).toBeNull();
  });
});
