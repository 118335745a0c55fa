import { findImport, updateImport } from '../../../db/queries/imports';
import { discardImportInput, discardImportOutput } from '../../contracts/imports';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { noLongerWaiting } from './internal';

export const discardImport = defineVerb({
  name: 'imports.discard',
  says: 'Put an uploaded file away without taking it in',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'DELETE', path: '/api/imports/{importId}' },
  input: discardImportInput,
  output: discardImportOutput,
  async run(ctx, { importId }) {
    const stored = await findImport(ctx.scope, importId, true);
    if (!stored) return fail(notFound('upload'));
    if (stored.status === 'discarded') {
      ctx.unchanged();
      return ok({ importId });
    }
    const refused = noLongerWaiting(stored);
    if (refused) return fail(refused);
    await updateImport(ctx.scope, importId, { status: 'discarded' });
    await ctx.record({
      action: 'imports.discard',
      entity: 'import',
      entityId: importId,
      summary: `Discarded ${stored.fileName} of ${stored.supplierName}; nothing was taken in`,
      before: { status: 'preview' },
      after: { status: 'discarded' },
    });
    return ok({ importId });
  },
});
