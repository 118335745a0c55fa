import { rememberedLayouts, type StoredImport } from '../../../db/queries/imports';
import { rowKeysOf } from '../../../db/queries/statements';
import type { Scope } from '../../../db/tx';
import { importLayoutSchema } from '../../../importers/core/layout';
import type { BillCsvPreview } from '../../../importers/core/plan';
import { readBillCsv } from '../../../importers/csv/read-bill-csv';
import type { ImportPreview } from '../../contracts/imports';

export interface ReadImport {
  readonly preview: BillCsvPreview;
  readonly layoutFrom: ImportPreview['layoutFrom'];
}

/**
 * Reads an uploaded file as it would be taken into the ledger now: with the layout chosen on the
 * preview, else the one remembered for the supplier's files with these titles, else a guess.
 */
export async function readImport(
  scope: Scope,
  stored: StoredImport,
  bytes: Uint8Array,
): Promise<ReadImport> {
  const file = {
    fileName: stored.fileName,
    bytes,
    existingRowKeys: await rowKeysOf(scope, stored.supplierId),
  };
  const chosen = importLayoutSchema.safeParse(stored.layout);
  if (stored.layout !== null && chosen.success) {
    return { preview: readBillCsv({ ...file, layout: chosen.data }), layoutFrom: 'chosen' };
  }
  const guessed = readBillCsv(file);
  for (const kept of await rememberedLayouts(scope, stored.supplierId)) {
    const remembered = importLayoutSchema.safeParse(kept);
    if (!remembered.success) continue;
    const layout = remembered.data;
    // A layout without titles fits only a file in which none were found.
    if (layout.headerSignature === null && guessed.layout.headerRow !== null) continue;
    const preview = readBillCsv({ ...file, layout });
    if (preview.readable && preview.layout.headerSignature === layout.headerSignature) {
      return { preview, layoutFrom: 'remembered' };
    }
  }
  return { preview: guessed, layoutFrom: 'guessed' };
}
