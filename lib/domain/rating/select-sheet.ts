import type { PlainDate } from '../time/clock-minutes';
import type { RateSheetFacts } from './clauses';

/** True when `sheet` applies on `date`; both its first and its last day count. */
export function isEffective(sheet: RateSheetFacts, date: PlainDate): boolean {
  return sheet.effectiveFrom <= date && (sheet.effectiveTo === null || date <= sheet.effectiveTo);
}

/** Job's own before general, later start before earlier, higher version before lower. */
function precedence(a: RateSheetFacts, b: RateSheetFacts): number {
  const byJob = Number(b.jobId !== null) - Number(a.jobId !== null);
  if (byJob !== 0) return byJob;
  if (a.effectiveFrom !== b.effectiveFrom) return a.effectiveFrom < b.effectiveFrom ? 1 : -1;
  if (a.version !== b.version) return b.version - a.version;
  return a.id < b.id ? -1 : 1;
}

/** The sheet that a delivery is rated by: by its own day, never by the bill's. */
export function sheetFor(
  sheets: readonly RateSheetFacts[],
  delivery: {
    readonly supplierId: string;
    readonly jobId: string | null;
    readonly date: PlainDate;
  },
): RateSheetFacts | null {
  const fitting = sheets.filter(
    (sheet) =>
      sheet.supplierId === delivery.supplierId &&
      (sheet.jobId === null || sheet.jobId === delivery.jobId) &&
      isEffective(sheet, delivery.date),
  );
  return [...fitting].sort(precedence)[0] ?? null;
}
