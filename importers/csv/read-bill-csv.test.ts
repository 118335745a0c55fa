import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { money, moneyText, sumMoney } from '@/lib/domain/money/money';
import { DIAGNOSTIC_CODE_LIST, type DiagnosticCode } from '../core/codes';
import { EMPTY_COLUMNS, type ImportLayout, importLayoutSchema } from '../core/layout';
import { type BillCsvPreview, billCsvPreviewSchema } from '../core/plan';
import { MAX_BYTES, MAX_ROWS } from './limits';
import { readBillCsv } from './read-bill-csv';

const FIXTURES = path.resolve(import.meta.dirname, '../../tests/fixtures/csv');
const files = readdirSync(FIXTURES).filter((name) => name.endsWith('.csv'));
const NONE: ReadonlySet<string> = new Set();

function readFixture(fileName: string, layout?: ImportLayout): BillCsvPreview {
  const bytes = readFileSync(path.join(FIXTURES, fileName));
  return readBillCsv({ fileName, bytes, existingRowKeys: NONE, ...(layout ? { layout } : {}) });
}

function readText(text: string, existingRowKeys = NONE, layout?: ImportLayout): BillCsvPreview {
  const bytes = new TextEncoder().encode(text);
  return readBillCsv({
    fileName: 'bill.csv',
    bytes,
    existingRowKeys,
    ...(layout ? { layout } : {}),
  });
}

function codes(preview: BillCsvPreview): DiagnosticCode[] {
  return preview.diagnostics.map((found) => found.code);
}

function keys(preview: BillCsvPreview): Set<string> {
  return new Set(
    preview.items.filter((item) => item.action === 'create').map((item) => item.rowKey),
  );
}

/** What a person reviews when a golden file changes. */
function digest(preview: BillCsvPreview) {
  return {
    layout: preview.layout,
    document: preview.document,
    totals: preview.totals,
    items: preview.items.map((item) => ({
      line: item.sourceLine,
      rowKind: item.rowKind,
      chargeKind: item.chargeKind,
      action: item.action,
      ...Object.fromEntries(Object.entries(item.values).filter(([, value]) => value !== null)),
    })),
    diagnostics: preview.diagnostics,
  };
}

/** records = lines + skipped + failed, and every sum is the sum of its items. */
function expectBalanced(preview: BillCsvPreview): void {
  const { totals } = preview;
  expect(totals.records).toBe(totals.lines + totals.skipped + totals.failed);
  const billed = preview.items.filter(
    (item) => item.action === 'create' || item.skipReason === 'alreadyImported',
  );
  const sum = sumMoney(billed.map((item) => money(item.values.amount ?? '0')));
  expect(totals.net).toBe(moneyText(sum));
  expect(new Set(billed.map((item) => item.sourceLine)).size).toBe(totals.lines);
}

describe('statements in many styles', () => {
  it.each(files)('%s reads as its golden file says', async (fileName) => {
    const preview = readFixture(fileName);
    expect(billCsvPreviewSchema.safeParse(preview).success).toBe(true);
    expectBalanced(preview);
    const golden = path.join(FIXTURES, fileName.replace(/\.csv$/, '.expected.json'));
    await expect(`${JSON.stringify(digest(preview), null, 2)}\n`).toMatchFileSnapshot(golden);
  });

  // Added up by hand from the files, not by the importer.
  it.each([
    ['plain-month-first.csv', 9, '3259.75', '205.32', '0.00', '0.00'],
    ['preamble-and-totals.csv', 7, '1957.50', '131.40', '-80.00', '-2410.00'],
    ['semicolon-decimal-comma.csv', 4, '3002.00', '0.00', '0.00', '0.00'],
    ['tabs-utf16le.csv', 4, '3228.75', '0.00', '0.00', '0.00'],
    ['named-months-utf16be.csv', 3, '3287.80', '0.00', '0.00', '0.00'],
    ['bars-signs.csv', 6, '1220.00', '0.00', '-192.00', '-500.00'],
    ['debit-credit-bom.csv', 5, '2112.00', '0.00', '-110.00', '-1500.00'],
    ['no-titles.csv', 5, '3208.75', '0.00', '0.00', '0.00'],
    ['tax-column.csv', 3, '2412.00', '198.00', '0.00', '0.00'],
    ['job-headings-and-pages.csv', 5, '3380.00', '0.00', '0.00', '0.00'],
    ['pump-service.csv', 6, '2086.00', '0.00', '0.00', '0.00'],
    ['day-first.csv', 2, '2240.00', '0.00', '0.00', '0.00'],
    ['no-amount-column.csv', 2, '2731.24', '0.00', '0.00', '0.00'],
  ])('%s: %i lines, charges %s', (fileName, lines, charges, tax, credits, payments) => {
    const preview = readFixture(fileName);
    expect(preview.totals).toMatchObject({ lines, charges, tax, credits, payments, failed: 0 });
    expect(preview.diagnosticCounts.error).toBe(0);
  });

  it('reports the exact line and text of what is wrong', () => {
    for (const fileName of files.filter((name) => name.startsWith('broken'))) {
      const lines = readFileSync(path.join(FIXTURES, fileName), 'utf8').split('\n');
      const placed = readFixture(fileName).diagnostics.filter(({ place }) => place.line !== null);
      expect(placed.length).toBeGreaterThan(0);
      for (const found of placed) {
        expect(lines[(found.place.line ?? 0) - 1]).toContain(found.raw);
        expect(found.place.file).toBe(fileName);
      }
    }
  });
});

describe('the same lines again', () => {
  it('are recognised in the same file', () => {
    for (const fileName of files) {
      const first = readFixture(fileName);
      const bytes = readFileSync(path.join(FIXTURES, fileName));
      const again = readBillCsv({ fileName, bytes, existingRowKeys: keys(first) });
      expect(again.totals.toCreate).toBe(0);
      expect(again.totals.alreadyImported).toBe(first.totals.toCreate);
      expect(again.totals.net).toBe(first.totals.net);
      expectBalanced(again);
    }
  });

  it('are recognised in another export with other columns, dates and numbers', () => {
    const one = readText(
      'Date,Ticket,Description,Qty,Price,Amount\n06/14/26,1,4000 PSI mix,10,158.00,"$1,580.00"\n06/14/26,2,4000 psi mix,4.50,158.00,711.00\n',
    );
    const other = readText(
      'Amount;Ticket no;Item description;Truck;Date;Unit price;Qty\n1580,00;1;4000 PSI  MIX;7;14.06.2026;158,0;10,0\n711,00;2;4000 PSI MIX;9;14.06.2026;158,0;4,5\n948,00;3;4000 PSI MIX;9;14.06.2026;158,0;6\n',
      keys(one),
    );
    expect(other.totals).toMatchObject({ lines: 3, alreadyImported: 2, toCreate: 1 });
    expect(other.items.find((item) => item.action === 'create')?.values.ticketNumber).toBe('3');
  });

  it('are all kept where one file says them twice', () => {
    const twice = 'Date,Ticket,Description,Amount\n06/14/26,1,Fuel,18\n06/14/26,1,Fuel,18\n';
    const first = readText(twice);
    expect(first.totals.toCreate).toBe(2);
    expect(codes(first)).toContain('row.repeated');
    expect(readText(twice, keys(first)).totals.toCreate).toBe(0);
    const once = readText(twice.split('\n').slice(0, 2).join('\n'));
    expect(readText(twice, keys(once)).totals).toMatchObject({ alreadyImported: 1, toCreate: 1 });
  });

  it('differ where only job or price differ: no charge is lost', () => {
    const head = 'Date,Job,Description,Price,Amount\n';
    const first = readText(`${head}06/14/26,Harbor Lofts,Dispatch fee,25,25\n`);
    const other = readText(`${head}06/14/26,Mill Street,Dispatch fee,25,25\n`, keys(first));
    expect(other.totals.toCreate).toBe(1);
  });
});

describe('a layout set by a person or remembered', () => {
  const text = 'Date,Ticket,Description,Qty,Price,Amount\n03/04/26,1,4000 PSI mix,10,158,1580\n';

  it('is what the preview gives back, and gives the same plan', () => {
    for (const fileName of files) {
      const first = readFixture(fileName);
      const layout = importLayoutSchema.parse(JSON.parse(JSON.stringify(first.layout)));
      const again = readFixture(fileName, layout);
      expect(again.layout).toEqual(first.layout);
      expect(again.items).toEqual(first.items);
      expect(codes(again)).not.toContain('mapping.guessed');
    }
  });

  it('finds the remembered titles below a longer preamble', () => {
    const { layout } = readText(text);
    const moved = readText(`Quarry Bend Ready Mix\nStatement,12\n\n${text}`, NONE, layout);
    expect(moved.layout.headerRow).toBe(4);
    expect(moved.columns[5]).toMatchObject({ field: 'amount', confidence: 'confirmed' });
  });

  it('is not trusted where the titles have changed', () => {
    const { layout } = readText(text);
    const swapped = readText(
      'Ticket,Date,Description,Price,Qty,Amount\n1,03/04/26,4000 PSI mix,158,10,1580\n',
      NONE,
      layout,
    );
    expect(codes(swapped)).toContain('layout.headerChanged');
    expect(swapped.items[0]?.values).toMatchObject({ ticketNumber: '1', quantity: '10' });
  });

  it('obeys corrected columns, date order and title row', () => {
    const { layout } = readText(text);
    const corrected: ImportLayout = {
      ...layout,
      dateOrder: 'DMY',
      columns: { ...layout.columns, ticketNumber: null, invoiceNumber: 1 },
    };
    const [item] = readText(text, NONE, corrected).items;
    expect(item?.values).toMatchObject({
      date: '2026-04-03',
      ticketNumber: null,
      invoiceNumber: '1',
    });
    const untitled = readText(text, NONE, { ...layout, headerRow: null, headerSignature: null });
    expect(untitled.layout.headerRow).toBeNull();
  });

  it('guesses the columns again where all are null', () => {
    const { layout } = readText(text);
    const wrong: ImportLayout = {
      ...layout,
      delimiter: ';',
      headerSignature: null,
      columns: EMPTY_COLUMNS,
    };
    expect(readText(text, NONE, wrong).totals.toCreate).toBe(0);
    const right: ImportLayout = { ...wrong, delimiter: ',' };
    expect(readText(text, NONE, right).layout.columns).toEqual(layout.columns);
  });

  it('names columns that the file does not have', () => {
    const { layout } = readText(text);
    const outside = { ...layout, columns: { ...layout.columns, truck: 40 } };
    expect(codes(readText(text, NONE, outside))).toContain('layout.columnOutside');
  });
});

const ascii = (text: string) => new TextEncoder().encode(text);
const HEAD = 'Date,Ticket,Description,Amount\n';

/** Inputs that are refused or reported as a whole, each with the code that says so. */
const WHOLE_FILES: readonly [string, Uint8Array, DiagnosticCode, string][] = [
  ['an empty file', ascii(''), 'file.empty', 'empty'],
  ['blank lines', ascii('\n \n\r\n'), 'file.empty', 'blank'],
  ['a PDF', ascii('%PDF-1.7\n'), 'file.notText', 'PDF'],
  ['a workbook', ascii('PK\u0003\u0004......xl/workbook.xml'), 'file.notText', 'xlsx'],
  ['a PNG', new Uint8Array([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10]), 'file.notText', 'PNG'],
  ['a JPEG', new Uint8Array([0xff, 0xd8, 0xff, 0xe0, 0, 16]), 'file.notText', 'JPEG'],
  ['a gzip', gzipSync(ascii(HEAD)), 'file.notText', 'gzip'],
  ['a web page', ascii('<!DOCTYPE html><table>'), 'file.notText', 'web page'],
  ['unknown bytes', new Uint8Array([1, 2, 0, 4, 5, 0, 0, 9, 0, 0, 0]), 'file.notText', 'unknown'],
  ['too many bytes', new Uint8Array(MAX_BYTES + 1).fill(65), 'file.tooLarge', 'larger'],
  ['too many rows', ascii(HEAD + '06/14/26,1,x,1\n'.repeat(MAX_ROWS)), 'file.tooManyRows', '20000'],
  ['too many columns', ascii(`${HEAD}${'x,'.repeat(80)}\n`), 'file.tooManyColumns', '81'],
  ['one column', ascii('hello\nworld\n'), 'file.oneColumn', 'separates'],
  ['titles only', ascii(HEAD), 'file.noLines', 'No row'],
];

/** Small texts for codes that no file of the fixtures shows. */
const SMALL_TEXTS: readonly [DiagnosticCode, string][] = [
  ['cell.tooLong', `${HEAD}06/14/26,1,${'x'.repeat(2001)},5\n06/14/26,2,Fuel,5\n`],
  ['mapping.amountMissing', 'Date,Ticket,Description\n06/14/26,1,4000 psi\n06/14/26,2,4000 psi\n'],
  ['mapping.dateMissing', 'Ticket,Description,Amount\n1,4000 psi,1580.00\n'],
  ['mapping.descriptionMissing', 'Date,Ticket,Amount\n06/14/26,1,1580.00\n'],
  ['number.markGuessed', 'Date,Ticket,Description,Amount\n06/14/26,1,4000 psi,"1,580"\n'],
  [
    'line.taxIncludedGuessed',
    'Date,Ticket,Description,Amount,Tax\n06/14/26,1,4000 psi,1580.00,130.35\n',
  ],
  ['file.delimiterGuessed', '06/14/26,1;18\n06/15/26,2;18\n'],
];

describe('files that cannot be read as they are', () => {
  it.each(WHOLE_FILES)('%s gets a clear answer', (_name, bytes, code, word) => {
    const preview = readBillCsv({ fileName: 'x.csv', bytes, existingRowKeys: NONE });
    const found = preview.diagnostics.find((diagnostic) => diagnostic.code === code);
    expect(`${found?.sentence} ${found?.got}`).toContain(word);
    expect(found?.hint).toBeTruthy();
    expect(preview.totals.toCreate).toBe(0);
    expectBalanced(preview);
  });

  it.each(SMALL_TEXTS)('%s is said', (code, text) => {
    const preview = readText(text);
    expect(codes(preview)).toContain(code);
    expectBalanced(preview);
  });

  it('says which characters it could not read', () => {
    const bytes = new Uint8Array([...ascii(`${HEAD}06/14/26,1,Caf`), 0xe9, ...ascii(' mix,5\n')]);
    const { layout } = readText(`${HEAD}06/14/26,1,mix,5\n`);
    const preview = readBillCsv({ fileName: 'x.csv', bytes, layout, existingRowKeys: NONE });
    expect(codes(preview)).toContain('file.badBytes');
    const guessed = readBillCsv({ fileName: 'x.csv', bytes, existingRowKeys: NONE });
    expect(guessed.items[0]?.values.description).toBe('Café mix');
  });

  it('lists so many and counts the rest', () => {
    const preview = readText(`${HEAD}${'06/14/26,1,mix,x\n'.repeat(150)}06/14/26,1,mix,5\n`);
    expect(preview.diagnosticCounts.error).toBe(150);
    expect(preview.diagnostics.filter((found) => found.severity === 'error')).toHaveLength(100);
    expect(preview.moreDiagnostics).toBe(50);
    expect(preview.totals.failed).toBe(150);
  });
});

it('every code of the catalogue is given by some input', () => {
  const { layout } = readText(`${HEAD}06/14/26,1,mix,5\n`);
  const latin = new Uint8Array([...ascii(`${HEAD}06/14/26,1,Caf`), 0xe9, ...ascii(' mix,5\n')]);
  const other = 'Ticket,Date,Charge,Amount\n1,06/14/26,mix,5\n';
  const outside = { ...layout, columns: { ...layout.columns, truck: 40 } };
  const line = `${HEAD}06/14/26,1,mix,5\n`;
  const previews = [
    ...files.map((fileName) => readFixture(fileName)),
    ...WHOLE_FILES.map(([fileName, bytes]) =>
      readBillCsv({ fileName, bytes, existingRowKeys: NONE }),
    ),
    ...SMALL_TEXTS.map(([, text]) => readText(text)),
    readBillCsv({ fileName: 'latin.csv', bytes: latin, layout, existingRowKeys: NONE }),
    readText(other, NONE, layout),
    readText(line, NONE, outside),
    readText(line, keys(readText(line))),
  ];
  const given = new Set(previews.flatMap(codes));
  expect(DIAGNOSTIC_CODE_LIST.filter((code) => !given.has(code))).toEqual([]);
});

describe('any input', () => {
  const readBytes = (bytes: Uint8Array) =>
    readBillCsv({ fileName: 'any.csv', bytes, existingRowKeys: NONE });

  it('never throws on any bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), (bytes) => expectBalanced(readBytes(bytes))),
      { numRuns: 500 },
    );
  });

  it('never throws on a fixture with bytes changed, and accounts for every record', () => {
    const edits = fc.array(fc.tuple(fc.nat(), fc.integer({ min: 0, max: 255 })), { maxLength: 12 });
    fc.assert(
      fc.property(fc.constantFrom(...files), edits, (fileName, changes) => {
        const bytes = new Uint8Array(readFileSync(path.join(FIXTURES, fileName)));
        for (const [at, value] of changes) bytes[at % bytes.length] = value;
        const preview = readBytes(bytes);
        expectBalanced(preview);
        expect(billCsvPreviewSchema.safeParse(preview).success).toBe(true);
      }),
      { numRuns: 400 },
    );
  });

  it('accounts for every record of a soup of cells', () => {
    const cell = fc.constantFrom(
      '',
      '06/14/26',
      '4000 psi',
      'Total',
      'Payment',
      '12.00CR',
      '(5)',
      '"',
      '1.234,5',
      'Balance due',
      'Date',
      'Amount',
      'Ticket',
      '40213',
      '9'.repeat(30),
      '1e9',
    );
    const table = fc.array(fc.array(cell, { maxLength: 9 }), { maxLength: 25 });
    fc.assert(
      fc.property(table, fc.constantFrom(',', ';', '\t', '|'), (rows, delimiter) => {
        const preview = readText(rows.map((row) => row.join(delimiter)).join('\n'));
        expectBalanced(preview);
        expect(new Set(preview.items.map((item) => item.rowKey)).size).toBe(preview.items.length);
      }),
      { numRuns: 500 },
    );
  });

  it('gives the same plan for the same bytes', () => {
    for (const fileName of files) expect(readFixture(fileName)).toEqual(readFixture(fileName));
  });
});
