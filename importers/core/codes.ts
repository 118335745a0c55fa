/**
 * Every diagnostic that an importer can give, with one line of documentation each. Codes are
 * stable: people's filters, tests and support answers refer to them.
 */
const DIAGNOSTIC_CODES = {
  'file.empty': 'The file has no bytes, or nothing but blank lines.',
  'file.tooLarge': 'The file is larger than the importer reads.',
  'file.notText': 'The content is not delimited text: a PDF, workbook, picture, archive or page.',
  'file.encodingGuessed': 'The file does not say its encoding; it was inferred from the bytes.',
  'file.badBytes': 'Some bytes are not valid in the encoding and were replaced.',
  'file.delimiterGuessed': 'More than one character could separate the columns; one was chosen.',
  'file.oneColumn': 'No separator gives more than one column.',
  'file.tooManyRows': 'The file has more rows than the importer reads.',
  'file.tooManyColumns': 'A row has more columns than the importer reads.',
  'file.noLines': 'No row of the file could be taken as a billed line.',
  'header.notFound': 'No row of column titles was found; columns were told by their content.',
  'header.repeated': 'The column titles appear again further down and were passed over.',
  'layout.headerChanged': 'The remembered titles are not in this file; columns were guessed anew.',
  'layout.columnOutside': 'The layout names a column that the file does not have.',
  'mapping.guessed': 'A column was recognised by its content or an unusual title.',
  'mapping.amountMissing': 'No column holds amounts, and none can be worked out.',
  'mapping.amountComputed': 'No amount column: amounts were worked out as quantity × unit price.',
  'mapping.dateMissing': 'No column holds dates.',
  'mapping.descriptionMissing': 'No column holds descriptions or item codes.',
  'date.orderGuessed': 'The dates can be read month first or day first; one was chosen.',
  'date.orderMixed': 'Some dates can only be month first and others only day first.',
  'number.markGuessed': 'The numbers can be read with point or comma as decimal mark.',
  'row.unbalancedQuote': 'A quotation mark is opened and never closed.',
  'row.strayQuote': 'A quoted cell contains a quotation mark that is not doubled.',
  'row.extraColumns': 'The row has more filled cells than there are columns.',
  'row.missingColumns': 'The row has fewer cells than there are columns, and lacks a needed one.',
  'row.repeated': 'The same line stands more than once in this file.',
  'row.note': 'The row holds words only: no date, ticket or amount.',
  'row.signTurned': 'A payment or credit was printed without a minus sign and counted as one.',
  'row.chargeUnknown': 'The description does not tell what is charged.',
  'row.alreadyImported': 'The line is already in the ledger from an earlier import.',
  'cell.tooLong': 'A cell is longer than the importer reads.',
  'cell.dateUnreadable': 'The cell is not a date.',
  'cell.dateMissing': 'The row has no date.',
  'cell.numberUnreadable': 'The cell is not a number.',
  'cell.amountMissing': 'The row has no amount.',
  'cell.spoiledNumber': 'A spreadsheet has shortened a long number; its last digits are lost.',
  'cell.bothAmounts': 'The row has an amount both as a charge and as a credit.',
  'line.extensionDiffers': 'Quantity × unit price is not the printed amount.',
  'line.taxIncludedGuessed':
    'The line has tax of its own; whether the amount includes it is unsure.',
  'totals.differ': 'A printed total is not the sum of the lines that it covers.',
  'statement.doesNotRoll': 'Opening balance and lines do not come to the closing balance.',
} as const;

export type DiagnosticCode = keyof typeof DIAGNOSTIC_CODES;

export const DIAGNOSTIC_CODE_LIST = Object.keys(DIAGNOSTIC_CODES) as DiagnosticCode[];
