import { endEarlierSheets, updateRateSheetRow } from '../../../db/queries/rate-sheets';
import { shiftDay } from '../../clock';
import { rateSheetDetail, rateSheetRef } from '../../contracts/rate-sheets';
import { fail, ok } from '../../domain/result';
import { failure } from '../failure';
import { defineVerb } from '../verb';
import { changedSheet, draftSheet, rateSheetDetailOf, sheetInWords } from './internal';

export const approveRateSheet = defineVerb({
  name: 'rateSheets.approve',
  says: 'Approve a drafted rate sheet: it applies from its first day and is never changed again',
  kind: 'write',
  permission: 'rates.approve',
  http: { method: 'POST', path: '/api/rate-sheets/{rateSheetId}/approve' },
  input: rateSheetRef,
  output: rateSheetDetail,
  async run(ctx, { rateSheetId }) {
    const known = await rateSheetDetailOf(ctx, rateSheetId);
    if (known?.status === 'approved') {
      ctx.unchanged();
      return ok(known);
    }
    const draft = await draftSheet(ctx, rateSheetId);
    if (!draft.ok) return draft;
    const sheet = draft.value;
    const { lines, problems } = await changedSheet(ctx, rateSheetId);
    const wrong = problems.find((problem) => problem.severity === 'error');
    if (wrong || lines.length === 0) {
      return fail(
        failure(
          'conflict',
          wrong
            ? `Clause ${wrong.index + 1}: ${wrong.sentence} Correct the draft first.`
            : 'The sheet has no clause yet, so nothing would be agreed. Add its clauses first.',
        ),
      );
    }
    await updateRateSheetRow(ctx.scope, rateSheetId, {
      status: 'approved',
      approvedBy: ctx.actor.personId,
      approvedAt: ctx.clock.now(),
    });
    await endEarlierSheets(
      ctx.scope,
      sheet,
      sheet.effectiveFrom,
      shiftDay(sheet.effectiveFrom, -1),
    );
    const after = await changedSheet(ctx, rateSheetId);
    await ctx.record({
      action: 'rateSheets.approve',
      entity: 'rateSheet',
      entityId: rateSheetId,
      summary: `Approved ${sheetInWords(sheet)}`,
      before: { status: 'draft' },
      after,
    });
    return ok(after);
  },
});
