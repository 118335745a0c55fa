import { findImport, updateImport } from '../../../db/queries/imports';
import { setImportLayoutInput, setImportLayoutOutput } from '../../contracts/imports';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { noLongerWaiting } from './internal';

export const setImportLayout = defineVerb({
  name: 'imports.setLayout',
  says: 'Say how an uploaded file is to be read: its encoding, titles and columns',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'PUT', path: '/api/imports/{importId}/layout' },
  input: setImportLayoutInput,
  output: setImportLayoutOutput,
  async run(ctx, { importId, layout }) {
    const stored = await findImport(ctx.scope, importId, true);
    if (!stored) return fail(notFound('upload'));
    const refused = noLongerWaiting(stored);
    if (refused) return fail(refused);
    await updateImport(ctx.scope, importId, { layout });
    await ctx.record({
      action: 'imports.setLayout',
      entity: 'import',
      entityId: importId,
      summary: layout
        ? `Chose how ${stored.fileName} is read`
        : `Had the columns of ${stored.fileName} guessed again`,
      before: stored.layout,
      after: layout,
    });
    return ok({ importId });
  },
});
