import type { BillCsvPreview } from '../../../importers/core/plan';
import type { ImportPreview } from '../../contracts/imports';

function lastOfMonth(day: string): string {
  const [year = 0, month = 1] = day.split('-').map(Number);
  const last = new Date(Date.UTC(year, month, 0)).getUTCDate();
  return `${day.slice(0, 8)}${String(last).padStart(2, '0')}`;
}

/** The period that most of the lines' days suggest: their whole month where they share one. */
function periodOf(days: readonly string[]): { readonly from: string; readonly to: string } {
  const sorted = [...days].sort();
  const [first = '', last = ''] = [sorted[0], sorted.at(-1)];
  if (first === '' || first.slice(0, 7) !== last.slice(0, 7)) return { from: first, to: last };
  return { from: `${first.slice(0, 8)}01`, to: lastOfMonth(first) };
}

/** What the form about the statement starts with: the document's own words, else its lines'. */
export function proposeStatement(preview: BillCsvPreview): ImportPreview['proposed'] {
  const { document, items } = preview;
  const lines = items.filter(
    ({ action, skipReason }) => action === 'create' || skipReason === 'alreadyImported',
  );
  const period = periodOf(lines.flatMap(({ values }) => values.date ?? []));
  const periodEnd = document.periodTo ?? period.to;
  return {
    number: document.documentNumber ?? periodEnd.slice(0, 7),
    periodStart: document.periodFrom ?? period.from,
    periodEnd,
    openingBalance: document.openingBalance ?? '',
    closingBalance: document.closingBalance ?? '',
  };
}
