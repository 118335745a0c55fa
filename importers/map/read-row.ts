import { extend, money, moneyText, quantity } from '@/lib/domain/money/money';
import type { Observation } from '../core/diagnostic';
import { type ImportLayout, TARGET_FIELD_LABELS, type TargetField } from '../core/layout';
import type { BillLineValues, RowKind } from '../core/plan';
import { looksLikeDate, readDate } from './read-date';
import { looksNumeric, readNumber } from './read-number';
import { readRowKind } from './row-kind';

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

export interface RowReading {
  readonly rowKind: RowKind;
  readonly values: BillLineValues;
  /** Tax in a column of its own; null where there is none or it is zero. */
  readonly taxAmount: string | null;
  readonly observations: readonly Observation[];
}

const DATE_ORDER_WORDS = { MDY: 'month first', DMY: 'day first', YMD: 'year first' } as const;

/** Reads the cells of one row and keeps what it finds wrong. */
class RowCells {
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
      sentence: `Line ${this.row.line}: “${raw}” is not a date.`,
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
      sentence: `Line ${this.row.line}: ${TARGET_FIELD_LABELS[field].toLowerCase()} “${raw}” is not a number.`,
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

/** The cells that may say what kind of row it is: never the job, which may be named anything. */
function labelWords(cells: RowCells, row: RowInput): string[] {
  const words: string[] = [];
  const add = (text: string | null) => {
    if (text !== null && /[a-z]{2}/i.test(text) && !words.includes(text)) words.push(text);
  };
  add(cells.text('description'));
  add(cells.text('mixCode'));
  for (const field of ['date', 'ticketNumber', 'invoiceNumber', 'quantity', 'unitPrice'] as const) {
    const text = cells.text(field);
    if (text !== null && !looksLikeDate(text) && !/\d/.test(text)) add(text);
  }
  const first = row.cells.find((cell) => cell.trim() !== '');
  if (first !== undefined && !looksLikeDate(first)) add(first.trim().replace(/\s+/g, ' '));
  return words;
}

/** The last number of the row that is not its yards. */
function lastFigure(cells: RowCells, row: RowInput): string {
  const column = cells.columnOf('quantity');
  const index = row.cells.findLastIndex((cell, at) => at !== column && looksNumeric(cell));
  return row.cells[index] ?? '';
}

/** The figure of a balance or total row stands where the file puts it: amount, balance, last. */
function rowFigure(cells: RowCells, row: RowInput, reader: RowReader): string | null {
  const mark = reader.layout.decimalMark;
  const candidates = [cells.raw('amount'), cells.raw('balance'), lastFigure(cells, row)];
  for (const candidate of candidates) {
    const read = readNumber(candidate, mark);
    if (read.kind === 'number') return read.text;
  }
  return null;
}

interface Amounts {
  readonly quantity: { text: string; unit: string | null } | null;
  readonly unitPrice: string | null;
  readonly charge: string | null;
  readonly credit: string | null;
  readonly tax: string | null;
}

function isZero(text: string | null): boolean {
  return text === null || money(text).isZero();
}

function readAmounts(cells: RowCells): Amounts {
  return {
    quantity: cells.number('quantity'),
    unitPrice: cells.number('unitPrice')?.text ?? null,
    charge: cells.number('amount')?.text ?? null,
    credit: cells.number('creditAmount')?.text ?? null,
    tax: cells.number('taxAmount')?.text ?? null,
  };
}

function product(amounts: Amounts): string | null {
  if (amounts.quantity === null || amounts.unitPrice === null) return null;
  return moneyText(extend(quantity(amounts.quantity.text), money(amounts.unitPrice)));
}

/** The signed amount of a line, as printed; says what is missing or contradictory. */
function printedAmount(cells: RowCells, row: RowInput, amounts: Amounts): string | null {
  const { charge, credit } = amounts;
  if (!isZero(charge) && !isZero(credit)) {
    cells.observe('creditAmount', {
      code: 'cell.bothAmounts',
      severity: 'error',
      expected: 'an amount in one of the two columns',
      got: `${charge} and ${credit}`,
      sentence: `Line ${row.line} has ${charge} as a charge and ${credit} as a credit.`,
      hint: 'Split it into two lines in the file, or map only one of the columns.',
    });
    return null;
  }
  if (credit !== null && !isZero(credit)) return moneyText(money(credit).abs().negated());
  if (charge !== null) return moneyText(money(charge));
  if (credit !== null) return moneyText(money(credit));
  return cells.columnOf('amount') === null && cells.columnOf('creditAmount') === null
    ? product(amounts)
    : null;
}

function observeMissingAmount(cells: RowCells, row: RowInput, amounts: Amounts): void {
  const alreadySaid = cells.observations.some((found) => found.severity === 'error');
  if (alreadySaid) return;
  const column = cells.columnOf('amount');
  const worked = product(amounts);
  const short = column !== null && row.cells.length <= column;
  cells.observe('amount', {
    code: short ? 'row.missingColumns' : 'cell.amountMissing',
    severity: 'error',
    ...(worked === null ? {} : { expected: worked }),
    got: short ? `${row.cells.length} cells` : 'an empty cell',
    sentence: short
      ? `Line ${row.line} ends before the amount: it has only ${row.cells.length} cells.`
      : `Line ${row.line} has no amount.`,
    hint:
      worked === null
        ? 'Ask the supplier for the amount, or leave the line out.'
        : `Quantity × unit price would be ${worked}: write it into the file if that is right.`,
  });
}

/** Credits and payments count as negative, however they are printed. */
function signedAmount(cells: RowCells, row: RowInput, kind: RowKind, amount: string): string {
  const value = money(amount);
  if ((kind !== 'credit' && kind !== 'payment') || value.lte(0)) return amount;
  cells.observe('amount', {
    code: 'row.signTurned',
    severity: 'guess',
    got: amount,
    expected: moneyText(value.negated()),
    sentence: `Line ${row.line} reads as a ${kind} and is counted as −${moneyText(value)}.`,
    hint: 'If it is a charge, correct its description in the file.',
  });
  return moneyText(value.negated());
}

/** Whether quantity × price shows the tax to be inside the amount, outside it, or neither. */
function taxInside(worked: string | null, amount: string, tax: string): boolean | null {
  if (worked === null) return null;
  const beyond = money(amount).minus(worked);
  if (beyond.abs().lte('0.01')) return false;
  return beyond.minus(tax).abs().lte('0.01') ? true : null;
}

function withoutTax(cells: RowCells, row: RowInput, amounts: Amounts, amount: string): string {
  const { tax } = amounts;
  if (tax === null || isZero(tax)) return amount;
  const inside = taxInside(product(amounts), amount, tax);
  if (inside === true) return moneyText(money(amount).minus(tax));
  if (inside === null) {
    cells.observe('taxAmount', {
      code: 'line.taxIncludedGuessed',
      severity: 'guess',
      sentence: `Line ${row.line}: the tax of ${tax} is taken to come on top of ${amount}.`,
      hint: 'If the amount includes it, do not map the tax column.',
    });
  }
  return amount;
}

function checkExtension(cells: RowCells, row: RowInput, amounts: Amounts, amount: string): void {
  const worked = product(amounts);
  if (worked === null || money(amount).abs().minus(money(worked).abs()).abs().lte('0.01')) return;
  cells.observe('amount', {
    code: 'line.extensionDiffers',
    severity: 'warning',
    expected: worked,
    got: amount,
    sentence: `Line ${row.line}: ${amounts.quantity?.text} × ${amounts.unitPrice} is ${worked}, the bill says ${amount}.`,
    hint: 'The line is imported as billed; the difference will stand on the strike-off sheet.',
  });
}

function checkDate(cells: RowCells, row: RowInput, rowKind: RowKind): void {
  if (rowKind !== 'line' || cells.columnOf('date') === null || cells.raw('date') !== '') return;
  cells.observe('date', {
    code: 'cell.dateMissing',
    severity: 'warning',
    expected: 'a date',
    got: 'an empty cell',
    sentence: `Line ${row.line} has no date; it can be matched by its ticket number only.`,
    hint: 'Write the date into the file if you know it.',
  });
}

function checkTicket(cells: RowCells, row: RowInput): void {
  for (const field of ['ticketNumber', 'invoiceNumber'] as const) {
    const raw = cells.raw(field);
    if (!/^\d(\.\d+)?e\+?\d+$/i.test(raw)) continue;
    cells.observe(field, {
      code: 'cell.spoiledNumber',
      severity: 'warning',
      got: raw,
      expected: 'the whole number',
      sentence: `Line ${row.line}: “${raw}” has lost its last digits in a spreadsheet.`,
      hint: 'Ask for the file as the supplier exports it, not saved from a spreadsheet.',
    });
  }
}

function lineValues(cells: RowCells, date: string | null, amounts: Amounts): BillLineValues {
  const itemCode = cells.text('mixCode');
  return {
    date,
    ticketNumber: cells.text('ticketNumber'),
    invoiceNumber: cells.text('invoiceNumber'),
    jobName: cells.text('jobName'),
    truck: cells.text('truck'),
    description: cells.text('description') ?? itemCode ?? '',
    mixCode: null,
    itemCode,
    quantity: amounts.quantity?.text ?? null,
    unit: cells.text('unit') ?? amounts.quantity?.unit ?? null,
    unitPrice: amounts.unitPrice,
    amount: null,
  };
}

/** The row's only filled cell where that is words: a heading or a remark, wherever it stands. */
function loneWords(row: RowInput): string | null {
  const filled = row.cells.map((cell) => cell.trim()).filter((cell) => cell !== '');
  const [only] = filled;
  if (only === undefined || filled.length > 1) return null;
  if (looksNumeric(only) || looksLikeDate(only) || !/[a-z]{2}/i.test(only)) return null;
  return only.replace(/\s+/g, ' ');
}

function note(values: BillLineValues): RowReading {
  return { rowKind: 'note', values, taxAmount: null, observations: [] };
}

/** One row to its kind, its values and what is wrong with it. */
export function readRow(row: RowInput, reader: RowReader): RowReading {
  const cells = new RowCells(row, reader);
  const date = cells.date();
  const amounts = readAmounts(cells);
  const values = lineValues(cells, date, amounts);
  const printed = printedAmount(cells, row, amounts);
  const rowKind = readRowKind({
    words: labelWords(cells, row),
    hasDate: date !== null,
    hasTicket: /\d/.test(values.ticketNumber ?? ''),
    hasQuantity: !isZero(values.quantity),
    hasPrice: !isZero(values.unitPrice),
    hasMoney: amounts.charge !== null || amounts.credit !== null || printed !== null,
    negative: printed?.startsWith('-') ?? false,
    inCreditColumn: !isZero(amounts.credit),
  });
  const lone = loneWords(row);
  if (lone !== null && (rowKind === 'line' || rowKind === 'note')) {
    return note({ ...values, description: lone });
  }
  if (rowKind === 'note' && cells.observations.length === 0) return note(values);
  if (rowKind === 'opening' || rowKind === 'closing' || rowKind === 'subtotal') {
    const figure = rowFigure(cells, row, reader);
    const amount = figure === null ? null : moneyText(money(figure));
    return { rowKind, values: { ...values, amount }, taxAmount: null, observations: [] };
  }
  if (printed === null) observeMissingAmount(cells, row, amounts);
  checkDate(cells, row, rowKind);
  checkTicket(cells, row);
  const net = printed === null ? null : withoutTax(cells, row, amounts, printed);
  if (net !== null) checkExtension(cells, row, amounts, net);
  const amount = net === null ? null : signedAmount(cells, row, rowKind, net);
  return {
    rowKind,
    values: { ...values, amount },
    taxAmount: amounts.tax === null || isZero(amounts.tax) ? null : moneyText(money(amounts.tax)),
    observations: cells.observations,
  };
}
