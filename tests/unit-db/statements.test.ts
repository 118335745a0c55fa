import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Store } from '../../db/client';
import { jobs } from '../../db/schema/jobs';
import { billLines, matches, statements, strikes, variances } from '../../db/schema/statements';
import { rateClauses, rateSheets, suppliers } from '../../db/schema/suppliers';
import { tickets } from '../../db/schema/tickets';
import type { SheetRow } from '../../lib/contracts/sheet';
import { newId } from '../../lib/ids';
import { acceptImport } from '../../lib/services/imports/accept-import';
import { discardImport } from '../../lib/services/imports/discard-import';
import { listImports } from '../../lib/services/imports/list-imports';
import { previewImport } from '../../lib/services/imports/preview-import';
import { setImportLayout } from '../../lib/services/imports/set-import-layout';
import { uploadImport } from '../../lib/services/imports/upload-import';
import { acceptRows } from '../../lib/services/statements/accept-rows';
import { claimRows } from '../../lib/services/statements/claim-rows';
import { closeStatement } from '../../lib/services/statements/close-statement';
import { getSheet } from '../../lib/services/statements/get-sheet';
import { listStatements } from '../../lib/services/statements/list-statements';
import { matchByHand } from '../../lib/services/statements/match-by-hand';
import { matchCandidates } from '../../lib/services/statements/match-candidates';
import { refreshFindings } from '../../lib/services/statements/refresh-findings';
import { reopenStatement } from '../../lib/services/statements/reopen-statement';
import { strikeRows } from '../../lib/services/statements/strike-rows';
import { undoLast } from '../../lib/services/statements/undo';
import { unmatchLine } from '../../lib/services/statements/unmatch-line';
import { unstrikeRows } from '../../lib/services/statements/unstrike-rows';
import { listVariances } from '../../lib/services/variances/list-variances';
import type { Verb } from '../../lib/services/verb';
import { callVerb } from '../../lib/services/verb';
import { type TestCompany, testCompany } from '../support/company';
import { testStore } from '../support/store';

const folder = mkdtempSync(path.join(os.tmpdir(), 'strikeoff-statements-'));
let store: Store;

beforeAll(async () => {
  process.env.DATA_DIR = folder;
  store = await testStore();
});
afterAll(async () => {
  await store.close();
  rmSync(folder, { recursive: true, force: true });
});

/** A company with one supplier, an agreed price of 150 a yard, and three loads in May. */
async function world() {
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
type World = Awaited<ReturnType<typeof world>>;

const HEAD = 'Date,Ticket,Description,Mix,Qty,UM,Price,Amount';
const BILL = [
  HEAD,
  '05/04/2026,7001,Concrete 3000,3000,10.00,YD,150.00,1500.00',
  '05/04/2026,7002,Concrete 3000,3000,8.50,YD,150.00,1275.00',
  '05/05/2026,7003,Concrete 3000,3000,6.50,YD,150.00,975.00',
].join('\n');

async function value<Output>(
  verb: Verb,
  actor: TestCompany['owner'],
  input: unknown,
): Promise<Output> {
  const result = await callVerb(verb, actor, input);
  if (!result.ok) throw new Error(`${verb.name}: ${result.error.message}`);
  return result.value as Output;
}
const asVerb = (verb: unknown) => verb as Verb;

const bytesOf = (text: string) => new TextEncoder().encode(text);
const upload = (w: World, text: string, fileName = 'may.csv') =>
  callVerb(uploadImport, w.bookkeeper, {
    supplierId: w.supplierId,
    fileName,
    bytes: bytesOf(text),
  });

async function previewOf(w: World, text: string, fileName?: string) {
  const uploaded = await upload(w, text, fileName);
  if (!uploaded.ok) throw new Error(uploaded.error.message);
  const { importId } = uploaded.value;
  const seen = await callVerb(previewImport, w.bookkeeper, { importId });
  if (!seen.ok) throw new Error(seen.error.message);
  return seen.value;
}

const acceptOf = (w: World, seen: Awaited<ReturnType<typeof previewOf>>, more: object = {}) =>
  callVerb(acceptImport, w.bookkeeper, {
    importId: seen.importId,
    fileSha256: seen.preview.fileSha256,
    ...seen.proposed,
    ...more,
  });

/** Takes the bill in and answers with the statement and its rows by ticket as printed. */
async function takenIn(w: World, text = BILL, more: object = {}) {
  const accepted = await acceptOf(w, await previewOf(w, text), more);
  if (!accepted.ok) throw new Error(accepted.error.message);
  const { statementId } = accepted.value;
  return { statementId, rows: await rowsOf(w, statementId) };
}

async function rowsOf(w: World, statementId: string) {
  const sheet = await callVerb(getSheet, w.bookkeeper, { statementId });
  if (!sheet.ok) throw new Error(sheet.error.message);
  return sheet.value.rows;
}
function rowOf(rows: readonly SheetRow[], ticket: string): SheetRow {
  const row = rows.find(
    (one) => one.billed?.ticketNumber === ticket || one.deliveries[0]?.number === ticket,
  );
  if (!row) throw new Error(`no row for ${ticket}`);
  return row;
}
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

describe('the strike-off sheet', () => {
  it('shows each line with its delivery, what was expected, and what differs', async () => {
    const w = await world();
    const { rows } = await takenIn(w);
    expect(rowOf(rows, '7001')).toMatchObject({
      verdict: 'agrees',
      expected: '1500.00',
      difference: '0.00',
      match: { method: 'number' },
    });
    expect(rowOf(rows, '7002')).toMatchObject({
      verdict: 'finding',
      expected: '1200.00',
      difference: '75.00',
      findings: [{ kind: 'yardsDiffer' }],
    });
  });

  it('strikes off what agrees, refuses what does not, and keeps who and when', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    const agreeing = rowOf(rows, '7001').key;
    const differing = rowOf(rows, '7002').key;
    const refused = await callVerb(strikeRows, w.bookkeeper, {
      statementId,
      rowKeys: [agreeing, differing],
    });
    expect(refused).toMatchObject({ ok: false, error: { code: 'conflict' } });
    expect(rowOf(await rowsOf(w, statementId), '7001').settled).toBeNull();
    const struck = await callVerb(strikeRows, w.bookkeeper, { statementId, rowKeys: [agreeing] });
    expect(struck).toMatchObject({
      ok: true,
      value: { rows: [{ key: agreeing, settled: { state: 'struck', by: 'Test bookkeeper' } }] },
    });
    // A double press, and a second person on the same row.
    await value(asVerb(strikeRows), w.owner, { statementId, rowKeys: [agreeing] });
    expect(rowOf(await rowsOf(w, statementId), '7001').settled?.by).toBe('Test bookkeeper');
    const kept = await store.handle
      .select()
      .from(strikes)
      .where(and(eq(strikes.companyId, w.companyId), eq(strikes.statementId, statementId)));
    expect(kept).toHaveLength(1);
  });

  it('accepts with a reason and claims a finding; both can be taken back', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    const rowKeys = [rowOf(rows, '7002').key];
    const bare = await callVerb(acceptRows, w.bookkeeper, { statementId, rowKeys, reason: ' ' });
    expect(bare).toMatchObject({ ok: false, error: { code: 'invalid' } });
    await value(asVerb(claimRows), w.bookkeeper, { statementId, rowKeys });
    const claimed = await callVerb(listVariances, w.bookkeeper, { status: 'claimed' });
    expect(claimed).toMatchObject({
      ok: true,
      value: { total: 1, totals: { against: '75.00', inOurFavour: '0.00' } },
    });
    await value(asVerb(unstrikeRows), w.bookkeeper, { statementId, rowKeys });
    await value(asVerb(acceptRows), w.bookkeeper, { statementId, rowKeys, reason: 'ours' });
    const accepted = await callVerb(listVariances, w.bookkeeper, { status: 'accepted' });
    expect(accepted.ok && accepted.value.rows[0]).toMatchObject({
      reason: 'ours',
      difference: '75.00',
      decidedBy: 'Test bookkeeper',
    });
    const agreeing = await callVerb(claimRows, w.bookkeeper, {
      statementId,
      rowKeys: [rowOf(rows, '7001').key],
    });
    expect(agreeing).toMatchObject({ ok: false, error: { code: 'conflict' } });
  });

  it('takes back one’s own last step only, step by step', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    const [one, two, three] = ['7001', '7002', '7003'].map((ticket) => rowOf(rows, ticket).key);
    await value(asVerb(strikeRows), w.bookkeeper, { statementId, rowKeys: [one] });
    await value(asVerb(claimRows), w.bookkeeper, { statementId, rowKeys: [two] });
    await value(asVerb(strikeRows), w.owner, { statementId, rowKeys: [three] });
    const settled = async () =>
      (await rowsOf(w, statementId)).filter((row) => row.settled).map((row) => row.key);
    await value(asVerb(undoLast), w.bookkeeper, { statementId });
    expect(await settled()).toEqual([one, three]);
    await value(asVerb(undoLast), w.bookkeeper, { statementId });
    expect(await settled()).toEqual([three]);
    expect(await value(asVerb(undoLast), w.bookkeeper, { statementId })).toMatchObject({
      undone: null,
    });
    const open = await callVerb(listVariances, w.bookkeeper, { status: 'open' });
    expect(open).toMatchObject({ ok: true, value: { total: 1 } });
  });

  it('follows the facts: a corrected ticket opens what no longer agrees', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    await value(asVerb(strikeRows), w.bookkeeper, {
      statementId,
      rowKeys: [rowOf(rows, '7001').key],
    });
    await store.handle
      .update(tickets)
      .set({ quantityYd3: '9.00' })
      .where(eq(tickets.id, w.ticketIds.get('7001') ?? ''));
    const sheet = await callVerb(getSheet, w.bookkeeper, { statementId });
    expect(sheet).toMatchObject({ ok: true, value: { upToDate: false } });
    expect(sheet.ok && rowOf(sheet.value.rows, '7001')).toMatchObject({
      settled: null,
      difference: '150.00',
    });
    expect(await value(asVerb(refreshFindings), w.bookkeeper, {})).toEqual({ changed: true });
    expect(await value(asVerb(refreshFindings), w.bookkeeper, {})).toEqual({ changed: false });
    const open = await callVerb(listVariances, w.bookkeeper, { status: 'open' });
    expect(open).toMatchObject({ ok: true, value: { total: 2, totals: { against: '225.00' } } });
  });

  it('keeps a person’s match over the engine’s, until it is left to the engine again', async () => {
    const w = await world();
    const text = BILL.replace('7001,', '9999,');
    const { statementId, rows } = await takenIn(w, text);
    const line = rowOf(rows, '9999');
    const billLineId = line.billed?.lineId ?? '';
    const found = await callVerb(matchCandidates, w.bookkeeper, { statementId, billLineId });
    expect(found.ok && found.value.rows.map((row) => row.number)).toContain('7003');
    await value(asVerb(unmatchLine), w.bookkeeper, {
      statementId,
      billLineId,
      leaveTo: 'nothing',
    });
    expect(rowOf(await rowsOf(w, statementId), '9999')).toMatchObject({
      deliveries: [],
      findings: [{ kind: 'billedNotDelivered' }],
    });
    const ticketId = w.ticketIds.get('7001') ?? '';
    await value(asVerb(matchByHand), w.bookkeeper, {
      statementId,
      billLineId,
      deliveries: [{ kind: 'ticket', id: ticketId }],
    });
    const matched = rowOf(await rowsOf(w, statementId), '9999');
    expect(matched).toMatchObject({ verdict: 'agrees', match: { method: 'hand' } });
    await value(asVerb(undoLast), w.bookkeeper, { statementId });
    const ties = await store.handle
      .select()
      .from(matches)
      .where(and(eq(matches.companyId, w.companyId), eq(matches.billLineId, billLineId)));
    expect(ties.every((tie) => tie.method !== 'hand')).toBe(true);
    const stranger = await world();
    expect(
      await callVerb(matchByHand, w.bookkeeper, {
        statementId,
        billLineId,
        deliveries: [{ kind: 'ticket', id: stranger.ticketIds.get('7001') ?? '' }],
      }),
    ).toMatchObject({ ok: false, error: { code: 'notFound' } });
  });

  it('closes only when every row is settled, then stays as it was', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    const early = await callVerb(closeStatement, w.bookkeeper, { statementId });
    expect(early).toMatchObject({ ok: false, error: { code: 'conflict' } });
    const keys = (ticket: string) => [rowOf(rows, ticket).key];
    await value(asVerb(strikeRows), w.bookkeeper, {
      statementId,
      rowKeys: [...keys('7001'), ...keys('7003')],
    });
    await value(asVerb(claimRows), w.bookkeeper, { statementId, rowKeys: keys('7002') });
    await value(asVerb(closeStatement), w.bookkeeper, { statementId });
    await store.handle
      .update(tickets)
      .set({ quantityYd3: '1.00' })
      .where(eq(tickets.id, w.ticketIds.get('7001') ?? ''));
    expect(rowOf(await rowsOf(w, statementId), '7001')).toMatchObject({
      verdict: 'agrees',
      settled: { state: 'struck' },
    });
    for (const [verb, input] of [
      [strikeRows, { rowKeys: keys('7001') }],
      [undoLast, {}],
      [closeStatement, {}],
    ] as const) {
      expect(await callVerb(asVerb(verb), w.bookkeeper, { statementId, ...input })).toMatchObject({
        ok: false,
        error: { code: 'closed' },
      });
    }
    const mayNot = { statementId, reason: 'found a ticket' };
    expect(await callVerb(reopenStatement, w.bookkeeper, mayNot)).toMatchObject({
      ok: false,
      error: { code: 'notAllowed' },
    });
    await value(asVerb(reopenStatement), w.owner, mayNot);
    expect(rowOf(await rowsOf(w, statementId), '7001').settled).toBeNull();
    const list = await callVerb(listStatements, w.bookkeeper, { status: 'open' });
    expect(list).toMatchObject({ ok: true, value: { rows: [{ lines: 3, settled: 2 }] } });
  });

  it('is not for foremen, nor for another company', async () => {
    const [w, other] = [await world(), await world()];
    const { statementId } = await takenIn(w);
    expect(await callVerb(getSheet, w.foreman, { statementId })).toMatchObject({
      ok: false,
      error: { code: 'notAllowed' },
    });
    expect(await callVerb(getSheet, other.owner, { statementId })).toMatchObject({
      ok: false,
      error: { code: 'notFound' },
    });
    const theirs = await store.handle
      .select()
      .from(variances)
      .where(eq(variances.companyId, other.companyId));
    expect(theirs).toEqual([]);
    const kept = await store.handle
      .select()
      .from(statements)
      .where(eq(statements.companyId, w.companyId));
    expect(kept).toHaveLength(1);
  });
});
