import { clausesOf, findRateSheet, type StoredRateSheet } from '../../../db/queries/rate-sheets';
import type { RateSheetDetail } from '../../contracts/rate-sheets';
import { checkClauses } from '../../domain/rating/check-clauses';
import { describeClause } from '../../domain/rating/clauses-by-kind/registry';
import type { Result } from '../../domain/result';
import { fail, ok } from '../../domain/result';
import type { Ctx } from '../context';
import { type Failure, failure, notFound } from '../failure';

/** "rate sheet 2026 agreement, version 2, of Cinder Ridge Ready-Mix" */
export function sheetInWords(sheet: StoredRateSheet): string {
  return `rate sheet ${sheet.name}, version ${sheet.version}, of ${sheet.supplierName}`;
}

/** The sheet as its screen shows it: every clause in words, and what is wrong with it. */
export async function rateSheetDetailOf(
  ctx: Ctx,
  rateSheetId: string,
): Promise<RateSheetDetail | null> {
  const sheet = await findRateSheet(ctx.scope, rateSheetId);
  if (!sheet) return null;
  const clauses = (await clausesOf(ctx.scope, rateSheetId)).map((row) => row.clause);
  return {
    ...sheet,
    approvedAt: sheet.approvedAt?.toISOString() ?? null,
    lines: clauses.map((clause) => ({ clause, says: describeClause(clause) })),
    problems: checkClauses(clauses).map(({ clauseIndex, severity, sentence }) => ({
      index: clauseIndex,
      severity,
      sentence,
    })),
    times: { timeZone: ctx.company.timeZone, clock: ctx.company.clock },
  };
}

export async function changedSheet(ctx: Ctx, rateSheetId: string): Promise<RateSheetDetail> {
  const detail = await rateSheetDetailOf(ctx, rateSheetId);
  if (!detail) throw new Error(`Rate sheet ${rateSheetId}, just changed, is missing`);
  return detail;
}

/** The draft, locked for a change; an approved sheet is never changed, only followed. */
export async function draftSheet(
  ctx: Ctx,
  rateSheetId: string,
): Promise<Result<StoredRateSheet, Failure>> {
  const sheet = await findRateSheet(ctx.scope, rateSheetId, true);
  if (!sheet) return fail(notFound('rate sheet'));
  if (sheet.status === 'approved') {
    return fail(
      failure(
        'closed',
        `The ${sheetInWords(sheet)} is approved and stays as it is. Draft a new version instead.`,
      ),
    );
  }
  return ok(sheet);
}
