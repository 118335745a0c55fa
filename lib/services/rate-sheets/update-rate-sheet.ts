import { findJob } from '../../../db/queries/jobs';
import { setClauses, updateRateSheetRow } from '../../../db/queries/rate-sheets';
import { rateSheetDetail, updateRateSheetInput } from '../../contracts/rate-sheets';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { changedSheet, draftSheet, sheetInWords } from './internal';

export const updateRateSheet = defineVerb({
  name: 'rateSheets.update',
  says: 'Change a drafted rate sheet',
  kind: 'write',
  permission: 'rates.write',
  http: { method: 'PUT', path: '/api/rate-sheets/{rateSheetId}' },
  input: updateRateSheetInput,
  output: rateSheetDetail,
  async run(ctx, { rateSheetId, clauses, ...values }) {
    const draft = await draftSheet(ctx, rateSheetId);
    if (!draft.ok) return draft;
    if (values.jobId !== null && !(await findJob(ctx.scope, values.jobId, null))) {
      return fail(notFound('job'));
    }
    const before = await changedSheet(ctx, rateSheetId);
    await updateRateSheetRow(ctx.scope, rateSheetId, values);
    await setClauses(ctx.scope, rateSheetId, clauses);
    const after = await changedSheet(ctx, rateSheetId);
    await ctx.record({
      action: 'rateSheets.update',
      entity: 'rateSheet',
      entityId: rateSheetId,
      summary: `Changed the draft of ${sheetInWords(draft.value)}`,
      before,
      after,
    });
    return ok(after);
  },
});
