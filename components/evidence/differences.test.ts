import { describe, expect, it } from 'vitest';
import { fieldDifferences } from './differences';

describe('fieldDifferences', () => {
  it('names nested fields by their path and leaves out what stayed', () => {
    const before = {
      name: 'Bluestem',
      clock: '12',
      tolerances: { taxWrong: { absolute: '1.00' } },
    };
    const after = { name: 'Bluestem', clock: '24', tolerances: { taxWrong: { absolute: '2.00' } } };
    expect(fieldDifferences(before, after)).toEqual([
      { path: 'clock', before: '12', after: '24' },
      { path: 'tolerances.taxWrong.absolute', before: '1.00', after: '2.00' },
    ]);
  });

  it('shows a new record’s fields and a removed record’s fields', () => {
    expect(fieldDifferences(null, { name: 'Ruth', note: '' })).toEqual([
      { path: 'name', before: null, after: 'Ruth' },
    ]);
    expect(fieldDifferences({ role: 'owner' }, null)).toEqual([
      { path: 'role', before: 'owner', after: null },
    ]);
  });

  it('follows lists by position and keeps false and zero apart from nothing', () => {
    expect(fieldDifferences({ lines: [{ qty: 1 }] }, { lines: [{ qty: 1 }, { qty: 0 }] })).toEqual([
      { path: 'lines.1.qty', before: null, after: '0' },
    ]);
    expect(fieldDifferences({ on: false }, { on: null })).toEqual([
      { path: 'on', before: 'false', after: null },
    ]);
  });

  it('finds nothing between equal versions, absent ones and plain values without a name', () => {
    expect(fieldDifferences({ a: 1, b: [] }, { a: 1 })).toEqual([]);
    expect(fieldDifferences(null, undefined)).toEqual([]);
  });
});
