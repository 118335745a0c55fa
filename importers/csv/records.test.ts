import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DELIMITERS } from '../core/layout';
import { splitRecords } from './records';

describe('splitRecords', () => {
  it('keeps physical lines across cells that hold line breaks', () => {
    const { records } = splitRecords('a,b\n"x\ny",2\nc,d\n', ',', 100);
    expect(records.map((record) => [record.line, record.cells])).toEqual([
      [1, ['a', 'b']],
      [2, ['x\ny', '2']],
      [4, ['c', 'd']],
    ]);
  });

  it('loses one line to a quote that is never closed', () => {
    const { records } = splitRecords('a,b\n1,"two\n3,4\n5,"six"\n', ',', 100);
    expect(records.map((record) => record.problem)).toEqual([null, 'unbalancedQuote', null, null]);
    expect(records[3]?.cells).toEqual(['5', 'six']);
  });

  it('keeps a quotation mark inside a quoted cell, and says so', () => {
    const { records } = splitRecords('1,"3/4" stone",2\n', ',', 100);
    expect(records).toMatchObject([{ cells: ['1', '3/4" stone', '2'], problem: 'strayQuote' }]);
  });

  it('says that it was cut', () => {
    expect(splitRecords('1\n2\n3', ',', 2)).toMatchObject({ cut: true });
    expect(splitRecords('1\n2\n', ',', 2)).toMatchObject({ cut: false });
  });

  it('reads back any table that is written with quotation marks', () => {
    const cell = fc.string({
      unit: fc.constantFrom('a', '"', ',', ';', '\t', '|', ' ', '\n', '7'),
    });
    const table = fc.array(fc.array(cell, { minLength: 2, maxLength: 4 }), {
      minLength: 1,
      maxLength: 6,
    });
    const short = table.filter((rows) => rows.every((row) => row.join('').split('\n').length < 20));
    fc.assert(
      fc.property(short, fc.constantFrom(...DELIMITERS), (rows, delimiter) => {
        const text = rows
          .map((row) => row.map((value) => `"${value.replaceAll('"', '""')}"`).join(delimiter))
          .join('\n');
        const { records } = splitRecords(text, delimiter, 1000);
        expect(records.map((record) => record.cells)).toEqual(rows);
      }),
    );
  });

  it('covers every physical line of any text once, with its raw text', () => {
    const soup = fc.string({
      unit: fc.constantFrom('a', '"', ',', '\n', ' ', '1'),
      maxLength: 200,
    });
    fc.assert(
      fc.property(soup, (text) => {
        const lines = text.split('\n');
        if (lines.at(-1) === '') lines.pop();
        const { records } = splitRecords(text, ',', 1000);
        expect(records.flatMap((record) => record.raw.split('\n'))).toEqual(lines);
        for (const record of records) {
          expect(lines[record.line - 1]).toBe(record.raw.split('\n')[0]);
        }
      }),
    );
  });
});
