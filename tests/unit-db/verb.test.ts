import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import type { Store } from '../../db/client';
import { insertJob } from '../../db/queries/jobs';
import { jobs } from '../../db/schema/jobs';
import { fail, ok } from '../../lib/domain/result';
import { newId } from '../../lib/ids';
import type { Ctx } from '../../lib/services/context';
import { failure } from '../../lib/services/failure';
import { callVerb, defineVerb } from '../../lib/services/verb';
import { testCompany } from '../support/company';
import { testStore } from '../support/store';

let store: Store;
beforeAll(async () => {
  store = await testStore();
});
afterAll(() => store.close());

/** A verb that adds a job and then does what the test says. */
const addsJob = (then: (ctx: Ctx, jobId: string) => Promise<ReturnType<typeof ok<null>>>) =>
  defineVerb({
    name: 'test.addJob',
    says: 'Add a job',
    kind: 'write',
    permission: 'jobs.write',
    http: { method: 'POST', path: '/api/test' },
    input: z.strictObject({}),
    output: z.null(),
    async run(ctx) {
      const id = newId<'job'>();
      await insertJob(ctx.scope, id, {
        number: id.slice(0, 8),
        name: 'Test',
        customer: '',
        address: '',
        status: 'open',
        taxable: true,
      });
      return then(ctx, id);
    },
  });

const change = (entityId: string) => ({
  action: 'test.addJob',
  entity: 'job',
  entityId,
  summary: 'Added a job',
});

const countJobs = async (companyId: string) =>
  (await store.handle.select({ id: jobs.id }).from(jobs).where(eq(jobs.companyId, companyId)))
    .length;

test('a change that is recorded is there', async () => {
  const { owner, companyId } = await testCompany(store);
  const verb = addsJob(async (ctx, id) => {
    await ctx.record(change(id));
    return ok(null);
  });
  expect((await callVerb(verb, owner, {})).ok).toBe(true);
  expect(await countJobs(companyId)).toBe(1);
});

test('a change without its activity record does not commit', async () => {
  const { owner, companyId } = await testCompany(store);
  const verb = addsJob(async () => ok(null));
  await expect(callVerb(verb, owner, {})).rejects.toThrow('without recording it');
  expect(await countJobs(companyId)).toBe(0);
});

test('a change whose activity record can’t be written does not commit', async () => {
  const { owner, companyId } = await testCompany(store);
  const verb = addsJob(async (ctx) => {
    await ctx.record(change('not a uuid'));
    return ok(null);
  });
  await expect(callVerb(verb, owner, {})).rejects.toThrow();
  expect(await countJobs(companyId)).toBe(0);
});

test('a verb that fails after it wrote leaves nothing', async () => {
  const { owner, companyId } = await testCompany(store);
  const verb = addsJob(async (ctx, id) => {
    await ctx.record(change(id));
    return fail(failure('conflict', 'No.')) as never;
  });
  expect(await callVerb(verb, owner, {})).toMatchObject({ ok: false, error: { code: 'conflict' } });
  expect(await countJobs(companyId)).toBe(0);
});

test('a bug is thrown, and leaves nothing', async () => {
  const { owner, companyId } = await testCompany(store);
  const verb = addsJob(async () => {
    throw new Error('a bug');
  });
  await expect(callVerb(verb, owner, {})).rejects.toThrow('a bug');
  expect(await countJobs(companyId)).toBe(0);
});
