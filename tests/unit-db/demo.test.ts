import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Store } from '../../db/client';
import { activity, workItems } from '../../db/schema/activity';
import { companies } from '../../db/schema/companies';
import { billLines, statements } from '../../db/schema/statements';
import { photos } from '../../db/schema/tickets';
import { finishDemo, seedDemo } from '../../db/seed';
import { demoPerson, done } from '../../db/seed/acting';
import { BILLING_SUPPLIERS } from '../../db/seed/bill-files';
import { PLANTS } from '../../db/seed/planted';
import { billedIn, CLOSED_MONTHS, takeInBill } from '../../db/seed/settle-months';
import type { SheetRow } from '../../lib/contracts/sheet';
import { getSheet } from '../../lib/services/statements/get-sheet';
import { listStatements } from '../../lib/services/statements/list-statements';
import { testStore } from '../support/store';

const clock = { now: () => new Date('2026-12-01T15:00:00Z') };

let store: Store;
let companyId: string;
const folder = mkdtempSync(path.join(os.tmpdir(), 'strikeoff-demo-'));

beforeAll(async () => {
  process.env.DATA_DIR = folder;
  store = await testStore();
  await seedDemo(store, clock);
  await finishDemo(store, clock);
  const [company] = await store.handle.select().from(companies).where(eq(companies.isDemo, true));
  companyId = company?.id ?? '';
}, 300_000);

afterAll(async () => {
  await store.close();
  rmSync(folder, { recursive: true, force: true });
});

/** "558703": the ticket of our own copy, else as the bill prints it; the invoice for tax. */
function placeOf(row: SheetRow): string {
  if (row.chargeKind === 'tax') return row.billed?.invoiceNumber ?? '';
  return row.deliveries[0]?.number ?? row.billed?.ticketNumber ?? '';
}

function foundIn(rows: readonly SheetRow[]): string[] {
  return rows
    .flatMap((row) => row.findings.map((finding) => `${placeOf(row)} ${finding.kind}`))
    .sort();
}

function plantedIn(supplier: string, month: string): string[] {
  return PLANTS.filter((plant) => plant.supplier === supplier && plant.month === month)
    .flatMap((plant) => Array.from({ length: plant.lines }, () => `${plant.on} ${plant.kind}`))
    .sort();
}

describe('the demo company', () => {
  it('has its past months taken in, settled and closed', async () => {
    const bookkeeper = await demoPerson(store.handle, companyId, 'bookkeeper');
    const { rows } = await done(listStatements, bookkeeper, clock, {});
    expect(rows).toHaveLength(CLOSED_MONTHS.flatMap(({ month }) => billedIn(month)).length);
    for (const row of rows) expect(row).toMatchObject({ status: 'closed', settled: row.lines });
  });

  it('does nothing when it is loaded again', async () => {
    const counts = async () => {
      const tables = [activity, billLines, photos, statements, workItems];
      return Promise.all(tables.map((table) => store.handle.$count(table)));
    };
    const before = await counts();
    expect(Math.min(...before)).toBeGreaterThan(0);
    await finishDemo(store, clock);
    // As a server does that was killed after the last step, before it said that it was ready.
    await store.handle.delete(activity).where(eq(activity.action, 'demo.ready'));
    await finishDemo(store, clock);
    expect(await counts()).toEqual(before);
  });

  for (const { month } of CLOSED_MONTHS) {
    it(`shows in ${month} the variances that were planted and no other`, async () => {
      const bookkeeper = await demoPerson(store.handle, companyId, 'bookkeeper');
      for (const supplier of billedIn(month)) {
        const statementId = await takeInBill(store, companyId, supplier, month, clock);
        const sheet = await done(getSheet, bookkeeper, clock, { statementId });
        expect(foundIn(sheet.rows), supplier).toEqual(plantedIn(supplier, month));
      }
    });
  }

  for (const supplier of BILLING_SUPPLIERS) {
    it(`shows ${supplier}’s open month with every planted variance and no other`, async () => {
      const bookkeeper = await demoPerson(store.handle, companyId, 'bookkeeper');
      const statementId = await takeInBill(store, companyId, supplier, '2026-11', clock);
      const sheet = await done(getSheet, bookkeeper, clock, { statementId });
      expect(foundIn(sheet.rows)).toEqual(plantedIn(supplier, '2026-11'));
      expect(sheet.upToDate).toBe(true);
    });
  }
});
