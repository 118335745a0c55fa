import Papa from 'papaparse';
import type { Delimiter } from '../core/layout';
import { MAX_LINES_PER_RECORD } from './limits';

/** One record of the file, with the physical line on which it starts. */
export interface SourceRecord {
  /** From 1. */
  readonly line: number;
  readonly raw: string;
  readonly cells: readonly string[];
  readonly problem: 'unbalancedQuote' | 'strayQuote' | null;
}

export interface RecordList {
  readonly records: SourceRecord[];
  /** True where the file goes on after the last record that was read. */
  readonly cut: boolean;
}

type QuoteState = 'closed' | 'open' | 'stray';

/**
 * Whether a quoted cell is still open at the end of the text. `stray`: all quotes are closed,
 * but one was followed by something other than a separator.
 */
function quoteState(text: string, delimiter: string): QuoteState {
  let stray = false;
  let at = 0;
  while (at <= text.length) {
    if (text[at] !== '"') {
      at = text.indexOf(delimiter, at);
      if (at === -1) break;
      at += delimiter.length;
      continue;
    }
    const closed = endOfQuotedCell(text, at, delimiter);
    if (closed === null) return 'open';
    stray ||= closed.stray;
    if (closed.end >= text.length) break;
    at = closed.end + delimiter.length;
  }
  return stray ? 'stray' : 'closed';
}

/** The place of the separator (or end) after the quoted cell that opens at `open`. */
function endOfQuotedCell(
  text: string,
  open: number,
  delimiter: string,
): { end: number; stray: boolean } | null {
  let stray = false;
  let quote = text.indexOf('"', open + 1);
  while (quote !== -1) {
    if (text[quote + 1] === '"') {
      quote = text.indexOf('"', quote + 2);
      continue;
    }
    let after = quote + 1;
    while (text[after] === ' ') after += 1;
    if (after >= text.length || text.startsWith(delimiter, after)) return { end: after, stray };
    stray = true;
    quote = text.indexOf('"', quote + 1);
  }
  return null;
}

function cellsOf(raw: string, delimiter: Delimiter): string[] {
  if (raw === '') return [''];
  const parsed = Papa.parse<string[]>(raw, {
    delimiter,
    newline: '\n',
    header: false,
    dynamicTyping: false,
    skipEmptyLines: false,
  });
  // Several rows only where a quote is malformed: all cells belong to the one record.
  return parsed.data.flat();
}

/** Joins physical lines while a quoted cell is open; gives up where it never closes. */
function takeRecord(
  lines: readonly string[],
  start: number,
  delimiter: Delimiter,
): { raw: string; lineCount: number; state: QuoteState } {
  const first = lines[start] ?? '';
  let raw = first;
  let state = raw.includes('"') ? quoteState(raw, delimiter) : 'closed';
  let lineCount = 1;
  while (state === 'open' && lineCount < MAX_LINES_PER_RECORD && start + lineCount < lines.length) {
    raw += `\n${lines[start + lineCount] ?? ''}`;
    lineCount += 1;
    state = quoteState(raw, delimiter);
  }
  // A quote that closes only on a later line, and there in the middle of a cell, was never
  // meant to span lines: give up this line alone, so that the following ones are not lost.
  if (state === 'open' || (state === 'stray' && lineCount > 1)) {
    return { raw: first, lineCount: 1, state: 'open' };
  }
  return { raw, lineCount, state };
}

/** Text to records. A broken quote costs its own line only. Lines must end in "\n". */
export function splitRecords(text: string, delimiter: Delimiter, maxRecords: number): RecordList {
  const lines = text.split('\n');
  if (lines.at(-1) === '') lines.pop();
  const records: SourceRecord[] = [];
  let at = 0;
  while (at < lines.length && records.length < maxRecords) {
    const taken = takeRecord(lines, at, delimiter);
    const broken = taken.state === 'open';
    records.push({
      line: at + 1,
      raw: taken.raw,
      cells: broken ? taken.raw.split(delimiter) : cellsOf(taken.raw, delimiter),
      problem: broken ? 'unbalancedQuote' : taken.state === 'stray' ? 'strayQuote' : null,
    });
    at += taken.lineCount;
  }
  return { records, cut: at < lines.length };
}

/** A record without a single filled cell. */
export function isBlank(record: SourceRecord): boolean {
  return record.cells.every((cell) => cell.trim() === '');
}
