import type { DecimalMark } from '../core/layout';

/**
 * Reads the ways in which bills print numbers: "$1,234.50", "(12.00)", "12.00-", "12.00CR",
 * "1.234,50 €". Returns decimal text, never a binary float.
 */

const BLANKS = new Set(['', '-', '–', '—', 'n/a', 'na', 'nil', 'none']);
const MAX_WHOLE_DIGITS = 12;
const MAX_DECIMALS = 6;
/** Longer cells are text; not looking at them also keeps hostile ones from costing time. */
const MAX_CHARACTERS = 60;

export type NumberReading =
  | { readonly kind: 'number'; readonly text: string; readonly unit: string | null }
  | { readonly kind: 'blank' }
  | { readonly kind: 'unreadable'; readonly why: string };

interface Bare {
  readonly digits: string;
  readonly negative: boolean;
  readonly unit: string | null;
}

function unreadable(why: string): NumberReading {
  return { kind: 'unreadable', why };
}

function withoutCurrency(text: string): string {
  return text.replace(/^\s*(usd|eur|gbp|cad)\b|\b(usd|eur|gbp|cad)\s*$|[$€£]/gi, '').trim();
}

/** Takes off currency, sign in any of its places, and a unit after the number. */
function strip(cell: string): Bare {
  let text = withoutCurrency(cell.replace(/[\u00a0\u202f\u2009]/g, ' ').replace(/\u2212/g, '-'));
  let negative = false;
  if (/^\(.*\)$/.test(text)) {
    negative = true;
    text = text.slice(1, -1).trim();
  }
  const credit = /\s*\b(cr|dr)\.?$/i.exec(text) ?? /(?<=\d)\s*(cr|dr)\.?$/i.exec(text);
  if (credit) {
    negative ||= credit[1]?.toLowerCase() === 'cr';
    text = text.slice(0, credit.index).trim();
  }
  const unit = /(?<=\d)\s*([a-z]{1,6}[³3]?\.?)$/i.exec(text);
  if (unit) text = text.slice(0, unit.index).trim();
  if (/^-|-$/.test(text)) {
    negative = true;
    text = text.replace(/^-\s*|\s*-$/, '');
  } else {
    text = text.replace(/^\+\s*/, '');
  }
  return { digits: text.trim(), negative, unit: unit?.[1] ?? null };
}

/** Reads one cell. A unit after the number ("10.00 CY") is given back beside it. */
export function readNumber(cell: string, mark: DecimalMark): NumberReading {
  if (BLANKS.has(cell.trim().toLowerCase())) return { kind: 'blank' };
  if (cell.length > MAX_CHARACTERS) return unreadable('too long');
  const { digits, negative, unit } = strip(cell);
  if (BLANKS.has(digits)) return { kind: 'blank' };
  if (/^\d(\.\d+)?e\+?\d+$/i.test(cell.trim())) return unreadable('a shortened number');
  const group = mark === '.' ? "[,' ]" : "[.' ]";
  const point = mark === '.' ? '\\.' : ',';
  const form = new RegExp(`^(\\d+|\\d{1,3}(?:${group}\\d{3})+)?(?:${point}(\\d*))?$`);
  const found = form.exec(digits);
  if (!found || !/\d/.test(digits)) {
    return unreadable(/\d/.test(digits) ? 'not a number in this style' : 'no digits');
  }
  const whole = (found[1] ?? '0').replace(/\D/g, '').replace(/^0+(?=\d)/, '');
  const decimals = found[2] ?? '';
  if (whole.length > MAX_WHOLE_DIGITS) return unreadable('too large');
  if (decimals.length > MAX_DECIMALS) return unreadable('too many decimals');
  const text = decimals === '' ? whole : `${whole}.${decimals}`;
  const isZero = /^[0.]+$/.test(text);
  return { kind: 'number', text: negative && !isZero ? `-${text}` : text, unit };
}

/** Whether the cell is a number in either style: for telling columns apart. */
export function looksNumeric(cell: string): boolean {
  return readNumber(cell, '.').kind === 'number' || readNumber(cell, ',').kind === 'number';
}

export interface DecimalMarkGuess {
  readonly mark: DecimalMark;
  /** True where the cells allow both readings with different values. */
  readonly ambiguous: boolean;
  readonly pointVotes: number;
  readonly commaVotes: number;
}

/** Which mark one cell proves: "1,234.50" the point, "12,5" the comma, "1,234" neither. */
function vote(cell: string): DecimalMark | 'either' | null {
  const { digits } = strip(cell);
  const point = digits.lastIndexOf('.');
  const comma = digits.lastIndexOf(',');
  if (point === -1 && comma === -1) return null;
  if (readNumber(cell, '.').kind !== 'number') {
    return readNumber(cell, ',').kind === 'number' ? ',' : null;
  }
  return readNumber(cell, ',').kind === 'number' ? 'either' : '.';
}

/** Decides the decimal mark from all number cells together; the point where nothing tells. */
export function detectDecimalMark(cells: Iterable<string>): DecimalMarkGuess {
  let pointVotes = 0;
  let commaVotes = 0;
  let either = 0;
  for (const cell of cells) {
    const said = vote(cell);
    if (said === '.') pointVotes += 1;
    else if (said === ',') commaVotes += 1;
    else if (said === 'either') either += 1;
  }
  const mark = commaVotes > pointVotes ? ',' : '.';
  const undecided = pointVotes === commaVotes && either > 0;
  return { mark, ambiguous: undecided, pointVotes, commaVotes };
}
