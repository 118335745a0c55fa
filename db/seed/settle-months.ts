import { and, eq } from 'drizzle-orm';
import type { Actor } from '../../lib/auth/actor';
import type { Clock } from '../../lib/clock';
import { acceptImport } from '../../lib/services/imports/accept-import';
import { previewImport } from '../../lib/services/imports/preview-import';
import { uploadImport } from '../../lib/services/imports/upload-import';
import { acceptRows } from '../../lib/services/statements/accept-rows';
import { claimRows } from '../../lib/services/statements/claim-rows';
import { closeStatement } from '../../lib/services/statements/close-statement';
import { getSheet } from '../../lib/services/statements/get-sheet';
import { strikeRows } from '../../lib/services/statements/strike-rows';
import type { Handle, Store } from '../client';
import { suppliers } from '../schema/suppliers';
import { demoPerson, done } from './acting';
import { BILLING_SUPPLIERS, billFile } from './bill-files';
import { makeBill } from './bills';
import { PLANTS } from './planted';
import { SUPPLIERS, type SupplierKey } from './story';

/** The months that the demo's bookkeeper has closed, and the mornings on which she did. */
export const CLOSED_MONTHS = [
  { month: '2026-09', now: '2026-10-06T15:00:00Z' },
  { month: '2026-10', now: '2026-11-05T15:00:00Z' },
] as const;
async function supplierId(handle: Handle, companyId: string, key: SupplierKey): Promise<string> {
  const name = SUPPLIERS.find((one) => one.key === key)?.name ?? '';
  const [row] = await handle
    .select({ id: suppliers.id })
    .from(suppliers)
    .where(and(eq(suppliers.companyId, companyId), eq(suppliers.name, name)));
  if (!row) throw new Error(`The demo’s supplier ${key} is missing`);
  return row.id;
}

/** Takes a supplier's bill of a month in, as its preview proposes it; a repeat adds nothing. */
export async function takeInBill(
  store: Store,
  companyId: string,
  key: (typeof BILLING_SUPPLIERS)[number],
  month: string,
  clock: Clock,
): Promise<string> {
  const bookkeeper = await demoPerson(store.handle, companyId, 'bookkeeper');
  const file = billFile(key, month);
  const { importId } = await done(uploadImport, bookkeeper, clock, {
    supplierId: await supplierId(store.handle, companyId, key),
    fileName: file.name,
    bytes: new Uint8Array(file.bytes),
  });
  const seen = await done(previewImport, bookkeeper, clock, { importId });
  const accepted = await done(acceptImport, bookkeeper, clock, {
    importId,
    fileSha256: seen.preview.fileSha256,
    ...seen.proposed,
  });
  return accepted.statementId;
}

/** Settles and closes a statement as the planted findings say; a repeat changes nothing. */
async function settle(
  bookkeeper: Actor,
  clock: Clock,
  statementId: string,
  isAccepted: boolean,
): Promise<void> {
  const sheet = await done(getSheet, bookkeeper, clock, { statementId });
  if (sheet.statement.status === 'closed') return;
  const open = sheet.rows.filter((row) => row.settled === null);
  const keysOf = (wanted: boolean) =>
    open.filter((row) => (row.verdict === 'finding') === wanted).map((row) => row.key);
  const [agreeing, found] = [keysOf(false), keysOf(true)];
  if (agreeing.length > 0) {
    await done(strikeRows, bookkeeper, clock, { statementId, rowKeys: agreeing });
  }
  if (found.length > 0 && isAccepted) {
    const reason = 'Price rise agreed by phone in September; the new sheet came late';
    await done(acceptRows, bookkeeper, clock, { statementId, rowKeys: found, reason });
  } else if (found.length > 0) {
    const note = 'Asked dispatch; they agree';
    await done(claimRows, bookkeeper, clock, { statementId, rowKeys: found, note });
  }
  await done(closeStatement, bookkeeper, clock, { statementId });
}

/** The suppliers that billed anything in a month. */
export function billedIn(month: string) {
  return BILLING_SUPPLIERS.filter((key) => makeBill(key, month).length > 0);
}

/** Takes in, settles and closes the demo's past months. */
export async function settlePastMonths(store: Store, companyId: string): Promise<void> {
  const bookkeeper = await demoPerson(store.handle, companyId, 'bookkeeper');
  for (const { month, now } of CLOSED_MONTHS) {
    const clock: Clock = { now: () => new Date(now) };
    for (const key of billedIn(month)) {
      const statementId = await takeInBill(store, companyId, key, month, clock);
      const isAccepted = PLANTS.some(
        (plant) => plant.supplier === key && plant.month === month && plant.kind === 'priceDiffers',
      );
      await settle(bookkeeper, clock, statementId, isAccepted);
    }
  }
}
