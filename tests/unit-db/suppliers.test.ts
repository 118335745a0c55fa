import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Store } from '../../db/client';
import type { Actor } from '../../lib/auth/actor';
import { approveRateSheet } from '../../lib/services/rate-sheets/approve-rate-sheet';
import { createRateSheet } from '../../lib/services/rate-sheets/create-rate-sheet';
import { deleteRateSheet } from '../../lib/services/rate-sheets/delete-rate-sheet';
import { getRateSheet } from '../../lib/services/rate-sheets/get-rate-sheet';
import { updateRateSheet } from '../../lib/services/rate-sheets/update-rate-sheet';
import { createSupplier } from '../../lib/services/suppliers/create-supplier';
import { getSupplier } from '../../lib/services/suppliers/get-supplier';
import { listSuppliers } from '../../lib/services/suppliers/list-suppliers';
import { updateSupplier } from '../../lib/services/suppliers/update-supplier';
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
const refusal = async (verb: unknown, actor: Actor, input: unknown) => {
  const result = await callVerb(verb as Verb, actor, input);
  return result.ok ? null : result.error;
};

const SUPPLIER = {
  name: 'Slate Creek',
  kind: 'readyMix',
  dispatchEmail: 'dispatch@slate.example',
  creditEmail: '',
  phone: '',
  accountNumber: '',
};
const mix = (dollarsPerYd3: string, mixCode = '3000') => ({
  kind: 'mixPrice',
  mixCode,
  description: null,
  dollarsPerYd3,
});

async function world() {
  const company = await testCompany(store);
  const supplier = await value(createSupplier, company.owner, SUPPLIER);
  return { ...company, supplierId: supplier.id as string };
}
type World = Awaited<ReturnType<typeof world>>;
const draft = (w: World, effectiveFrom = '2026-01-01') =>
  value(createRateSheet, w.bookkeeper, {
    supplierId: w.supplierId,
    name: '2026',
    jobId: null,
    effectiveFrom,
  });
const change = (w: World, sheet: { id: string }, clauses: unknown[], from = '2026-01-01') =>
  value(updateRateSheet, w.bookkeeper, {
    rateSheetId: sheet.id,
    name: '2026',
    jobId: null,
    effectiveFrom: from,
    effectiveTo: null,
    clauses,
  });

describe('suppliers', () => {
  it('have one name each, in their own company only', async () => {
    const [w, other] = [await world(), await testCompany(store)];
    expect(await refusal(createSupplier, w.owner, SUPPLIER)).toMatchObject({
      code: 'conflict',
      issues: [{ path: 'name' }],
    });
    expect(await refusal(createSupplier, other.owner, SUPPLIER)).toBeNull();
    expect(await refusal(getSupplier, other.owner, { supplierId: w.supplierId })).toMatchObject({
      code: 'notFound',
    });
    expect(await refusal(listSuppliers, w.foreman, {})).toMatchObject({ code: 'notAllowed' });
  });

  it('are put away without losing anything', async () => {
    const w = await world();
    await value(updateSupplier, w.owner, {
      supplierId: w.supplierId,
      ...SUPPLIER,
      archived: true,
    });
    expect((await value(listSuppliers, w.owner, {})).total).toBe(0);
    expect((await value(listSuppliers, w.owner, { archived: 'yes' })).total).toBe(1);
  });
});

describe('rate sheets', () => {
  it('are drafted, read back in words, approved by the owner, and never changed after', async () => {
    const w = await world();
    const sheet = await draft(w);
    const changed = await change(w, sheet, [mix('150.00')]);
    expect(changed.lines[0].says).toContain('$150.00');
    expect(await refusal(approveRateSheet, w.bookkeeper, { rateSheetId: sheet.id })).toMatchObject({
      code: 'notAllowed',
    });
    await value(approveRateSheet, w.owner, { rateSheetId: sheet.id });
    expect(await value(approveRateSheet, w.owner, { rateSheetId: sheet.id })).toMatchObject({
      status: 'approved',
      approvedBy: 'Test owner',
    });
    await expect(change(w, sheet, [mix('1.00')])).rejects.toThrow('approved and stays as it is');
    expect(await refusal(deleteRateSheet, w.owner, { rateSheetId: sheet.id })).toMatchObject({
      code: 'closed',
    });
  });

  it('are not approved empty or with two prices for one mix', async () => {
    const w = await world();
    const sheet = await draft(w);
    expect(await refusal(approveRateSheet, w.owner, { rateSheetId: sheet.id })).toMatchObject({
      code: 'conflict',
    });
    const twice = await change(w, sheet, [mix('150.00'), mix('151.00')]);
    expect(twice.problems).toMatchObject([{ index: 1, severity: 'error' }]);
    expect(await refusal(approveRateSheet, w.owner, { rateSheetId: sheet.id })).toMatchObject({
      code: 'conflict',
    });
  });

  it('follow one another: the next begins with the last one’s clauses and ends it', async () => {
    const w = await world();
    const first = await draft(w);
    await change(w, first, [mix('150.00'), mix('160.00', '4000')]);
    await value(approveRateSheet, w.owner, { rateSheetId: first.id });
    const second = await draft(w, '2026-07-01');
    expect(second).toMatchObject({ version: 2, clauses: 2 });
    await value(approveRateSheet, w.owner, { rateSheetId: second.id });
    expect((await value(getRateSheet, w.owner, { rateSheetId: first.id })).effectiveTo).toBe(
      '2026-06-30',
    );
    expect((await value(getRateSheet, w.owner, { rateSheetId: second.id })).effectiveTo).toBeNull();
  });

  it('are thrown away while they are drafts, and are no one else’s', async () => {
    const [w, other] = [await world(), await world()];
    const sheet = await draft(w);
    for (const verb of [getRateSheet, approveRateSheet, deleteRateSheet]) {
      expect(await refusal(verb, other.owner, { rateSheetId: sheet.id })).toMatchObject({
        code: 'notFound',
      });
    }
    await value(deleteRateSheet, w.bookkeeper, { rateSheetId: sheet.id });
    expect(await refusal(getRateSheet, w.owner, { rateSheetId: sheet.id })).toMatchObject({
      code: 'notFound',
    });
  });

  it('refuse a clause with a negative or nonsensical figure, naming the field', async () => {
    const w = await world();
    const sheet = await draft(w);
    const bad = await refusal(updateRateSheet, w.bookkeeper, {
      rateSheetId: sheet.id,
      name: '2026',
      jobId: null,
      effectiveFrom: '2026-01-01',
      effectiveTo: null,
      clauses: [mix('-5')],
    });
    expect(bad).toMatchObject({ code: 'invalid', issues: [{ path: 'clauses.0.dollarsPerYd3' }] });
  });
});
