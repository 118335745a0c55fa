import { openStore } from '../../../db/client';
import { jobs } from '../../../db/schema/jobs';
import { createJob } from '../../../lib/services/jobs/create-job';
import { callVerb } from '../../../lib/services/verb';
import { testCompany } from '../../support/company';

/**
 * Adds jobs until it is killed, and says each number once it is stored. The first line lists
 * what was there at the start.
 */
const store = await openStore();
const { owner } = await testCompany(store);
const rows = await store.handle.select({ number: jobs.number }).from(jobs);
console.log(`start ${rows.map((row) => row.number).join(',')}`);
for (let i = 0; ; i += 1) {
  const number = `${process.pid}-${i}`;
  const result = await callVerb(createJob, owner, { number, name: 'Kill test' });
  if (!result.ok) throw new Error(result.error.message);
  console.log(`stored ${number}`);
}
