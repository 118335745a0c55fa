import type { Observation } from '../core/diagnostic';
import { type ImportLayout, TARGET_FIELD_LABELS, type TargetField } from '../core/layout';
import { looksLikeDate, readDate } from './read-date';
import { readNumber } from './read-number';

/** A record as the mapper sees it. */
export interface RowInput {
  readonly line: number;
  readonly cells: readonly string[];
}

/** How the rows of one file are read. */
export interface RowReader {
  readonly layout: ImportLayout;
  readonly titles: readonly string[];
  readonly columnCount: number;
}

/** Characters of a cell that a sentence quotes; the diagnostic has the rest. */
const SHOWN = 60;
const DATE_ORDER_WORDS = { MDY: 'month first', DMY: 'day first', YMD: 'year first' } as const;

/** Reads the cells of one row and keeps what it finds wrong. */
export class RowCells {
  readonly observations: Observation[] = [];

  constructor(
    private readonly row: RowInput,
    private readonly reader: RowReader,
  ) {}

  columnOf(field: TargetField): number | null {
    return this.reader.layout.columns[field];
  }

  raw(field: TargetField): string {
    const column = this.columnOf(field);
    return column === null ? '' : (this.row.cells[column] ?? '').trim();
  }

  text(field: TargetField): string | null {
    const text = this.raw(field).replace(/\s+/g, ' ');
    return text === '' ? null : text;
  }

  observe(
    field: TargetField,
    found: Pick<Observation, 'code' | 'severity' | 'sentence'> & Partial<Observation>,
  ): void {
    const column = this.columnOf(field);
    this.observations.push({
      line: this.row.line,
      raw: this.raw(field),
      ...(column === null ? {} : { columnIndex: column, column: columnTitle(this.reader, column) }),
      ...found,
    });
  }

  date(): string | null {
    const raw = this.raw('date');
    if (raw === '') return null;
    const order = this.reader.layout.dateOrder;
    const date = readDate(raw, order);
    if (date !== null) return date;
    const other = looksLikeDate(raw);
    this.observe('date', {
      code: 'cell.dateUnreadable',
      severity: 'error',
      expected: `a date, ${DATE_ORDER_WORDS[order]}`,
      got: raw,
      sentence: `Line ${this.row.line}: “${raw.slice(0, SHOWN)}” is not a date.`,
      hint: other
        ? 'It would be a date in another order: check the order of day and month above.'
        : 'Correct the date in the file, or leave the line out.',
    });
    return null;
  }

  number(field: TargetField): { text: string; unit: string | null } | null {
    const raw = this.raw(field);
    const mark = this.reader.layout.decimalMark;
    const read = readNumber(raw, mark);
    if (read.kind === 'number') return read;
    if (read.kind === 'blank') return null;
    const other = readNumber(raw, mark === '.' ? ',' : '.').kind === 'number';
    this.observe(field, {
      code: 'cell.numberUnreadable',
      severity: 'error',
      expected: `a number with a decimal ${mark === '.' ? 'point' : 'comma'}`,
      got: `${raw} (${read.why})`,
      sentence: `Line ${this.row.line}: ${TARGET_FIELD_LABELS[field].toLowerCase()} “${raw.slice(0, SHOWN)}” is not a number.`,
      hint: other
        ? 'It would be a number with the other decimal mark: check the number style above.'
        : 'Correct the cell in the file, or leave the line out.',
    });
    return null;
  }
}

export function columnTitle(reader: Pick<RowReader, 'titles'>, column: number): string {
  const title = (reader.titles[column] ?? '').trim();
  return title === '' ? `column ${column + 1}` : title;
}
