import type { z } from 'zod';
import { findSameFile, insertImport } from '../../../db/queries/imports';
import { findSupplierName } from '../../../db/queries/statements';
import { readBillCsv } from '../../../importers/csv/read-bill-csv';
import { uploadImportInput, uploadImportOutput } from '../../contracts/imports';
import type { Result } from '../../domain/result';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { putBlob } from '../../storage/blob-store';
import type { Failure } from '../failure';
import { failure, notFound } from '../failure';
import { defineVerb } from '../verb';

type Prepared = z.output<typeof uploadImportInput> & { readonly sha256?: string };

/** Why no line of the file could ever be read, with what to do; null where it is a bill. */
function refusal(fileName: string, bytes: Uint8Array): Failure | null {
  const { readable, diagnostics } = readBillCsv({
    fileName,
    bytes,
    existingRowKeys: new Set(),
  });
  if (readable) return null;
  const [first] = diagnostics.filter(({ severity }) => severity === 'error');
  const sentence = first ? `${first.sentence} ${first.hint ?? ''}`.trim() : 'It can’t be read.';
  return failure('wrongType', `${fileName}: ${sentence} Nothing was kept.`, [
    { path: 'bytes', message: first?.sentence ?? 'not a CSV file' },
  ]);
}

export const uploadImport = defineVerb({
  name: 'imports.upload',
  says: 'Upload a supplier’s statement or invoice as CSV, to be looked at before it is taken in',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/imports' },
  input: uploadImportInput,
  output: uploadImportOutput,
  async prepare(input): Promise<Result<Prepared, Failure>> {
    const refused = refusal(input.fileName, input.bytes);
    if (refused) return fail(refused);
    return ok({ ...input, sha256: await putBlob(input.bytes) });
  },
  async run(ctx, { supplierId, fileName, bytes, sha256 }: Prepared) {
    if (!sha256) throw new Error('The file was not stored');
    const supplierName = await findSupplierName(ctx.scope, supplierId);
    if (supplierName === null) return fail(notFound('supplier'));
    const same = await findSameFile(ctx.scope, supplierId, sha256);
    if (same) {
      ctx.unchanged();
      const { statementId, statementNumber } = same;
      const statement =
        statementId && statementNumber ? { id: statementId, number: statementNumber } : null;
      return ok({ importId: same.id, statement, repeated: true });
    }
    const importId = newId<'import'>();
    await insertImport(ctx.scope, {
      id: importId,
      supplierId,
      fileName,
      sha256,
      sizeBytes: bytes.length,
      uploadedBy: ctx.actor.personId,
    });
    await ctx.record({
      action: 'imports.upload',
      entity: 'import',
      entityId: importId,
      summary: `Uploaded ${fileName} of ${supplierName} to be looked at`,
      after: { fileName, sha256, sizeBytes: bytes.length },
    });
    return ok({ importId, statement: null, repeated: false });
  },
});
