import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Store } from '../../db/client';
import { createJob } from '../../lib/services/jobs/create-job';
import { listJobs } from '../../lib/services/jobs/list-jobs';
import { callVerb } from '../../lib/services/verb';
import { testCompany } from '../support/company';
import { testStore } from '../support/store';

let store: Store;
beforeAll(async () => {
  store = await testStore();
});
afterAll(() => store.close());

test('a foreman sees the jobs of his own crew and no others', async () => {
  const { owner, foreman } = await testCompany(store);
  await callVerb(createJob, owner, { number: '1', name: 'His', crewIds: [foreman.personId] });
  await callVerb(createJob, owner, { number: '2', name: 'Not his' });
  const seen = await callVerb(listJobs, foreman, {});
  expect(seen.ok && seen.value.rows.map((row) => row.name)).toEqual(['His']);
});

test('a job number is used once, and the refusal names the field', async () => {
  const { owner } = await testCompany(store);
  await callVerb(createJob, owner, { number: '1', name: 'First' });
  const again = await callVerb(createJob, owner, { number: '1', name: 'Second' });
  expect(!again.ok && again.error).toMatchObject({
    code: 'conflict',
    issues: [{ path: 'number' }],
  });
});
