import type { PlainDate } from '../time/clock-minutes';
import type { IdentifiedClause, RateSheetFacts } from './clauses';
import type { ClauseOf } from './clauses-by-kind/rule';
import { mixKey } from './mix-code';

export type MixPrice = { readonly id: string; readonly clause: ClauseOf<'mixPrice'> };
export type TaxClause = { readonly id: string; readonly clause: ClauseOf<'tax'> };

/** A rate sheet prepared for look-ups. */
export interface PreparedSheet {
  readonly sheet: RateSheetFacts;
  /** The agreed price of a mix: its own, else that of "any mix not listed". */
  priceOf(mixCode: string): MixPrice | null;
  readonly tax: TaxClause | null;
  /** Everything but mix prices and tax, in the sheet's order. */
  readonly others: readonly IdentifiedClause[];
}

export interface SheetIndex {
  /** The sheet that applies to a delivery, or null where none was agreed for that day. */
  sheetFor(supplierId: string, jobId: string | null, date: PlainDate): PreparedSheet | null;
}

function prepare(sheet: RateSheetFacts): PreparedSheet {
  const prices = new Map<string, MixPrice>();
  const others: IdentifiedClause[] = [];
  let catchAll: MixPrice | null = null;
  let tax: TaxClause | null = null;
  for (const { id, clause } of sheet.clauses) {
    if (clause.kind === 'tax') tax ??= { id, clause };
    else if (clause.kind !== 'mixPrice') others.push({ id, clause });
    else if (clause.mixCode === null) catchAll ??= { id, clause };
    else if (!prices.has(mixKey(clause.mixCode)))
      prices.set(mixKey(clause.mixCode), { id, clause });
  }
  return { sheet, priceOf: (code) => prices.get(mixKey(code)) ?? catchAll, tax, others };
}

function newestFirst(one: RateSheetFacts, other: RateSheetFacts): number {
  if (one.version !== other.version) return other.version - one.version;
  if (one.effectiveFrom !== other.effectiveFrom) {
    return one.effectiveFrom < other.effectiveFrom ? 1 : -1;
  }
  return one.id < other.id ? -1 : 1;
}

function listKey(supplierId: string, jobId: string | null): string {
  return JSON.stringify([supplierId, jobId]);
}

/**
 * Which sheet applies: the job's own sheet, as a whole, over the supplier's general one; of
 * several in effect on the day, the newest version (then the latest start).
 */
export function indexSheets(rateSheets: readonly RateSheetFacts[]): SheetIndex {
  const lists = new Map<string, PreparedSheet[]>();
  for (const sheet of [...rateSheets].sort(newestFirst)) {
    const key = listKey(sheet.supplierId, sheet.jobId);
    const list = lists.get(key) ?? [];
    list.push(prepare(sheet));
    lists.set(key, list);
  }
  const inEffect = (key: string, date: PlainDate) =>
    lists
      .get(key)
      ?.find(
        ({ sheet }) =>
          sheet.effectiveFrom <= date && (sheet.effectiveTo === null || date <= sheet.effectiveTo),
      ) ?? null;
  return {
    sheetFor(supplierId, jobId, date) {
      const own = jobId === null ? null : inEffect(listKey(supplierId, jobId), date);
      return own ?? inEffect(listKey(supplierId, null), date);
    },
  };
}
