import { quantity } from '@/lib/domain/money/money';
import type { DecimalMark } from '../core/layout';
import { readChargeKind } from './charge-kind';
import { looksLikeDate } from './read-date';
import { looksNumeric, readNumber } from './read-number';
import { knownUnit } from './units';

/** What the cells of one column look like, as shares of its filled cells. */
export interface ColumnContent {
  readonly filled: number;
  readonly dates: number;
  readonly numbers: number;
  /** Whole numbers of three digits or more, with or without a letter or two around them. */
  readonly serials: number;
  readonly units: number;
  /** Words by which a charge is recognised. */
  readonly charges: number;
  readonly words: number;
  /** Different values among the filled cells. */
  readonly variety: number;
}

function share(cells: readonly string[], test: (cell: string) => boolean): number {
  return cells.length === 0 ? 0 : cells.filter(test).length / cells.length;
}

function namesCharge(cell: string): boolean {
  const clues = { description: cell, itemCode: null, unit: null, quantity: null };
  return readChargeKind({ ...clues, ticketNumber: null, ticketYards: null }).sure;
}

/** Characters of a cell that tell what it is. */
const LOOKED_AT = 200;

export function describeColumn(
  rows: readonly (readonly string[])[],
  column: number,
): ColumnContent {
  const cells = rows
    .map((row) => (row[column] ?? '').slice(0, LOOKED_AT).trim())
    .filter((cell) => cell !== '');
  return {
    filled: cells.length,
    dates: share(cells, looksLikeDate),
    numbers: share(cells, looksNumeric),
    serials: share(cells, (cell) => /^[a-z]{0,3}[- ]?\d{3,12}[- ]?[a-z]?$/i.test(cell)),
    units: share(cells, (cell) => knownUnit(cell) !== null),
    charges: share(cells, namesCharge),
    words: share(cells, (cell) => /[a-z]{3,}/i.test(cell)),
    variety: cells.length === 0 ? 0 : new Set(cells).size / cells.length,
  };
}

/** Columns of a product: quantity × price = amount in nearly all rows that have all three. */
export interface ProductColumns {
  readonly quantity: number;
  readonly unitPrice: number;
  readonly amount: number;
}

const MAX_NUMERIC_COLUMNS = 8;
const PRODUCT_SAMPLE = 40;

/** Finds the three columns of which the third is the product of the others, to the cent. */
export function findProduct(
  rows: readonly (readonly string[])[],
  numericColumns: readonly number[],
  mark: DecimalMark,
): ProductColumns | null {
  const columns = numericColumns.slice(0, MAX_NUMERIC_COLUMNS);
  const values = rows.slice(0, PRODUCT_SAMPLE).map((row) =>
    columns.map((column) => {
      const read = readNumber(row[column] ?? '', mark);
      return read.kind === 'number' ? quantity(read.text) : null;
    }),
  );
  let best: { found: ProductColumns; hits: number } | null = null;
  for (let q = 0; q < columns.length; q += 1) {
    for (let p = q + 1; p < columns.length; p += 1) {
      for (let a = 0; a < columns.length; a += 1) {
        if (a === q || a === p) continue;
        const hits = productHits(values, q, p, a);
        if (hits < 2 || hits <= (best?.hits ?? 0)) continue;
        const [quantityAt = 0, unitPrice = 0, amount = 0] = [columns[q], columns[p], columns[a]];
        best = { found: { quantity: quantityAt, unitPrice, amount }, hits };
      }
    }
  }
  return best?.found ?? null;
}

type Cell = ReturnType<typeof quantity> | null | undefined;

/** Rows in which the product holds; 0 where it fails in more than a fifth of those with all. */
function productHits(
  values: readonly (readonly Cell[])[],
  q: number,
  p: number,
  a: number,
): number {
  let hits = 0;
  let tried = 0;
  for (const row of values) {
    const [left, right, product] = [row[q], row[p], row[a]];
    if (!left || !right || !product || left.isZero() || right.eq(1) || left.eq(1)) continue;
    tried += 1;
    if (left.times(right).minus(product).abs().lte('0.011')) hits += 1;
  }
  return hits >= tried * 0.8 ? hits : 0;
}
