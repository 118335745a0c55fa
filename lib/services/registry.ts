import { createJob } from './jobs/create-job';
import { getJob } from './jobs/get-job';
import { listJobs } from './jobs/list-jobs';
import { updateJob } from './jobs/update-job';
import type { Verb } from './verb';

/** Every verb there is: the API's description and the generated tests go through this list. */
export const REGISTRY = [listJobs, getJob, createJob, updateJob] as unknown as readonly Verb[];
