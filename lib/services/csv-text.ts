/**
 * Rows as CSV for spreadsheets: UTF-8 with a mark at the start, CRLF lines, and cells that a
 * spreadsheet would run as a formula made into text with a leading apostrophe.
 */
export function csvText(rows: readonly (readonly (string | number | null)[])[]): string {
  const lines = rows.map((row) => row.map(cell).join(','));
  return `\uFEFF${lines.join('\r\n')}\r\n`;
}

const FORMULA = /^[=+\-@\t\r]/;
const NUMBER = /^-?\d+(\.\d+)?$/;

function cell(value: string | number | null): string {
  const text = value === null ? '' : String(value);
  const safe = FORMULA.test(text) && !NUMBER.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
