import { findImport } from '../../../db/queries/imports';
import { importPreview, previewImportInput } from '../../contracts/imports';
import { fail, ok } from '../../domain/result';
import { getBlob } from '../../storage/blob-store';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { proposeStatement } from './propose';
import { readImport } from './read-file';

export const previewImport = defineVerb({
  name: 'imports.preview',
  says: 'Read an uploaded file as it would be taken in: columns, lines, and what is wrong with it',
  kind: 'read',
  permission: 'statements.read',
  http: { method: 'GET', path: '/api/imports/{importId}' },
  input: previewImportInput,
  output: importPreview,
  async run({ scope }, { importId }) {
    const stored = await findImport(scope, importId);
    if (!stored) return fail(notFound('upload'));
    const bytes = await getBlob(stored.sha256);
    if (!bytes) throw new Error(`The file of import ${importId} is missing from the store`);
    const { preview, layoutFrom } = await readImport(scope, stored, bytes);
    const { statementId, statementNumber, supplierId, supplierName, status } = stored;
    return ok({
      importId,
      status,
      supplier: { id: supplierId, name: supplierName },
      statement:
        statementId && statementNumber ? { id: statementId, number: statementNumber } : null,
      layoutFrom,
      proposed: proposeStatement(preview),
      preview,
    });
  },
});
