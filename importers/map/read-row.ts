import { money, moneyText } from '@/lib/domain/money/money';
import type { Observation } from '../core/diagnostic';
import type { BillLineValues, RowKind } from '../core/plan';
import { looksLikeDate } from './read-date';
import { looksNumeric, readNumber } from './read-number';
import {
  type Amounts,
  checkExtension,
  isZero,
  observeMissingAmount,
  printedAmount,
  readAmounts,
  signedAmount,
  withoutTax,
} from './row-amounts';
import { RowCells, type RowInput, type RowReader } from './row-cells';
import { readRowKind } from './row-kind';

export interface RowReading {
  readonly rowKind: RowKind;
  readonly values: BillLineValues;
  /** Tax in a column of its own; null where there is none or it is zero. */
  readonly taxAmount: string | null;
  readonly observations: readonly Observation[];
}

/** A label is short; what goes on is a remark. */
const LABEL_CHARACTERS = 200;

/** The cells that may say what kind of row it is: never the job, which may be named anything. */
function labelWords(cells: RowCells, row: RowInput): string[] {
  const words: string[] = [];
  const add = (text: string | null) => {
    const word = text?.slice(0, LABEL_CHARACTERS) ?? '';
    if (/[a-z]{2}/i.test(word) && !words.includes(word)) words.push(word);
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
