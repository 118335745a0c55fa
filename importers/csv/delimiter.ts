import { DELIMITERS, type Delimiter } from '../core/layout';
import { recognisedTitles } from '../map/field-synonyms';
import { splitRecords } from './records';

export interface DelimiterGuess {
  readonly delimiter: Delimiter;
  /** True where no separator gives at least two columns. */
  readonly oneColumn: boolean;
  /** Another separator that fits nearly as well. */
  readonly rival: Delimiter | null;
}

const SAMPLE_LINES = 60;
const SAMPLE_CHARACTERS = 4_000;
const NAMES: Readonly<Record<Delimiter, string>> = {
  ',': 'comma',
  ';': 'semicolon',
  '\t': 'tab',
  '|': 'vertical bar',
};

export function delimiterName(delimiter: Delimiter): string {
  return NAMES[delimiter];
}

/**
 * How well a separator explains the sample: rows that agree on a number of columns, and titles
 * that become recognisable. A decimal comma agrees too, but names no titles.
 */
function score(sample: string, delimiter: Delimiter): number {
  const { records } = splitRecords(sample, delimiter, SAMPLE_LINES);
  const rowsByWidth = new Map<number, number>();
  let titles = 0;
  for (const record of records) {
    const width = record.cells.length;
    if (width < 2) continue;
    rowsByWidth.set(width, (rowsByWidth.get(width) ?? 0) + 1);
    titles = Math.max(titles, recognisedTitles(record.cells));
  }
  let best = 0;
  for (const [width, rows] of rowsByWidth) best = Math.max(best, rows * Math.sqrt(width - 1));
  if (best === 0) return 0;
  return best / Math.max(1, records.length) + titles;
}

/** `sep=;` on the first line, as spreadsheets write it. */
function statedDelimiter(text: string): Delimiter | null {
  const found = /^sep=(.)(\n|$)/i.exec(text);
  return DELIMITERS.find((delimiter) => delimiter === found?.[1]) ?? null;
}

export function detectDelimiter(text: string): DelimiterGuess {
  const stated = statedDelimiter(text);
  if (stated !== null) return { delimiter: stated, oneColumn: false, rival: null };
  const sample = text
    .split('\n', SAMPLE_LINES * 2)
    .filter((line) => line.trim() !== '')
    .slice(0, SAMPLE_LINES)
    .map((line) => line.slice(0, SAMPLE_CHARACTERS))
    .join('\n');
  const ranked = DELIMITERS.map((delimiter) => ({ delimiter, fit: score(sample, delimiter) })).sort(
    (left, right) => right.fit - left.fit,
  );
  const [first, second] = ranked;
  if (!first || first.fit === 0) return { delimiter: ',', oneColumn: true, rival: null };
  const close = second !== undefined && second.fit > 0 && second.fit > first.fit * 0.8;
  return { delimiter: first.delimiter, oneColumn: false, rival: close ? second.delimiter : null };
}
