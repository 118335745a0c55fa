import type { DateOrder, DecimalMark } from '../core/layout';
import type { DocumentFacts } from '../core/plan';
import { looksLikeDate, readDate } from './read-date';
import { looksNumeric, readNumber } from './read-number';

/** The rows above the titles, as cells. */
export type Preamble = readonly (readonly string[])[];

const DATE =
  /\d{4}[-/.]\d{1,2}[-/.]\d{1,2}|\d{1,2}[-/.]\d{1,2}[-/.]\d{2,4}|\d{1,2}[- ][A-Za-z]{3,9}\.?[-, ]+\d{2,4}|[A-Za-z]{3,9}\.? \d{1,2},? \d{4}/g;

/** Every date-like piece of the preamble: further witnesses for the order of dates. */
export function preambleDates(preamble: Preamble): string[] {
  return preamble.flatMap((cells) => cells.flatMap((cell) => cell.match(DATE) ?? []));
}

interface Labelled {
  readonly label: string;
  readonly value: string;
}

/** "Statement No: 4471" in one cell, or label and value in neighbouring cells. */
function labelled(preamble: Preamble): Labelled[] {
  return preamble.flatMap((cells) => {
    const filled = cells.map((cell) => cell.trim()).filter((cell) => cell !== '');
    return filled.flatMap((cell, at) => {
      const parts =
        /^([^:]{2,40}):\s*(\S.*)$/.exec(cell) ?? /^(.{2,40}?(?:#|No\.?))\s+(\S.*)$/i.exec(cell);
      if (parts) return [{ label: parts[1] ?? '', value: parts[2] ?? '' }];
      const rest = filled.slice(at + 1).join(' ');
      return rest === '' ? [] : [{ label: cell.replace(/:$/, ''), value: rest }];
    });
  });
}

function find(pairs: readonly Labelled[], label: RegExp, value: RegExp): string | null {
  for (const pair of pairs) {
    if (!label.test(pair.label)) continue;
    const found = value.exec(pair.value);
    if (found) return found[1] ?? found[0];
  }
  return null;
}

function findNumber(pairs: readonly Labelled[], label: RegExp, mark: DecimalMark): string | null {
  for (const pair of pairs) {
    if (!label.test(pair.label)) continue;
    const read = readNumber(pair.value, mark);
    if (read.kind === 'number') return read.text;
  }
  return null;
}

/** The first cell that is a name rather than a label, a number or a date. */
function supplierName(preamble: Preamble): string | null {
  for (const cells of preamble) {
    const filled = cells.map((cell) => cell.trim()).filter((cell) => cell !== '');
    const [first] = filled;
    if (first === undefined || /^sep=.?$/i.test(first)) continue;
    const named = /^(?:supplier|vendor|from)\s*:\s*(\S.*)$/i.exec(first);
    if (named) return named[1] ?? null;
    if (/^(supplier|vendor|from):?$/i.test(first)) return filled[1] ?? null;
    const plain = filled.length === 1 && /[a-z]{3}/i.test(first) && !first.includes(':');
    const title = /^(customer |account |monthly )?(statement|invoice)\b/i.test(first);
    if (plain && !title && !looksNumeric(first) && !looksLikeDate(first))
      return first.slice(0, 120);
  }
  return null;
}

/** Reads what the preamble says of the document. Balances may be overruled by rows below. */
export function readPreamble(
  preamble: Preamble,
  order: DateOrder,
  mark: DecimalMark,
): DocumentFacts {
  const pairs = labelled(preamble);
  const periodText = pairs.find((pair) =>
    /\bperiod\b|\bdates?\b.*\b(from|range)\b/i.test(pair.label),
  );
  const dates = (text: string) =>
    (text.match(DATE) ?? []).map((date) => readDate(date, order)).filter((date) => date !== null);
  const period = periodText ? dates(periodText.value) : [];
  const from = find(pairs, /^(from|period (from|start)|start)/i, DATE_ONCE);
  const to = find(pairs, /^(to|through|period (to|end)|end)/i, DATE_ONCE);
  const dated = find(pairs, /^(statement|invoice|closing|bill)? ?date$/i, DATE_ONCE);
  const readOne = (text: string | null) => (text === null ? null : readDate(text, order));
  return {
    supplierName: supplierName(preamble),
    documentNumber: find(
      pairs,
      /\b(statement|invoice|document|bill)\b.*(#|\bno\b|number|\bid\b)|^(statement|invoice)$/i,
      /^[A-Za-z]{0,6}[- ]?\d[\w./-]{0,30}/,
    ),
    documentDate: readOne(dated),
    periodFrom: period[0] ?? readOne(from),
    periodTo: period[1] ?? readOne(to),
    openingBalance: findNumber(
      pairs,
      /\b(opening|previous|prior|beginning) balance|\bforward\b/i,
      mark,
    ),
    closingBalance: findNumber(
      pairs,
      /\b(closing|ending|new) balance|\b(balance|amount|total) due\b/i,
      mark,
    ),
  };
}

const DATE_ONCE = new RegExp(DATE.source);
