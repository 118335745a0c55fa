import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Store } from '../../db/client';
import { jobs, placements } from '../../db/schema/jobs';
import { orderLines, orders } from '../../db/schema/orders';
import { billLines, invoices, matches, statements } from '../../db/schema/statements';
import { rateClauses, rateSheets, suppliers } from '../../db/schema/suppliers';
import { pumpTickets, tickets } from '../../db/schema/tickets';
import type { YieldAnswer } from '../../lib/contracts/yield';
import type { Clause } from '../../lib/domain/rating/clauses';
import { newId } from '../../lib/ids';
import { callVerb } from '../../lib/services/verb';
import { listYield } from '../../lib/services/yield/list-yield';
import { type TestCompany, testCompany } from '../support/company';
import { testStore } from '../support/store';

/** Every figure here was worked out by hand from the few loads below. */
let store: Store;
beforeAll(async () => {
  store = await testStore();
});
afterAll(() => store.close());

const CONCRETE: readonly Clause[] = [
  { kind: 'mixPrice', mixCode: '4000', description: null, dollarsPerYd3: '150.00' },
  {
    kind: 'shortLoad',
    thresholdYd3: '6',
    charge: { basis: 'flatPerLoad', dollars: '60' },
    balanceLoadExempt: true,
  },
  {
    kind: 'waiting',
    free: { basis: 'perLoad', minutes: '30' },
    dollarsPerMinute: '2',
    until: 'finished',
  },
  { kind: 'perLoadFee', name: 'Environmental fee', dollars: '10' },
  { kind: 'tax', ratePercent: '10', taxes: ['mixPrice'] },
];
const PUMP: readonly Clause[] = [
  {
    kind: 'pumpTime',
    dollarsPerHour: '200',
    minimumHours: '2',
    measured: 'onSite',
    incrementHours: '0.25',
  },
];

async function supplier(
  { companyId }: TestCompany,
  name: string,
  kind: 'readyMix' | 'pump',
  clauses: readonly Clause[],
): Promise<string> {
  const [id, rateSheetId] = [newId(), newId()];
  await store.handle.insert(suppliers).values({ companyId, id, name, kind });
  if (clauses.length === 0) return id;
  await store.handle.insert(rateSheets).values({
    companyId,
    id: rateSheetId,
    supplierId: id,
    name: '2026',
    version: 1,
    status: 'approved',
    effectiveFrom: '2026-01-01',
  });
  await store.handle.insert(rateClauses).values(
    clauses.map((clause, position) => ({
      companyId,
      id: newId(),
      rateSheetId,
      position,
      clause,
    })),
  );
  return id;
}

interface Load {
  readonly yd3: string;
  readonly returned?: string;
  readonly onSite?: readonly [number, number];
}
interface Pour {
  readonly number: string;
  readonly supplierId: string;
  readonly day: string;
  readonly figured: string;
  readonly area?: string;
  readonly thickness?: string;
  readonly ordered?: string;
  readonly loads: readonly Load[];
}

/** A job with one placement and its loads, all of one order where `ordered` is given. */
async function poured({ companyId }: TestCompany, pour: Pour) {
  const { number, supplierId, day } = pour;
  const [jobId, placementId] = [newId(), newId()];
  const { handle } = store;
  await handle.insert(jobs).values({ companyId, id: jobId, number, name: `Job ${number}` });
  await handle.insert(placements).values({
    companyId,
    id: placementId,
    jobId,
    name: `Floor of ${number}`,
    element: 'slab',
    pourDate: day,
    status: 'poured',
    figuredYd3: pour.figured,
    areaFt2: pour.area ?? null,
    thicknessIn: pour.thickness ?? null,
  });
  const orderId = pour.ordered === undefined ? null : newId();
  if (orderId !== null) {
    await handle.insert(orders).values({
      companyId,
      id: orderId,
      number: `P-${number}`,
      supplierId,
      jobId,
      placementId,
      status: 'confirmed',
      pourDate: day,
    });
    await handle.insert(orderLines).values({
      companyId,
      id: newId(),
      orderId,
      position: 1,
      code: '4000',
      quantity: pour.ordered ?? '',
      unit: 'yd³',
    });
  }
  const loadIds: string[] = [];
  for (const [index, load] of pour.loads.entries()) {
    const id = newId();
    loadIds.push(id);
    await handle.insert(tickets).values({
      companyId,
      id,
      supplierId,
      jobId,
      placementId,
      orderId,
      status: 'confirmed',
      number: `${number}-${index + 1}`,
      loadNumber: index + 1,
      date: day,
      mixCode: '4000',
      quantityYd3: load.yd3,
      returnedYd3: load.returned ?? null,
      arrivedAt: load.onSite?.[0] ?? null,
      finishedAt: load.onSite?.[1] ?? null,
      clientId: newId(),
    });
  }
  return { jobId, placementId, loadIds };
}

async function world() {
  const company = await testCompany(store);
  const { companyId } = company;
  const concrete = await supplier(company, 'Slate Creek', 'readyMix', CONCRETE);
  const boom = await supplier(company, 'Tall Boom', 'pump', PUMP);
  const barn = await poured(company, {
    number: '1',
    supplierId: concrete,
    day: '2026-06-10',
    figured: '24.00',
    // 24.00 yd³ × 27 × 12 ÷ 5 in.
    area: '1555.20',
    thickness: '5.00',
    ordered: '26.00',
    loads: [
      { yd3: '10.00', onSite: [420, 450] },
      { yd3: '10.00', onSite: [440, 490] },
      { yd3: '5.50', returned: '0.50', onSite: [500, 520] },
    ],
  });
  await store.handle.insert(pumpTickets).values({
    companyId,
    id: newId(),
    supplierId: boom,
    jobId: barn.jobId,
    placementId: barn.placementId,
    number: '77',
    date: '2026-06-10',
    arrivedAt: 400,
    finishedAt: 540,
    leftAt: 540,
    pumpedYd3: '25.50',
  });
  // A single load, so not a balance load: its short-load charge stands.
  const shed = await poured(company, {
    number: '2',
    supplierId: concrete,
    day: '2026-07-01',
    figured: '5.00',
    ordered: '5.00',
    loads: [{ yd3: '4.00' }],
  });
  return { company, concrete, boom, barn, shed };
}
type World = Awaited<ReturnType<typeof world>>;

async function yieldOf(company: TestCompany, filter: object = {}): Promise<YieldAnswer> {
  const result = await callVerb(listYield, company.owner, filter, {
    clock: { now: () => new Date('2026-12-01T15:00:00Z') },
  });
  if (!result.ok) throw new Error(result.error.message);
  return result.value;
}
const jobOf = (answer: YieldAnswer, jobId: string) =>
  answer.rows.find((row) => row.jobId === jobId);
const part = (name: string, amount: string, perYd3: string) => ({ part: name, amount, perYd3 });

interface Line {
  readonly chargeKind: 'mix' | 'waiting' | 'perLoadFee' | 'tax';
  readonly amount: string;
  readonly yd3?: string;
  readonly on: readonly string[];
}

/** A statement with one invoice of these lines, each tied to its loads. */
async function billed({ company: { companyId }, concrete }: World, lines: readonly Line[]) {
  const [statementId, invoiceId] = [newId(), newId()];
  const { handle } = store;
  await handle.insert(statements).values({
    companyId,
    id: statementId,
    supplierId: concrete,
    number: 'S-1',
    periodStart: '2026-06-01',
    periodEnd: '2026-06-30',
  });
  await handle
    .insert(invoices)
    .values({ companyId, id: invoiceId, supplierId: concrete, statementId, number: 'I-1' });
  for (const [position, line] of lines.entries()) {
    const billLineId = newId();
    await handle.insert(billLines).values({
      companyId,
      id: billLineId,
      supplierId: concrete,
      statementId,
      invoiceId,
      position,
      rowKey: billLineId,
      lineKind: line.chargeKind === 'tax' ? 'tax' : 'charge',
      chargeKind: line.chargeKind,
      description: line.chargeKind,
      quantity: line.yd3 ?? null,
      amount: line.amount,
    });
    for (const ticketId of line.on) {
      await handle.insert(matches).values({
        companyId,
        id: newId(),
        billLineId,
        ticketId,
        method: 'number',
        confidence: 1,
        reason: 'the same number',
      });
    }
  }
}

describe('yield of a few loads', () => {
  it('gives yards, thickness, minutes and the expected cost of a pour that nobody has billed', async () => {
    const { company, barn } = await world();
    // 10 + 10 + 5.50 delivered, 0.50 sent back: 25.00 stayed, 1.00 over 24.00.
    expect(jobOf(await yieldOf(company), barn.jobId)).toMatchObject({
      loads: 3,
      smallSample: true,
      figuredYd3: '24.00',
      orderedYd3: '26.00',
      deliveredYd3: '25.50',
      returnedYd3: '0.50',
      billedYd3: null,
      overrunYd3: '1.00',
      overrunShare: '0.0417',
      plannedThicknessIn: '5.00',
      // 25.00 × 27 × 12 ÷ 1555.20.
      impliedThicknessIn: '5.21',
      // 30 + 50 + 20 minutes; ÷ 3 loads; ÷ 25.50 yards.
      timedLoads: 3,
      onSiteMinutes: 100,
      minutesPerLoad: '33.33',
      minutesPerYd3: '3.92',
      // The last load is the balance load of its order: no short-load charge.
      costParts: [
        part('concrete', '3825.00', '153.00'),
        part('waiting', '40.00', '1.60'),
        part('fees', '30.00', '1.20'),
        // 140 minutes of pump: 2.50 hours in quarters.
        part('pump', '500.00', '20.00'),
        part('tax', '382.50', '15.30'),
      ],
      cost: '4777.50',
      costPerYd3: '191.10',
      costFrom: 'expected',
      unpriced: 0,
    });
  });

  it('adds jobs up, and says of one job the same whatever else is asked for', async () => {
    const { company, barn, shed, concrete, boom } = await world();
    const all = await yieldOf(company);
    // The shed: 600 concrete, 60 short load, 10 fee, 60 tax.
    expect(jobOf(all, shed.jobId)).toMatchObject({ cost: '730.00', costPerYd3: '182.50' });
    expect(all.totals).toMatchObject({
      loads: 4,
      smallSample: true,
      figuredYd3: '29.00',
      orderedYd3: '31.00',
      deliveredYd3: '29.50',
      // 29.50 − 0.50 − 29.00.
      overrunYd3: '0.00',
      cost: '5507.50',
      costPerYd3: '189.91',
    });
    for (const filter of [
      { jobId: barn.jobId },
      { to: '2026-06-10' },
      { from: '2026-06-10', to: '2026-06-30' },
      { supplierId: boom },
    ]) {
      const { rows, totals } = await yieldOf(company, filter);
      expect(rows, JSON.stringify(filter)).toEqual([jobOf(all, barn.jobId)]);
      expect(totals.cost).toBe('4777.50');
    }
    expect((await yieldOf(company, { supplierId: concrete })).rows).toHaveLength(2);
    expect((await yieldOf(company, { from: '2026-07-02' })).rows).toEqual([]);
    expect(all.suppliers.map((one) => one.name)).toEqual(['Slate Creek', 'Tall Boom']);
  });

  it('takes what is billed, and expects the rest as part of the same order', async () => {
    const w = await world();
    const [first = '', second = ''] = w.barn.loadIds;
    await billed(w, [
      { chargeKind: 'mix', amount: '1500.00', yd3: '10.00', on: [first] },
      { chargeKind: 'mix', amount: '1510.00', yd3: '10.00', on: [second] },
      { chargeKind: 'waiting', amount: '40.00', on: [second] },
      { chargeKind: 'perLoadFee', amount: '20.00', on: [first, second] },
      { chargeKind: 'tax', amount: '301.00', on: [] },
    ]);
    expect(jobOf(await yieldOf(w.company), w.barn.jobId)).toMatchObject({
      billedYd3: '20.00',
      // The third load stays the balance load of its order: 825 + 10 + 82.50 tax, no short load.
      costParts: [
        part('concrete', '3835.00', '153.40'),
        part('waiting', '40.00', '1.60'),
        part('fees', '30.00', '1.20'),
        part('pump', '500.00', '20.00'),
        part('tax', '383.50', '15.34'),
      ],
      cost: '4788.50',
      costPerYd3: '191.54',
      costFrom: 'both',
    });
  });

  it('does not expect a second time what is billed ahead of the concrete', async () => {
    const w = await world();
    await billed(w, [{ chargeKind: 'perLoadFee', amount: '10.00', on: w.shed.loadIds }]);
    expect(jobOf(await yieldOf(w.company), w.shed.jobId)).toMatchObject({
      cost: '730.00',
      billedYd3: null,
    });
  });

  it('says how many deliveries have no price instead of counting them as free', async () => {
    const { company, barn } = await world();
    const unknown = await supplier(company, 'No Sheet Yet', 'readyMix', []);
    const { jobId } = await poured(company, {
      number: '3',
      supplierId: unknown,
      day: '2026-07-02',
      figured: '10.00',
      loads: [{ yd3: '10.00' }],
    });
    const answer = await yieldOf(company);
    expect(jobOf(answer, jobId)).toMatchObject({
      cost: '0.00',
      costPerYd3: null,
      costParts: [],
      costFrom: 'none',
      unpriced: 1,
    });
    expect(jobOf(answer, barn.jobId)).toMatchObject({ unpriced: 0 });
    expect(answer.totals).toMatchObject({ unpriced: 1, cost: '5507.50' });
  });

  it('marks fewer than five loads, and knows no minutes where no clock was written', async () => {
    const { company, concrete } = await world();
    const { jobId } = await poured(company, {
      number: '4',
      supplierId: concrete,
      day: '2026-07-03',
      figured: '50.00',
      loads: Array.from({ length: 5 }, () => ({ yd3: '10.00' })),
    });
    expect(jobOf(await yieldOf(company), jobId)).toMatchObject({
      loads: 5,
      smallSample: false,
      orderedYd3: null,
      overrunShare: '0.0000',
      impliedThicknessIn: null,
      timedLoads: 0,
      minutesPerLoad: null,
      minutesPerYd3: null,
      // 5 × (1500 + 10 + 150); waiting cannot be proved without a clock, so none is expected.
      cost: '8300.00',
      costPerYd3: '166.00',
    });
  });
});
