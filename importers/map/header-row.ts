import { normaliseTitle, recognisedTitles } from './field-synonyms';
import { looksLikeDate } from './read-date';
import { looksNumeric } from './read-number';

/** Titles stand near the top: a preamble longer than this is not looked through. */
const SEARCHED_RECORDS = 80;

/** The titles as one text, by which the same layout is recognised next month. */
export function headerSignature(cells: readonly string[]): string {
  return cells.map(normaliseTitle).join('|').replace(/\|+$/, '');
}

function isTitleRow(cells: readonly string[]): boolean {
  const filled = cells.filter((cell) => cell.trim() !== '');
  return filled.length >= 2 && !filled.some((cell) => looksNumeric(cell) || looksLikeDate(cell));
}

/** Index of the row of titles, or null. Two recognised titles make one; the most titles win. */
export function findHeader(records: readonly (readonly string[])[]): number | null {
  let best: number | null = null;
  let bestCount = 1;
  for (const [index, cells] of records.slice(0, SEARCHED_RECORDS).entries()) {
    const recognised = recognisedTitles(cells);
    if (recognised > bestCount && isTitleRow(cells)) {
      best = index;
      bestCount = recognised;
    }
  }
  return best;
}

/** Index of the row whose titles have the remembered signature, or null. */
export function findHeaderBySignature(
  records: readonly (readonly string[])[],
  signature: string,
): number | null {
  const index = records
    .slice(0, SEARCHED_RECORDS)
    .findIndex((cells) => headerSignature(cells) === signature);
  return index === -1 ? null : index;
}

/** Without titles: the first row that has a figure and is as wide as rows usually are. */
export function firstDataRow(records: readonly (readonly string[])[]): number {
  const head = records.slice(0, SEARCHED_RECORDS);
  const filledCounts = head.map((cells) => cells.filter((cell) => cell.trim() !== '').length);
  const usual = [...filledCounts].sort((left, right) => left - right)[
    Math.floor(filledCounts.length / 2)
  ];
  const index = head.findIndex((cells, at) => {
    const enough = (filledCounts[at] ?? 0) >= Math.max(2, (usual ?? 2) - 2);
    return enough && cells.some((cell) => looksNumeric(cell));
  });
  return index === -1 ? 0 : index;
}
