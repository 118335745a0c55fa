import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Store } from '../../db/client';
import { companies } from '../../db/schema/companies';
import { billLines } from '../../db/schema/statements';
import { finishDemo, seedDemo } from '../../db/seed';
import { demoPerson, done } from '../../db/seed/acting';
import type { YieldAnswer } from '../../lib/contracts/yield';
import { money, moneyText, sumMoney } from '../../lib/domain/money/money';
import { callVerb } from '../../lib/services/verb';
import { exportYield } from '../../lib/services/yield/export-yield';
import { listYield } from '../../lib/services/yield/list-yield';
import { testCompany } from '../support/company';
import { testStore } from '../support/store';

const clock = { now: () => new Date('2026-12-01T15:00:00Z') };
const folder = mkdtempSync(path.join(os.tmpdir(), 'strikeoff-yield-'));
let store: Store;
let companyId: string;

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

const ask = async (filter: object): Promise<YieldAnswer> =>
  done(listYield, await demoPerson(store.handle, companyId, 'owner'), clock, filter);

describe('yield', () => {
  it('costs a settled month exactly what its bills came to', async () => {
    // September: billed in full, so every dollar of its bills stands on one of its placements.
    const { totals } = await ask({ from: '2026-09-01', to: '2026-09-30' });
    const [billed] = await store.handle
      .select({ sum: sql<string>`sum(${billLines.amount})::text` })
      .from(billLines)
      .where(sql`${billLines.companyId} = ${companyId} and ${billLines.date} < '2026-10-01'`);
    expect(totals.costFrom).toBe('billed');
    expect(totals.cost).toBe(moneyText(money(billed?.sum ?? '0')));
  });

  it('adds its jobs and placements up to the whole', async () => {
    const { rows, totals } = await ask({});
    const sum = (texts: readonly string[]) => moneyText(sumMoney(texts.map((one) => money(one))));
    expect(sum(rows.map((row) => row.deliveredYd3))).toBe(totals.deliveredYd3);
    const parts = rows.flatMap((row) => row.placements.map((one) => one.deliveredYd3));
    expect(sum(parts)).toBe(totals.deliveredYd3);
    expect(rows.every((row) => row.costParts.length > 0 && row.costPerYd3 !== null)).toBe(true);
  });

  it('works overrun and thickness out as by hand', async () => {
    // Heron Lane: 94.30 figured, 103.50 delivered: 9.20 over, 9.20 ÷ 94.30.
    const heron = (await ask({})).rows.find((row) => row.jobName === 'Heron Lane slab');
    expect(heron).toMatchObject({
      figuredYd3: '94.30',
      deliveredYd3: '103.50',
      overrunYd3: '9.20',
      overrunShare: '0.0976',
    });
  });

  it('gives each job the yards, loads and minutes that its records add up to', async () => {
    const answered = await store.handle.execute(sql`
      with over as (
        select p.id, p.job_id, p.figured_yd3 from placements p
        where p.company_id = ${companyId} and p.status <> 'cancelled'
          and (p.status = 'poured' or p.pour_date < '2026-12-01')
          and exists (select 1 from tickets t where t.placement_id = p.id and t.status = 'confirmed'))
      select j.number as "jobNumber",
        (select sum(o.figured_yd3)::text from over o where o.job_id = j.id) as "figuredYd3",
        count(*)::int as loads, sum(t.quantity_yd3)::text as "deliveredYd3",
        coalesce(sum(t.returned_yd3), 0)::numeric(14,2)::text as "returnedYd3",
        coalesce(sum(coalesce(t.finished_at, t.left_at) - t.arrived_at), 0)::int as "onSiteMinutes",
        count(coalesce(t.finished_at, t.left_at) - t.arrived_at)::int as "timedLoads",
        (select sum(l.quantity)::text from order_lines l join orders d on d.id = l.order_id
          where d.placement_id in (select o.id from over o where o.job_id = j.id)
          and d.status <> 'cancelled' and l.unit = 'yd³') as "orderedYd3"
      from jobs j join over on over.job_id = j.id
        join tickets t on t.placement_id = over.id and t.status = 'confirmed'
      group by j.id, j.number order by j.number`);
    const { rows } = answered as unknown as { rows: Record<string, string | number | null>[] };
    expect(rows.length).toBeGreaterThan(5);
    const answer = await ask({ sort: 'job', direction: 'up' });
    const shown = answer.rows.map((row) =>
      Object.fromEntries(Object.keys(rows[0] ?? {}).map((key) => [key, row[key as 'loads']])),
    );
    expect(shown).toEqual(rows);
  });

  it('leaves a pour out that is still to come or running', async () => {
    const { rows } = await ask({});
    const names = rows.flatMap((row) => row.placements.map((one) => one.name));
    expect(names).not.toContain('Basement floor');
  });

  it('is sorted by what is asked, and exported by placement', async () => {
    const byCost = await ask({ sort: 'cost', direction: 'up' });
    const costs = byCost.rows.map((row) => Number(row.costPerYd3));
    expect(costs).toEqual([...costs].sort((one, other) => one - other));
    const file = await done(
      exportYield,
      await demoPerson(store.handle, companyId, 'owner'),
      clock,
      {},
    );
    const lines = new TextDecoder().decode(file.bytes).trim().split('\r\n');
    const placements = byCost.rows.reduce((count, row) => count + row.placements.length, 0);
    expect(lines).toHaveLength(placements + 1);
  });

  it('is not for foremen, and shows another company nothing', async () => {
    const other = await testCompany(store);
    expect(await callVerb(listYield, other.foreman, {})).toMatchObject({
      ok: false,
      error: { code: 'notAllowed' },
    });
    expect(await callVerb(listYield, other.owner, {})).toMatchObject({
      ok: true,
      value: { rows: [], jobs: [] },
    });
  });
});
