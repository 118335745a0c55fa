import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Store } from '../../db/client';
import { billLines } from '../../db/schema/statements';
import { discardImport } from '../../lib/services/imports/discard-import';
import { listImports } from '../../lib/services/imports/list-imports';
import { previewImport } from '../../lib/services/imports/preview-import';
import { setImportLayout } from '../../lib/services/imports/set-import-layout';
import { uploadImport } from '../../lib/services/imports/upload-import';
import { callVerb } from '../../lib/services/verb';
import {
  acceptOf,
  asVerb,
  BILL,
  billWorld,
  HEAD,
  previewOf,
  takenIn,
  upload,
  value,
  type World,
} from '../support/bill-world';
import { temporaryFolder, testStore } from '../support/store';

const folder = temporaryFolder();
let store: Store;

beforeAll(async () => {
  process.env.DATA_DIR = folder.path;
  store = await testStore();
});
afterAll(async () => {
  await store.close();
  folder.remove();
});

const world = () => billWorld(store);
const countLines = async (w: World) =>
  (await store.handle.select().from(billLines).where(eq(billLines.companyId, w.companyId))).length;

describe('importing a bill', () => {
  it('writes nothing before it is accepted, then all of it', async () => {
    const w = await world();
    const seen = await previewOf(w, BILL);
    expect(seen.preview.totals).toMatchObject({ toCreate: 3, failed: 0, charges: '3750.00' });
    expect(seen.proposed).toMatchObject({ periodStart: '2026-05-01', periodEnd: '2026-05-31' });
    expect(await countLines(w)).toBe(0);
    const waiting = await callVerb(listImports, w.bookkeeper, {});
    expect(waiting.ok && waiting.value.rows.map((row) => row.id)).toEqual([seen.importId]);
    const accepted = await acceptOf(w, seen);
    expect(accepted).toMatchObject({ ok: true, value: { lines: 3, repeated: false } });
    expect(await countLines(w)).toBe(3);
  });

  it('takes the same file, the same press and the same lines once', async () => {
    const w = await world();
    const seen = await previewOf(w, BILL);
    const first = await acceptOf(w, seen);
    const again = await acceptOf(w, seen);
    expect(first.ok && again.ok && again.value.statementId).toBe(
      first.ok && first.value.statementId,
    );
    expect(again).toMatchObject({ ok: true, value: { repeated: true } });
    expect(await upload(w, BILL)).toMatchObject({
      ok: true,
      value: { repeated: true, statement: { number: '2026-05' } },
    });
    const more = `${BILL}\n05/06/2026,7004,Concrete 3000,3000,5.00,YD,150.00,750.00`;
    const wider = await previewOf(w, more, 'may-again.csv');
    expect(wider.preview.totals).toMatchObject({ toCreate: 1, alreadyImported: 3 });
    expect(await acceptOf(w, wider, { number: 'second' })).toMatchObject({
      ok: true,
      value: { lines: 1 },
    });
    expect(await countLines(w)).toBe(4);
  });

  it('is whole or not at all when two accept at once', async () => {
    const w = await world();
    const seen = await previewOf(w, BILL);
    const both = await Promise.all([acceptOf(w, seen), acceptOf(w, seen)]);
    expect(both.filter((one) => one.ok && !one.value.repeated)).toHaveLength(1);
    expect(await countLines(w)).toBe(3);
  });

  it('refuses a number that the supplier’s statement has already, and writes nothing', async () => {
    const w = await world();
    await takenIn(w);
    const other = `${HEAD}\n06/01/2026,7009,Concrete 3000,3000,5.00,YD,150.00,750.00`;
    const seen = await previewOf(w, other, 'june.csv');
    expect(await acceptOf(w, seen, { number: '2026-05' })).toMatchObject({
      ok: false,
      error: { code: 'conflict', issues: [{ path: 'number' }] },
    });
    expect(await countLines(w)).toBe(3);
  });

  it('names a broken row and takes nothing in until it is left out on purpose', async () => {
    const w = await world();
    const broken = `${BILL}\n05/05/2026,7003,Concrete 3000,3000,six,YD,150.00,abc`;
    const seen = await previewOf(w, broken);
    expect(seen.preview.totals.failed).toBe(1);
    expect(seen.preview.diagnostics.some((one) => one.sentence.includes('5'))).toBe(true);
    const refused = await acceptOf(w, seen);
    expect(refused).toMatchObject({ ok: false, error: { code: 'conflict' } });
    expect(await countLines(w)).toBe(0);
    expect(await acceptOf(w, seen, { leaveOutUnreadable: true })).toMatchObject({
      ok: true,
      value: { lines: 3 },
    });
  });

  it('refuses what is no bill, in a sentence that says what it is, and keeps nothing', async () => {
    const w = await world();
    const pdf = new Uint8Array([0x25, 0x50, 0x44, 0x46, 0x2d, 0x31, 0x2e, 0x37]);
    for (const [bytes, word] of [
      [pdf, 'PDF'],
      [new Uint8Array(), 'empty'],
      [new Uint8Array([0xff, 0xd8, 0xff, 0xe0]), 'JPEG'],
    ] as const) {
      const refused = await callVerb(uploadImport, w.bookkeeper, {
        supplierId: w.supplierId,
        fileName: 'bill.csv',
        bytes,
      });
      expect(refused).toMatchObject({ ok: false, error: { code: 'wrongType' } });
      expect(!refused.ok && refused.error.message).toContain(word);
    }
    const waiting = await callVerb(listImports, w.bookkeeper, {});
    expect(waiting.ok && waiting.value.rows).toEqual([]);
  });

  it('remembers the columns that were corrected for the supplier’s next file', async () => {
    const w = await world();
    const odd = [
      'When,No,What,Code,Much,U,Each,Sum',
      '05/04/2026,7001,Concrete 3000,3000,10.00,YD,150.00,1500.00',
    ];
    const seen = await previewOf(w, odd.join('\n'), 'odd.csv');
    const columns = {
      ...seen.preview.layout.columns,
      date: 0,
      ticketNumber: 1,
      description: 2,
      mixCode: 3,
      quantity: 4,
      unit: 5,
      unitPrice: 6,
      amount: 7,
    };
    const layout = { ...seen.preview.layout, headerRow: 1, headerSignature: null, columns };
    await value(asVerb(setImportLayout), w.bookkeeper, { importId: seen.importId, layout });
    const corrected = await callVerb(previewImport, w.bookkeeper, { importId: seen.importId });
    expect(corrected).toMatchObject({ ok: true, value: { layoutFrom: 'chosen' } });
    if (!corrected.ok) return;
    expect(corrected.value.preview.items[0]?.values).toMatchObject({ ticketNumber: '7001' });
    expect(await acceptOf(w, corrected.value)).toMatchObject({ ok: true });
    const next = [odd[0], '06/04/2026,7101,Concrete 3000,3000,9.00,YD,150.00,1350.00'].join('\n');
    const remembered = await previewOf(w, next, 'june.csv');
    expect(remembered.layoutFrom).toBe('remembered');
    expect(remembered.preview.items[0]?.values.ticketNumber).toBe('7101');
  });

  it('discards an upload, and does not take in what was discarded', async () => {
    const w = await world();
    const seen = await previewOf(w, BILL);
    await value(asVerb(discardImport), w.bookkeeper, { importId: seen.importId });
    expect(await acceptOf(w, seen)).toMatchObject({ ok: false, error: { code: 'conflict' } });
    expect(await countLines(w)).toBe(0);
  });

  it('keeps a supplier’s and a company’s files from each other', async () => {
    const [w, other] = [await world(), await world()];
    const seen = await previewOf(w, BILL);
    for (const verb of [previewImport, discardImport]) {
      expect(await callVerb(asVerb(verb), other.owner, { importId: seen.importId })).toMatchObject({
        ok: false,
        error: { code: 'notFound' },
      });
    }
    expect(await acceptOf({ ...w, bookkeeper: other.bookkeeper }, seen)).toMatchObject({
      ok: false,
      error: { code: 'notFound' },
    });
    expect(await upload({ ...w, bookkeeper: other.bookkeeper }, BILL)).toMatchObject({
      ok: false,
      error: { code: 'notFound' },
    });
  });
});
