import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Store } from '../../db/client';
import { outbox } from '../../db/schema/activity';
import { orders } from '../../db/schema/orders';
import { suppliers } from '../../db/schema/suppliers';
import type { Actor } from '../../lib/auth/actor';
import { newId } from '../../lib/ids';
import { createJob } from '../../lib/services/jobs/create-job';
import { getJob } from '../../lib/services/jobs/get-job';
import { cancelOrder } from '../../lib/services/orders/cancel-order';
import { confirmOrder } from '../../lib/services/orders/confirm-order';
import { createOrder } from '../../lib/services/orders/create-order';
import { getOrder } from '../../lib/services/orders/get-order';
import { listOrders } from '../../lib/services/orders/list-orders';
import { sendOrder } from '../../lib/services/orders/send-order';
import { updateOrder } from '../../lib/services/orders/update-order';
import { createPlacement } from '../../lib/services/placements/create-placement';
import { getPlacement } from '../../lib/services/placements/get-placement';
import { listPlacements } from '../../lib/services/placements/list-placements';
import { updatePlacement } from '../../lib/services/placements/update-placement';
import type { Verb } from '../../lib/services/verb';
import { callVerb } from '../../lib/services/verb';
import { testCompany } from '../support/company';
import { testStore } from '../support/store';

let store: Store;
beforeAll(async () => {
  store = await testStore();
});
afterAll(() => store.close());

// biome-ignore lint/suspicious/noExplicitAny: the answers' shapes are the verbs' own; tests look into them
async function value(verb: unknown, actor: Actor, input: unknown): Promise<any> {
  const result = await callVerb(verb as Verb, actor, input);
  if (!result.ok) throw new Error(result.error.message);
  return result.value;
}

const PLACEMENT = {
  name: 'Floor',
  element: 'slab',
  subgrade: '',
  pourDate: '2026-06-10',
  firstTruckAt: 420,
  figuredYd3: '40.00',
  areaFt2: '2592',
  thicknessIn: '5',
  wastePercent: '5',
  notes: '',
};

async function world(dispatchEmail = 'dispatch@slate.example') {
  const company = await testCompany(store);
  const { owner, foreman } = company;
  const supplierId = newId();
  await store.handle.insert(suppliers).values({
    companyId: company.companyId,
    id: supplierId,
    name: 'Slate Creek',
    kind: 'readyMix',
    dispatchEmail,
  });
  const job = await value(createJob, owner, {
    number: '1',
    name: 'Barn',
    crewIds: [foreman.personId],
  });
  const placement = await value(createPlacement, owner, { jobId: job.id, ...PLACEMENT });
  const order = {
    supplierId,
    jobId: job.id,
    placementId: placement.id,
    pourDate: '2026-06-10',
    firstTruckAt: 420,
    spacingMinutes: 20,
    notes: '',
    lines: [{ code: '4000', description: '', quantity: '42.00', unit: 'yd³' }],
  };
  return { ...company, job, placement, order };
}
const draft = (w: Awaited<ReturnType<typeof world>>, actor = w.owner, clientId = newId()) =>
  value(createOrder, actor, { clientId, ...w.order });
const mails = (companyId: string) =>
  store.handle.select().from(outbox).where(eq(outbox.companyId, companyId));

describe('orders', () => {
  it('are drafted once under the next number, whoever repeats the request', async () => {
    const w = await world();
    const clientId = newId();
    const first = await draft(w, w.owner, clientId);
    expect(first).toMatchObject({ number: 'P-1001', status: 'draft', orderedYd3: '42.00' });
    expect((await draft(w, w.owner, clientId)).number).toBe('P-1001');
    const both = await Promise.all([draft(w), draft(w)]);
    expect(new Set(both.map((one) => one.number)).size).toBe(2);
    expect((await mails(w.companyId)).length).toBe(0);
  });

  it('are mailed to dispatch once per version, and every version is kept', async () => {
    const w = await world();
    const { id } = await draft(w);
    await Promise.all([
      value(sendOrder, w.owner, { orderId: id }),
      value(sendOrder, w.owner, { orderId: id }),
    ]);
    expect((await mails(w.companyId)).map((mail) => mail.to)).toEqual(['dispatch@slate.example']);
    await value(confirmOrder, w.owner, { orderId: id, supplierReference: 'SC-9' });
    const lines = [{ code: '4000', description: '', quantity: '45.00', unit: 'yd³' }];
    const changed = await value(updateOrder, w.owner, {
      orderId: id,
      version: 1,
      ...w.order,
      lines,
    });
    expect(changed).toMatchObject({ version: 2, status: 'draft', orderedYd3: '45.00' });
    const sent = await value(sendOrder, w.owner, { orderId: id });
    expect(sent.versions.map((one: { lines: string[] }) => one.lines[0])).toEqual([
      '45.00 yd³ of 4000',
      '42.00 yd³ of 4000',
    ]);
    const [, second] = await mails(w.companyId);
    expect(second?.subject).toContain('Changed order');
  });

  it('are not sent without an address, and the refusal says what to do', async () => {
    const w = await world('');
    const { id } = await draft(w);
    const refused = await callVerb(sendOrder, w.owner, { orderId: id });
    expect(!refused.ok && refused.error.message).toContain('no e-mail address for dispatch');
    expect(await value(confirmOrder, w.owner, { orderId: id })).toMatchObject({
      status: 'confirmed',
    });
  });

  it('are not changed from an old version, nor once they are cancelled', async () => {
    const w = await world();
    const { id } = await draft(w);
    await value(sendOrder, w.owner, { orderId: id });
    await value(updateOrder, w.owner, { orderId: id, version: 1, ...w.order });
    const stale = await callVerb(updateOrder, w.owner, { orderId: id, version: 1, ...w.order });
    expect(stale).toMatchObject({ ok: false, error: { code: 'conflict' } });
    await value(cancelOrder, w.owner, { orderId: id, reason: 'rain' });
    await value(cancelOrder, w.owner, { orderId: id, reason: 'rain' });
    expect((await mails(w.companyId)).map((mail) => mail.subject.split(':')[0])).toEqual([
      expect.stringContaining('Order'),
      'Cancelled',
    ]);
    for (const verb of [sendOrder, confirmOrder]) {
      expect(await callVerb(verb as Verb, w.owner, { orderId: id })).toMatchObject({
        ok: false,
        error: { code: 'closed' },
      });
    }
  });

  it('belong to a crew and a company', async () => {
    const [w, other] = [await world(), await world()];
    const { id } = await draft(w, w.foreman);
    const hidden = await value(createJob, w.owner, { number: '2', name: 'Not his' });
    const theirs = await value(createOrder, w.owner, {
      clientId: newId(),
      ...w.order,
      jobId: hidden.id,
      placementId: null,
    });
    const seen = await value(listOrders, w.foreman, {});
    expect(seen.rows.map((row: { id: string }) => row.id)).toEqual([id]);
    for (const orderId of [theirs.id]) {
      expect(await callVerb(getOrder, w.foreman, { orderId })).toMatchObject({
        ok: false,
        error: { code: 'notFound' },
      });
    }
    for (const verb of [getOrder, sendOrder, confirmOrder]) {
      expect(await callVerb(verb as Verb, other.owner, { orderId: id })).toMatchObject({
        ok: false,
        error: { code: 'notFound' },
      });
    }
    const foreign = { clientId: newId(), ...other.order, supplierId: w.order.supplierId };
    expect(await callVerb(createOrder, other.owner, foreign as never)).toMatchObject({
      ok: false,
      error: { code: 'notFound' },
    });
    const rows = await store.handle
      .select()
      .from(orders)
      .where(eq(orders.companyId, other.companyId));
    expect(rows).toEqual([]);
  });
});

describe('a sent order', () => {
  it('stays with the supplier who has it', async () => {
    const w = await world();
    const { id } = await draft(w);
    await value(sendOrder, w.owner, { orderId: id });
    const supplierId = newId();
    await store.handle
      .insert(suppliers)
      .values({ companyId: w.companyId, id: supplierId, name: 'Other', kind: 'readyMix' });
    const moved = { orderId: id, version: 1, ...w.order, supplierId };
    expect(await callVerb(updateOrder, w.owner, moved as never)).toMatchObject({
      ok: false,
      error: { code: 'conflict', issues: [{ path: 'supplierId' }] },
    });
  });
});

describe('placements', () => {
  it('keep their yards beside those ordered, and a job sums them up', async () => {
    const w = await world();
    const order = await draft(w);
    const placementId = w.placement.id;
    expect((await value(getPlacement, w.foreman, { placementId })).orderedYd3).toBeNull();
    await value(sendOrder, w.owner, { orderId: order.id });
    expect(await value(getPlacement, w.foreman, { placementId })).toMatchObject({
      figuredYd3: '40.00',
      orderedYd3: '42.00',
      deliveredYd3: '0.00',
    });
    expect(await value(getJob, w.owner, { jobId: w.job.id })).toMatchObject({
      figuredYd3: '40.00',
      orderedYd3: '42.00',
    });
    const calledOff = { placementId, ...PLACEMENT, status: 'cancelled' };
    expect(await callVerb(updatePlacement, w.bookkeeper, calledOff as never)).toMatchObject({
      ok: false,
      error: { code: 'conflict', issues: [{ path: 'status' }] },
    });
    await value(updateOrder, w.owner, { orderId: order.id, version: 1, ...w.order });
    expect((await value(getPlacement, w.foreman, { placementId })).orderedYd3).toBe('42.00');
    await value(cancelOrder, w.owner, { orderId: order.id, reason: 'rain' });
    await value(updatePlacement, w.bookkeeper, {
      placementId,
      ...PLACEMENT,
      figuredYd3: '41.50',
      status: 'cancelled',
    });
    expect((await value(getJob, w.owner, { jobId: w.job.id })).figuredYd3).toBeNull();
    const list = await value(listPlacements, w.owner, { jobId: w.job.id });
    expect(list).toMatchObject({ total: 1, rows: [{ status: 'cancelled', figuredYd3: '41.50' }] });
  });

  it('are the office’s to change, and nobody’s of another company', async () => {
    const [w, other] = [await world(), await world()];
    const placementId = w.placement.id;
    const change = { placementId, ...PLACEMENT, status: 'planned' };
    expect(await callVerb(updatePlacement, w.foreman, change as never)).toMatchObject({
      ok: false,
      error: { code: 'notAllowed' },
    });
    for (const [verb, input] of [
      [getPlacement, { placementId }],
      [updatePlacement, change],
      [listPlacements, { jobId: w.job.id }],
      [createPlacement, { jobId: w.job.id, ...PLACEMENT }],
    ] as const) {
      expect(await callVerb(verb as Verb, other.owner, input)).toMatchObject({
        ok: false,
        error: { code: 'notFound' },
      });
    }
  });
});
