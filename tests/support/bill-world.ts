import type { Store } from '../../db/client';
import { jobs } from '../../db/schema/jobs';
import { rateClauses, rateSheets, suppliers } from '../../db/schema/suppliers';
import { tickets } from '../../db/schema/tickets';
import type { SheetRow } from '../../lib/contracts/sheet';
import { newId } from '../../lib/ids';
import { acceptImport } from '../../lib/services/imports/accept-import';
import { previewImport } from '../../lib/services/imports/preview-import';
import { uploadImport } from '../../lib/services/imports/upload-import';
import { getSheet } from '../../lib/services/statements/get-sheet';
import type { Verb } from '../../lib/services/verb';
import { callVerb } from '../../lib/services/verb';
import { type TestCompany, testCompany } from './company';

/** A company with one supplier, an agreed price of 150 a yard, and three loads in May. */
export async function billWorld(store: Store) {
  const company = await testCompany(store);
  const { companyId } = company;
  const [supplierId, jobId, sheetId] = [newId(), newId(), newId()];
  await store.handle
    .insert(suppliers)
    .values({ companyId, id: supplierId, name: `Slate Creek ${supplierId}`, kind: 'readyMix' });
  await store.handle
    .insert(jobs)
    .values({ companyId, id: jobId, number: '26-001', name: 'Barn floor', taxable: false });
  await store.handle.insert(rateSheets).values({
    companyId,
    id: sheetId,
    supplierId,
    name: '2026',
    version: 1,
    status: 'approved',
    effectiveFrom: '2026-01-01',
  });
  await store.handle.insert(rateClauses).values({
    companyId,
    id: newId(),
    rateSheetId: sheetId,
    position: 0,
    clause: { kind: 'mixPrice', mixCode: '3000', description: null, dollarsPerYd3: '150.00' },
  });
  const ticketIds = new Map<string, string>();
  for (const [number, date, yards] of [
    ['7001', '2026-05-04', '10.00'],
    ['7002', '2026-05-04', '8.00'],
    ['7003', '2026-05-05', '6.50'],
  ] as const) {
    const id = newId();
    ticketIds.set(number, id);
    await store.handle.insert(tickets).values({
      companyId,
      id,
      supplierId,
      jobId,
      status: 'confirmed',
      number,
      date,
      mixCode: '3000',
      quantityYd3: yards,
      clientId: newId(),
    });
  }
  return { ...company, supplierId, jobId, ticketIds };
}
export type World = Awaited<ReturnType<typeof billWorld>>;

export const HEAD = 'Date,Ticket,Description,Mix,Qty,UM,Price,Amount';
export const BILL = [
  HEAD,
  '05/04/2026,7001,Concrete 3000,3000,10.00,YD,150.00,1500.00',
  '05/04/2026,7002,Concrete 3000,3000,8.50,YD,150.00,1275.00',
  '05/05/2026,7003,Concrete 3000,3000,6.50,YD,150.00,975.00',
].join('\n');

export async function value<Output>(
  verb: Verb,
  actor: TestCompany['owner'],
  input: unknown,
): Promise<Output> {
  const result = await callVerb(verb, actor, input);
  if (!result.ok) throw new Error(`${verb.name}: ${result.error.message}`);
  return result.value as Output;
}
export const asVerb = (verb: unknown) => verb as Verb;

export const bytesOf = (text: string) => new TextEncoder().encode(text);
export const upload = (w: World, text: string, fileName = 'may.csv') =>
  callVerb(uploadImport, w.bookkeeper, {
    supplierId: w.supplierId,
    fileName,
    bytes: bytesOf(text),
  });

export async function previewOf(w: World, text: string, fileName?: string) {
  const uploaded = await upload(w, text, fileName);
  if (!uploaded.ok) throw new Error(uploaded.error.message);
  const { importId } = uploaded.value;
  const seen = await callVerb(previewImport, w.bookkeeper, { importId });
  if (!seen.ok) throw new Error(seen.error.message);
  return seen.value;
}

export const acceptOf = (
  w: World,
  seen: Awaited<ReturnType<typeof previewOf>>,
  more: object = {},
) =>
  callVerb(acceptImport, w.bookkeeper, {
    importId: seen.importId,
    fileSha256: seen.preview.fileSha256,
    ...seen.proposed,
    ...more,
  });

/** Takes the bill in and answers with the statement and its rows by ticket as printed. */
export async function takenIn(w: World, text = BILL, more: object = {}) {
  const accepted = await acceptOf(w, await previewOf(w, text), more);
  if (!accepted.ok) throw new Error(accepted.error.message);
  const { statementId } = accepted.value;
  return { statementId, rows: await rowsOf(w, statementId) };
}

export async function rowsOf(w: World, statementId: string) {
  const sheet = await callVerb(getSheet, w.bookkeeper, { statementId });
  if (!sheet.ok) throw new Error(sheet.error.message);
  return sheet.value.rows;
}
export function rowOf(rows: readonly SheetRow[], ticket: string): SheetRow {
  const row = rows.find(
    (one) => one.billed?.ticketNumber === ticket || one.deliveries[0]?.number === ticket,
  );
  if (!row) throw new Error(`no row for ${ticket}`);
  return row;
}
