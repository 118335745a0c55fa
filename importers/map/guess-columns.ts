import {
  type ColumnMapping,
  type DecimalMark,
  EMPTY_COLUMNS,
  TARGET_FIELD_LABELS,
  TARGET_FIELDS,
  type TargetField,
} from '../core/layout';
import type { COLUMN_CONFIDENCES } from '../core/plan';
import { type ColumnContent, describeColumn, findProduct } from './column-content';
import { normaliseTitle, synonymRank, titleMatches } from './field-synonyms';

export interface ColumnGuess {
  readonly column: number;
  readonly field: TargetField;
  readonly confidence: (typeof COLUMN_CONFIDENCES)[number];
  /** In a few words: what the guess rests on. */
  readonly why: string;
}

interface Candidate extends ColumnGuess {
  readonly score: number;
}

const ENOUGH = 10;
const NUMERIC: ReadonlySet<TargetField> = new Set([
  'quantity',
  'unitPrice',
  'amount',
  'creditAmount',
  'taxAmount',
  'balance',
]);

/** How far the cells bear out what the title says: 1 fully, near 0 not at all. */
function bearsOut(field: TargetField, content: ColumnContent): number {
  if (content.filled === 0) return NUMERIC.has(field) ? 0.6 : 0.5;
  if (field === 'date') return content.dates >= 0.5 ? 1 : 0.1;
  if (NUMERIC.has(field)) return content.numbers >= 0.5 ? 1 : 0.1;
  if (field === 'description') return content.words >= 0.3 ? 1 : 0.3;
  if (content.dates > 0.8) return 0.1;
  // Job numbers stand in "Job" columns; a name is preferred where there are both.
  if (field === 'jobName') return content.words >= 0.3 ? 1 : 0.8;
  if (field === 'unit') return content.units >= 0.5 ? 1 : 0.2;
  return 1;
}

/** Titles over either words or codes; the cells decide. */
const WORDS_OR_CODES: ReadonlySet<string> = new Set(['product', 'material']);

function fromTitle(title: string, column: number, content: ColumnContent): Candidate[] {
  const isOverCodes =
    WORDS_OR_CODES.has(normaliseTitle(title)) && content.filled > 0 && content.words < 0.3;
  if (isOverCodes) {
    const why = `titled “${title.trim()}”, its cells are codes`;
    return [{ column, field: 'mixCode', confidence: 'likely', why, score: 90 }];
  }
  return titleMatches(title).map((match) => {
    const base = match.exact ? 100 - synonymRank(title) : 40 + match.weight + (match.last ? 15 : 0);
    return {
      column,
      field: match.field,
      confidence: match.exact ? 'certain' : 'likely',
      why: match.exact ? `titled “${title.trim()}”` : `“${title.trim()}” speaks of it`,
      score: base * bearsOut(match.field, content),
    };
  });
}

function fromContent(column: number, content: ColumnContent): Candidate[] {
  if (content.filled === 0) return [];
  const found: Candidate[] = [];
  const add = (field: TargetField, score: number, why: string) =>
    found.push({ column, field, confidence: 'unsure', why, score });
  if (content.dates > 0.8) add('date', 35, 'its cells are dates');
  if (content.units > 0.7 && content.numbers < 0.5) add('unit', 30, 'its cells are units');
  if (content.charges > 0.4 && content.words > 0.5) {
    add('description', 28 + content.charges, 'its words name charges');
  }
  if (content.serials > 0.7 && content.dates < 0.5 && content.variety > 0.2) {
    add('ticketNumber', 20 + content.variety, 'its cells look like ticket numbers');
  }
  return found;
}

function fromProduct(
  rows: readonly (readonly string[])[],
  contents: readonly ColumnContent[],
  mark: DecimalMark,
): Candidate[] {
  const numeric = contents.flatMap((content, column) =>
    content.numbers > 0.6 && content.dates < 0.5 ? [column] : [],
  );
  const product = findProduct(rows, numeric, mark);
  if (product === null) return [];
  const why = 'quantity × price = amount in the rows';
  return (['quantity', 'unitPrice', 'amount'] as const).map((field) => ({
    column: product[field],
    field,
    confidence: 'likely',
    why,
    score: 38,
  }));
}

/** Where no product tells: a lone column of money is the amount. */
function fromLastMoney(contents: readonly ColumnContent[]): Candidate[] {
  const column = contents.findLastIndex(
    (content) => content.numbers > 0.8 && content.dates < 0.5 && content.serials < 0.5,
  );
  if (column === -1) return [];
  const why = 'the last column of figures';
  return [{ column, field: 'amount', confidence: 'unsure', why, score: 12 }];
}

/**
 * Guesses what each column holds from its title and its cells. Each field and each column is
 * given once, the best evidence first; equal evidence goes by the order of fields and columns.
 */
export function guessColumns(
  titles: readonly string[],
  rows: readonly (readonly string[])[],
  columnCount: number,
  mark: DecimalMark,
): ColumnGuess[] {
  const contents = Array.from({ length: columnCount }, (_, column) => describeColumn(rows, column));
  const candidates = contents.flatMap((content, column) => [
    ...fromTitle(titles[column] ?? '', column, content),
    ...fromContent(column, content),
  ]);
  candidates.push(...fromProduct(rows, contents, mark), ...fromLastMoney(contents));
  candidates.sort(
    (left, right) =>
      right.score - left.score ||
      TARGET_FIELDS.indexOf(left.field) - TARGET_FIELDS.indexOf(right.field) ||
      left.column - right.column,
  );
  const fields = new Set<TargetField>();
  const columns = new Set<number>();
  const guesses: ColumnGuess[] = [];
  for (const { score, ...guess } of candidates) {
    if (score < ENOUGH || fields.has(guess.field) || columns.has(guess.column)) continue;
    fields.add(guess.field);
    columns.add(guess.column);
    guesses.push(guess);
  }
  return guesses.sort((left, right) => left.column - right.column);
}

export function mappingOf(guesses: readonly ColumnGuess[]): ColumnMapping {
  const mapping = { ...EMPTY_COLUMNS };
  for (const guess of guesses) mapping[guess.field] = guess.column;
  return mapping;
}

/** "Quantity" for a sentence. */
export function fieldLabel(field: TargetField): string {
  return TARGET_FIELD_LABELS[field].toLowerCase();
}
