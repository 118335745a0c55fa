import { deleteRateSheetRow } from '../../../db/queries/rate-sheets';
import { deletedRateSheet, rateSheetRef } from '../../contracts/rate-sheets';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';
import { changedSheet, draftSheet, sheetInWords } from './internal';

export const deleteRateSheet = defineVerb({
  name: 'rateSheets.delete',
  says: 'Throw a drafted rate sheet away',
  kind: 'write',
  permission: 'rates.write',
  http: { method: 'DELETE', path: '/api/rate-sheets/{rateSheetId}' },
  input: rateSheetRef,
  output: deletedRateSheet,
  async run(ctx, { rateSheetId }) {
    const draft = await draftSheet(ctx, rateSheetId);
    if (!draft.ok) return draft;
    const before = await changedSheet(ctx, rateSheetId);
    await deleteRateSheetRow(ctx.scope, rateSheetId);
    await ctx.record({
      action: 'rateSheets.delete',
      entity: 'rateSheet',
      entityId: rateSheetId,
      summary: `Threw the draft of ${sheetInWords(draft.value)} away`,
      before,
    });
    return ok({ rateSheetId });
  },
});
