import { findJob } from '../../../db/queries/jobs';
import {
  clausesOf,
  insertRateSheet,
  rateSheetsOf,
  setClauses,
} from '../../../db/queries/rate-sheets';
import { findSupplier } from '../../../db/queries/suppliers';
import { createRateSheetInput, rateSheetDetail } from '../../contracts/rate-sheets';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { changedSheet } from './internal';

export const createRateSheet = defineVerb({
  name: 'rateSheets.create',
  says: 'Draft the next version of a supplier’s rate sheet',
  kind: 'write',
  permission: 'rates.write',
  http: { method: 'POST', path: '/api/suppliers/{supplierId}/rate-sheets' },
  input: createRateSheetInput,
  output: rateSheetDetail,
  async run(ctx, { supplierId, copyLatest, ...values }) {
    if (!(await findSupplier(ctx.scope, supplierId))) return fail(notFound('supplier'));
    if (values.jobId !== null && !(await findJob(ctx.scope, values.jobId, null))) {
      return fail(notFound('job'));
    }
    const sheets = await rateSheetsOf(ctx.scope, supplierId);
    const same = sheets.filter((sheet) => sheet.jobId === values.jobId);
    const version = Math.max(0, ...same.map((sheet) => sheet.version)) + 1;
    const id = newId<'rateSheet'>();
    await insertRateSheet(ctx.scope, { ...values, id, supplierId, version, status: 'draft' });
    // A job's first sheet begins with what is agreed in general.
    const latest = same[0] ?? sheets.find((sheet) => sheet.jobId === null);
    if (copyLatest && latest) {
      const clauses = await clausesOf(ctx.scope, latest.id);
      await setClauses(
        ctx.scope,
        id,
        clauses.map((row) => row.clause),
      );
    }
    const made = await changedSheet(ctx, id);
    await ctx.record({
      action: 'rateSheets.create',
      entity: 'rateSheet',
      entityId: id,
      summary: `Drafted rate sheet ${made.name}, version ${version}, of ${made.supplierName}`,
      after: made,
    });
    return ok(made);
  },
});
