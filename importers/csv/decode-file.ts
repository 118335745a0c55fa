import type { DiagnosticCollector } from '../core/diagnostic';
import type { Delimiter, Encoding, ImportLayout } from '../core/layout';
import { findHeaderBySignature } from '../map/header-row';
import { delimiterName, detectDelimiter } from './delimiter';
import { decodeText, detectEncoding, type EncodingGuess } from './encoding';
import { nameOfOtherKind } from './file-kind';
import { MAX_BYTES, MAX_COLUMNS, MAX_ROWS } from './limits';
import { type RecordList, type SourceRecord, splitRecords } from './records';

export interface DecodedFile {
  readonly records: readonly SourceRecord[];
  readonly encoding: Encoding;
  readonly delimiter: Delimiter;
}

const ENCODING_NAMES: Readonly<Record<Encoding, string>> = {
  'utf-8': 'UTF-8',
  'windows-1252': 'Windows-1252',
  'utf-16le': 'UTF-16 (little-endian)',
  'utf-16be': 'UTF-16 (big-endian)',
};

/** What can be told from the bytes alone. False where the file is refused. */
function acceptBytes(
  bytes: Uint8Array,
  guess: EncodingGuess,
  collector: DiagnosticCollector,
): boolean {
  if (bytes.byteLength === 0) {
    collector.add({
      code: 'file.empty',
      severity: 'error',
      sentence: 'The file is empty.',
      hint: 'Export or download it again.',
    });
    return false;
  }
  if (bytes.byteLength > MAX_BYTES) {
    collector.add({
      code: 'file.tooLarge',
      severity: 'error',
      expected: `at most ${MAX_BYTES / 1024 / 1024} MB`,
      got: `${(bytes.byteLength / 1024 / 1024).toFixed(1)} MB`,
      sentence: 'The file is larger than a statement can be.',
      hint: 'Choose the statement itself, or split it by month.',
    });
    return false;
  }
  const wide = guess.encoding === 'utf-16le' || guess.encoding === 'utf-16be';
  const other = nameOfOtherKind(bytes, wide);
  if (other === null) return true;
  collector.add({
    code: 'file.notText',
    severity: 'error',
    expected: 'delimited text (CSV)',
    got: other,
    sentence: `The file is ${other}, not a CSV file.`,
    hint: 'Ask the supplier for a CSV export, or save the sheet as CSV and choose that file.',
  });
  return false;
}

function decode(
  bytes: Uint8Array,
  encoding: Encoding,
  guess: EncodingGuess,
  given: boolean,
  collector: DiagnosticCollector,
): string {
  const { text, replaced } = decodeText(bytes, encoding);
  if (!given && !guess.sure) {
    collector.add({
      code: 'file.encodingGuessed',
      severity: 'guess',
      got: ENCODING_NAMES[encoding],
      sentence: `The file is read as ${ENCODING_NAMES[encoding]}.`,
      hint: 'Choose another encoding if names look wrong.',
    });
  }
  if (replaced > 0) {
    collector.add({
      code: 'file.badBytes',
      severity: 'warning',
      expected: ENCODING_NAMES[encoding],
      got: `${replaced} unreadable characters`,
      sentence: `${replaced} characters could not be read as ${ENCODING_NAMES[encoding]}.`,
      hint: 'Choose another encoding.',
    });
  }
  return text;
}

/**
 * The records under the remembered delimiter, unless the remembered titles are found only under
 * the one that this file seems to have.
 */
function split(
  text: string,
  given: ImportLayout | null,
  collector: DiagnosticCollector,
): RecordList & { delimiter: Delimiter } {
  if (given !== null) {
    const asGiven = splitRecords(text, given.delimiter, MAX_ROWS);
    const signature = given.headerSignature;
    const cells = (list: RecordList) => list.records.map((record) => record.cells);
    if (signature === null || findHeaderBySignature(cells(asGiven), signature) !== null) {
      return { ...asGiven, delimiter: given.delimiter };
    }
  }
  const guess = detectDelimiter(text);
  if (guess.oneColumn) {
    collector.add({
      code: 'file.oneColumn',
      severity: 'warning',
      sentence: 'No comma, semicolon, tab or bar separates the file into columns.',
      hint: 'Choose the CSV export of the statement, not a printed report.',
    });
  }
  if (guess.rival !== null) {
    collector.add({
      code: 'file.delimiterGuessed',
      severity: 'guess',
      got: delimiterName(guess.delimiter),
      sentence: `Columns are separated by ${delimiterName(guess.delimiter)}; ${delimiterName(guess.rival)} would fit too.`,
      hint: 'Choose the other if the columns look wrong.',
    });
  }
  return { ...splitRecords(text, guess.delimiter, MAX_ROWS), delimiter: guess.delimiter };
}

/** The steps detect, decode and parse. Null where the file is refused. */
export function decodeFile(
  bytes: Uint8Array,
  given: ImportLayout | null,
  collector: DiagnosticCollector,
): DecodedFile | null {
  const guess = detectEncoding(bytes);
  if (!acceptBytes(bytes, guess, collector)) return null;
  // A byte order mark is the file's own word; it overrules what was remembered.
  const encoding = guess.stated ? guess.encoding : (given?.encoding ?? guess.encoding);
  const text = decode(bytes, encoding, guess, given !== null, collector);
  if (text.trim() === '') {
    collector.add({
      code: 'file.empty',
      severity: 'error',
      sentence: 'The file holds nothing but blank lines.',
      hint: 'Export or download it again.',
    });
    return null;
  }
  const { records, cut, delimiter } = split(text, given, collector);
  if (cut) {
    collector.add({
      code: 'file.tooManyRows',
      severity: 'error',
      expected: `at most ${MAX_ROWS} rows`,
      sentence: `The file has more than ${MAX_ROWS} rows.`,
      hint: 'Split it by month, so that no line is left out unseen.',
    });
    return null;
  }
  const widest = records.find((record) => record.cells.length > MAX_COLUMNS);
  if (widest !== undefined) {
    collector.add({
      code: 'file.tooManyColumns',
      severity: 'error',
      line: widest.line,
      raw: widest.raw,
      expected: `at most ${MAX_COLUMNS} columns`,
      got: `${widest.cells.length} columns`,
      sentence: `Line ${widest.line} has ${widest.cells.length} columns.`,
      hint: 'Check the separator, or export fewer columns.',
    });
    return null;
  }
  return { records, encoding, delimiter };
}
