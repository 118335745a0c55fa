import { rateSheetDetail, rateSheetRef } from '../../contracts/rate-sheets';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { rateSheetDetailOf } from './internal';

export const getRateSheet = defineVerb({
  name: 'rateSheets.get',
  says: 'Read a rate sheet: every clause as data and in words',
  kind: 'read',
  permission: 'rates.read',
  http: { method: 'GET', path: '/api/rate-sheets/{rateSheetId}' },
  input: rateSheetRef,
  output: rateSheetDetail,
  async run(ctx, { rateSheetId }) {
    const found = await rateSheetDetailOf(ctx, rateSheetId);
    return found ? ok(found) : fail(notFound('rate sheet'));
  },
});
