import type { DiagnosticCollector } from '../core/diagnostic';
import { headerSignature } from '../map/header-row';
import type { PlannedRow } from '../map/plan-items';
import { readRow } from '../map/read-row';
import { columnTitle, type RowReader } from '../map/row-cells';
import { MAX_CELL_CHARACTERS } from './limits';
import { isBlank, type SourceRecord } from './records';
import type { SettledLayout } from './settle-layout';

/** What makes a record unfit to be read at all; said, so that it costs this record only. */
function isBroken(
  record: SourceRecord,
  reader: RowReader,
  collector: DiagnosticCollector,
): boolean {
  const place = { line: record.line, raw: record.raw };
  if (record.problem === 'unbalancedQuote') {
    collector.add({
      ...place,
      code: 'row.unbalancedQuote',
      severity: 'error',
      expected: 'a closing quotation mark',
      sentence: `Line ${record.line} opens a quotation mark that is never closed.`,
      hint: 'Remove the mark in the file, or double it; the lines below were read.',
    });
    return true;
  }
  const long = record.cells.findIndex((cell) => cell.length > MAX_CELL_CHARACTERS);
  if (long !== -1) {
    collector.add({
      ...place,
      code: 'cell.tooLong',
      severity: 'error',
      column: columnTitle(reader, long),
      columnIndex: long,
      expected: `at most ${MAX_CELL_CHARACTERS} characters`,
      got: `${record.cells[long]?.length ?? 0} characters`,
      sentence: `Line ${record.line} has a cell of ${record.cells[long]?.length ?? 0} characters.`,
      hint: 'Look for a quotation mark that is never closed.',
    });
    return true;
  }
  const beyond = record.cells.findIndex(
    (cell, index) => index >= reader.columnCount && cell.trim() !== '',
  );
  if (beyond === -1) return false;
  collector.add({
    ...place,
    code: 'row.extraColumns',
    severity: 'error',
    columnIndex: beyond,
    expected: `${reader.columnCount} cells`,
    got: `${record.cells.length} cells`,
    sentence: `Line ${record.line} has ${record.cells.length} cells, the titles ${reader.columnCount}.`,
    hint: 'A separator inside a text needs quotation marks around the text.',
  });
  return true;
}

function observeStrayQuote(record: SourceRecord, collector: DiagnosticCollector): void {
  if (record.problem !== 'strayQuote') return;
  collector.add({
    code: 'row.strayQuote',
    severity: 'warning',
    line: record.line,
    raw: record.raw,
    sentence: `Line ${record.line} has a quotation mark inside a quoted text; it is kept as it is.`,
    hint: 'Check the text of this line.',
  });
}

/** Reads the records below the titles. Blank records and repeated titles are left out. */
export function readBody(settled: SettledLayout, collector: DiagnosticCollector): PlannedRow[] {
  const { layout, titles, columnCount } = settled;
  const reader: RowReader = { layout, titles, columnCount };
  const rows: PlannedRow[] = [];
  for (const record of settled.body) {
    if (isBlank(record)) continue;
    if (
      layout.headerSignature !== null &&
      headerSignature(record.cells) === layout.headerSignature
    ) {
      collector.add({
        code: 'header.repeated',
        severity: 'guess',
        line: record.line,
        raw: record.raw,
        sentence: `Line ${record.line} repeats the column titles and is passed over.`,
      });
      continue;
    }
    const { line, raw } = record;
    if (isBroken(record, reader, collector)) {
      rows.push({ line, raw, reading: null });
      continue;
    }
    observeStrayQuote(record, collector);
    const reading = readRow({ line, cells: record.cells }, reader);
    for (const found of reading.observations) collector.add(found);
    rows.push({ line, raw, reading });
  }
  return rows;
}
