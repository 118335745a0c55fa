import type { DiagnosticCollector } from '../core/diagnostic';
import {
  type ColumnMapping,
  type DateOrder,
  type DecimalMark,
  type Delimiter,
  type Encoding,
  type ImportLayout,
  TARGET_FIELDS,
  type TargetField,
} from '../core/layout';
import { preambleDates } from '../map/document-facts';
import { type ColumnGuess, fieldLabel, guessColumns, mappingOf } from '../map/guess-columns';
import {
  findHeader,
  findHeaderBySignature,
  firstDataRow,
  headerSignature,
} from '../map/header-row';
import { detectDateOrder } from '../map/read-date';
import { detectDecimalMark, looksNumeric } from '../map/read-number';
import { columnTitle } from '../map/row-cells';
import type { SourceRecord } from './records';

/** How the file is read, and where its parts begin. */
export interface SettledLayout {
  readonly layout: ImportLayout;
  readonly titles: readonly string[];
  readonly columnCount: number;
  readonly preamble: readonly SourceRecord[];
  readonly body: readonly SourceRecord[];
  readonly guesses: readonly ColumnGuess[];
}

export interface LayoutInput {
  readonly records: readonly SourceRecord[];
  readonly encoding: Encoding;
  readonly delimiter: Delimiter;
  /** What a person confirmed or what is remembered for the supplier. */
  readonly given: ImportLayout | null;
}

interface Header {
  /** Index of the title row; null where there is none. */
  readonly index: number | null;
  readonly bodyStart: number;
  /** True where the given layout's columns fit this file. */
  readonly givenFits: boolean;
}

const SAMPLE_ROWS = 200;

function locateHeader(input: LayoutInput, collector: DiagnosticCollector): Header {
  const cells = input.records.map((record) => record.cells);
  const { given } = input;
  if (given !== null && given.headerSignature !== null) {
    const index = findHeaderBySignature(cells, given.headerSignature);
    if (index !== null) return { index, bodyStart: index + 1, givenFits: true };
    collector.add({
      code: 'layout.headerChanged',
      severity: 'warning',
      expected: given.headerSignature,
      sentence: 'The column titles are not those remembered for this supplier.',
      hint: 'The columns were guessed anew: check each of them.',
    });
  } else if (given !== null) {
    const index = input.records.findIndex((record) => record.line === given.headerRow);
    if (index !== -1) return { index, bodyStart: index + 1, givenFits: true };
    if (given.headerRow === null) {
      return { index: null, bodyStart: firstDataRow(cells), givenFits: true };
    }
  }
  const index = findHeader(cells);
  if (index !== null) return { index, bodyStart: index + 1, givenFits: false };
  collector.add({
    code: 'header.notFound',
    severity: 'guess',
    sentence: 'The file has no row of column titles that we know; columns were told by content.',
    hint: 'Check each column, or say which line holds the titles.',
  });
  return { index: null, bodyStart: firstDataRow(cells), givenFits: false };
}

/** Columns: those of the titles, or without titles as many as most rows have. */
function countColumns(titles: readonly string[], body: readonly SourceRecord[]): number {
  const last = titles.findLastIndex((title) => title.trim() !== '');
  if (last !== -1) return last + 1;
  const counts = new Map<number, number>();
  for (const record of body.slice(0, SAMPLE_ROWS)) {
    const width = record.cells.findLastIndex((cell) => cell.trim() !== '') + 1;
    counts.set(width, (counts.get(width) ?? 0) + 1);
  }
  const [usual] = [...counts].sort((left, right) => right[1] - left[1] || right[0] - left[0]);
  return usual?.[0] ?? 0;
}

function settleMark(
  rows: readonly (readonly string[])[],
  collector: DiagnosticCollector,
): DecimalMark {
  const cells = rows.flatMap((row) =>
    row.filter((cell) => /[.,]/.test(cell) && looksNumeric(cell)),
  );
  const guess = detectDecimalMark(cells);
  const mixed = guess.pointVotes > 0 && guess.commaVotes > 0;
  if (guess.ambiguous || mixed) {
    const [sample = ''] = cells;
    collector.add({
      code: 'number.markGuessed',
      severity: mixed ? 'warning' : 'guess',
      raw: sample,
      expected: guess.mark === '.' ? 'decimal point' : 'decimal comma',
      sentence: `Numbers such as “${sample}” are read with a decimal ${guess.mark === '.' ? 'point' : 'comma'}.`,
      hint: 'Change the number style if amounts look a thousand times too large or too small.',
    });
  }
  return guess.mark;
}

function settleDates(
  body: readonly SourceRecord[],
  preamble: readonly SourceRecord[],
  column: number | null,
  title: string,
  collector: DiagnosticCollector,
): DateOrder {
  if (column === null) return 'MDY';
  const cells = body.map((record) => record.cells[column] ?? '').filter((cell) => cell !== '');
  const witnesses = preamble.map((record) => record.cells.map((cell) => cell.slice(0, 200)));
  const guess = detectDateOrder(cells, preambleDates(witnesses));
  if (!guess.ambiguous && !guess.mixed) return guess.order;
  const words = { MDY: 'month first', DMY: 'day first', YMD: 'year first' }[guess.order];
  collector.add({
    code: guess.mixed ? 'date.orderMixed' : 'date.orderGuessed',
    severity: guess.mixed ? 'warning' : 'guess',
    column: title,
    columnIndex: column,
    raw: cells[0] ?? '',
    expected: words,
    sentence: guess.mixed
      ? `Some dates can only be month first and others only day first; they are read ${words}.`
      : `Dates such as “${cells[0] ?? ''}” are read ${words}: ${guess.why}.`,
    hint: 'Check a date that you know, and change the order if it is wrong.',
  });
  return guess.order;
}

function observeGuesses(
  guesses: readonly ColumnGuess[],
  titles: readonly string[],
  collector: DiagnosticCollector,
): void {
  for (const guess of guesses) {
    if (guess.confidence === 'certain' || guess.confidence === 'confirmed') continue;
    const column = columnTitle({ titles }, guess.column);
    collector.add({
      code: 'mapping.guessed',
      severity: 'guess',
      column,
      columnIndex: guess.column,
      got: fieldLabel(guess.field),
      sentence: `“${column}” is taken as ${fieldLabel(guess.field)}: ${guess.why}.`,
      hint: 'Choose another field for the column if that is wrong.',
    });
  }
}

/** The columns that a person gave, without those that the file does not have. */
function givenColumns(
  given: ColumnMapping,
  columnCount: number,
  collector: DiagnosticCollector,
): ColumnGuess[] {
  const guesses: ColumnGuess[] = [];
  for (const field of TARGET_FIELDS) {
    const column = given[field];
    if (column === null) continue;
    if (column >= columnCount) {
      collector.add({
        code: 'layout.columnOutside',
        severity: 'warning',
        columnIndex: column,
        sentence: `The layout has ${fieldLabel(field)} in column ${column + 1}; the file has ${columnCount}.`,
        hint: 'Choose another column for it.',
      });
      continue;
    }
    guesses.push({ column, field, confidence: 'confirmed', why: 'as set for this supplier' });
  }
  return guesses;
}

/** What a bill cannot do without. */
function observeMissing(columns: ColumnMapping, collector: DiagnosticCollector): void {
  const has = (field: TargetField) => columns[field] !== null;
  if (!has('amount') && !has('creditAmount')) {
    const worked = has('quantity') && has('unitPrice');
    collector.add({
      code: worked ? 'mapping.amountComputed' : 'mapping.amountMissing',
      severity: worked ? 'guess' : 'error',
      sentence: worked
        ? 'The file has no amounts: they are worked out as quantity × unit price.'
        : 'No column is known to hold the amounts.',
      hint: 'Choose the column that holds the amount of each line.',
    });
  }
  if (!has('date')) {
    collector.add({
      code: 'mapping.dateMissing',
      severity: 'warning',
      sentence: 'No column is known to hold the dates.',
      hint: 'Choose it if there is one: without dates, lines match by ticket number only.',
    });
  }
  if (!has('description') && !has('mixCode')) {
    collector.add({
      code: 'mapping.descriptionMissing',
      severity: 'warning',
      sentence: 'No column is known to hold descriptions or item codes.',
      hint: 'Choose it if there is one: it tells what each line charges for.',
    });
  }
}

/** Settles everything that has to be known before rows can be read; says what was guessed. */
export function settleLayout(input: LayoutInput, collector: DiagnosticCollector): SettledLayout {
  const { records } = input;
  const header = locateHeader(input, collector);
  const given = header.givenFits ? input.given : null;
  const headerRecord = header.index === null ? undefined : records[header.index];
  const titles = headerRecord?.cells ?? [];
  const preamble = records.slice(0, header.index ?? header.bodyStart);
  const body = records.slice(header.bodyStart);
  const columnCount = countColumns(titles, body);
  const sound = body.filter((record) => record.problem !== 'unbalancedQuote');
  const sample = sound.slice(0, SAMPLE_ROWS).map((record) => record.cells);
  const decimalMark = given?.decimalMark ?? settleMark(sample, collector);
  const wantsGuess =
    given === null || TARGET_FIELDS.every((field) => given.columns[field] === null);
  const guesses = wantsGuess
    ? guessColumns(titles, sample, columnCount, decimalMark)
    : givenColumns(given.columns, columnCount, collector);
  const columns = mappingOf(guesses);
  observeGuesses(guesses, titles, collector);
  observeMissing(columns, collector);
  const dateTitle = columns.date === null ? '' : columnTitle({ titles }, columns.date);
  const dateOrder =
    given?.dateOrder ?? settleDates(sound, preamble, columns.date, dateTitle, collector);
  const layout: ImportLayout = {
    encoding: input.encoding,
    delimiter: input.delimiter,
    headerRow: headerRecord?.line ?? null,
    headerSignature: headerRecord === undefined ? null : headerSignature(titles).slice(0, 4000),
    dateOrder,
    decimalMark,
    columns,
  };
  return { layout, titles, columnCount, preamble, body, guesses };
}
