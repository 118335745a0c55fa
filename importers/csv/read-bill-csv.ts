import { createHash } from 'node:crypto';
import { DiagnosticCollector } from '../core/diagnostic';
import { EMPTY_COLUMNS, type ImportLayout } from '../core/layout';
import type { BillCsvPreview, DocumentFacts, ImportItem, ImportTotals } from '../core/plan';
import { checkTotals, sumItems, withBalances } from '../map/check-totals';
import { readPreamble } from '../map/document-facts';
import { type PlannedRow, planItems } from '../map/plan-items';
import { decodeFile } from './decode-file';
import { readBody } from './read-body';
import type { SourceRecord } from './records';
import { type SettledLayout, settleLayout } from './settle-layout';

export interface BillCsvInput {
  readonly fileName: string;
  readonly bytes: Uint8Array;
  /** What a person confirmed on the preview, or what is remembered for the supplier. */
  readonly layout?: ImportLayout;
  /** Keys of the lines that this supplier's earlier imports brought into the ledger. */
  readonly existingRowKeys: ReadonlySet<string>;
}

const SAMPLE_ROWS = 12;
const SAMPLES_PER_COLUMN = 3;
const PREAMBLE_CHARACTERS = 200;

const NO_FACTS: DocumentFacts = {
  supplierName: null,
  documentNumber: null,
  documentDate: null,
  periodFrom: null,
  periodTo: null,
  openingBalance: null,
  closingBalance: null,
};

const FALLBACK_LAYOUT: ImportLayout = {
  encoding: 'utf-8',
  delimiter: ',',
  headerRow: null,
  headerSignature: null,
  dateOrder: 'MDY',
  decimalMark: '.',
  columns: EMPTY_COLUMNS,
};

/** The preview of a file of which nothing can be read: the diagnostics say why. */
function refusal(input: BillCsvInput, collector: DiagnosticCollector): BillCsvPreview {
  return assemble(input, collector, {
    readable: false,
    settled: null,
    items: [],
    document: NO_FACTS,
    counts: { records: 0, skipped: 0, failed: 0 },
  });
}

interface Parts {
  readonly readable: boolean;
  readonly settled: SettledLayout | null;
  readonly items: ImportItem[];
  readonly document: DocumentFacts;
  readonly counts: Pick<ImportTotals, 'records' | 'skipped' | 'failed'>;
}

function assemble(
  input: BillCsvInput,
  collector: DiagnosticCollector,
  parts: Parts,
): BillCsvPreview {
  const found = collector.list();
  const { items, settled, counts } = parts;
  return {
    fileName: input.fileName,
    fileSha256: createHash('sha256').update(input.bytes).digest('hex'),
    byteLength: input.bytes.byteLength,
    readable: parts.readable,
    layout: settled?.layout ?? input.layout ?? FALLBACK_LAYOUT,
    columns: settled === null ? [] : previewColumns(settled),
    sampleRows: settled === null ? [] : sampleRows(settled.body),
    document: parts.document,
    items,
    totals: {
      ...counts,
      lines: counts.records - counts.skipped - counts.failed,
      toCreate: items.filter((item) => item.action === 'create').length,
      alreadyImported: items.filter((item) => item.skipReason === 'alreadyImported').length,
      ...sumItems(items),
    },
    diagnostics: found.diagnostics,
    moreDiagnostics: found.more,
    diagnosticCounts: found.counts,
  };
}

function filledRows(body: readonly SourceRecord[]): SourceRecord[] {
  return body.filter((record) => record.cells.some((cell) => cell.trim() !== ''));
}

function sampleRows(body: readonly SourceRecord[]): BillCsvPreview['sampleRows'] {
  return filledRows(body.slice(0, 200))
    .slice(0, SAMPLE_ROWS)
    .map((record) => ({
      line: record.line,
      cells: record.cells.slice(0, 60).map((cell) => cell.slice(0, 200)),
    }));
}

function previewColumns(settled: SettledLayout): BillCsvPreview['columns'] {
  const rows = filledRows(settled.body.slice(0, 200));
  return Array.from({ length: settled.columnCount }, (_, index) => {
    const guess = settled.guesses.find((candidate) => candidate.column === index);
    const cells = rows.map((row) => (row.cells[index] ?? '').trim()).filter((cell) => cell !== '');
    return {
      index,
      title: (settled.titles[index] ?? '').trim().slice(0, 200),
      field: guess?.field ?? null,
      confidence: guess?.confidence ?? null,
      why: guess?.why ?? null,
      samples: [...new Set(cells)].slice(0, SAMPLES_PER_COLUMN).map((cell) => cell.slice(0, 200)),
    };
  });
}

function observeOutcome(items: readonly ImportItem[], collector: DiagnosticCollector): void {
  const already = items.filter((item) => item.skipReason === 'alreadyImported').length;
  const created = items.filter((item) => item.action === 'create').length;
  if (already > 0) {
    collector.add({
      code: 'row.alreadyImported',
      severity: 'guess',
      sentence:
        created === 0
          ? `All ${already} lines are already in the ledger; there is nothing to import.`
          : `${already} of ${already + created} lines are already in the ledger and are left out.`,
      hint: 'Nothing to do: lines are recognised by what they say.',
    });
  }
  if (already === 0 && created === 0) {
    collector.add({
      code: 'file.noLines',
      severity: 'error',
      sentence: 'No row of the file could be read as a billed line.',
      hint: 'Check the separator, the line of the titles and the columns.',
    });
  }
}

/** Records that are neither lines nor failed: preamble, titles, blanks, notes, balances, totals. */
function countRecords(
  records: readonly SourceRecord[],
  rows: readonly PlannedRow[],
  items: readonly ImportItem[],
) {
  const failed = items.filter((item) => item.action === 'error').length;
  const passedOver = items.filter(
    (item) => item.action === 'skip' && item.skipReason !== 'alreadyImported',
  ).length;
  return { records: records.length, failed, skipped: records.length - rows.length + passedOver };
}

/**
 * Reads a supplier's statement or invoice from delimited text: detect → decode → parse → map →
 * plan. Pure and synchronous; never writes and never throws, whatever the bytes. Everything
 * that is wrong or was guessed is in `diagnostics`; what would be stored is in `items`.
 */
export function readBillCsv(input: BillCsvInput): BillCsvPreview {
  const collector = new DiagnosticCollector(input.fileName);
  const file = decodeFile(input.bytes, input.layout ?? null, collector);
  if (file === null) return refusal(input, collector);
  const { records, encoding, delimiter } = file;
  const settled = settleLayout(
    { records, encoding, delimiter, given: input.layout ?? null },
    collector,
  );
  const rows = readBody(settled, collector);
  const items = planItems(rows, input.existingRowKeys, collector);
  const { dateOrder, decimalMark } = settled.layout;
  const preamble = settled.preamble.map((record) =>
    record.cells.map((cell) => cell.slice(0, PREAMBLE_CHARACTERS)),
  );
  const document = withBalances(readPreamble(preamble, dateOrder, decimalMark), items);
  observeOutcome(items, collector);
  checkTotals(items, document, sumItems(items).net, collector);
  const counts = countRecords(records, rows, items);
  return assemble(input, collector, { readable: true, settled, items, document, counts });
}
