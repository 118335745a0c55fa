import { z } from 'zod';
import { name, pageInput, pageOf, uuid } from './common';

export const jobFields = {
  number: z.string().trim().min(1, 'needed').max(30),
  name,
  customer: z.string().trim().max(120).default(''),
  address: z.string().trim().max(200).default(''),
  taxable: z.boolean().default(true),
};

export const jobRow = z.object({
  id: uuid,
  number: z.string(),
  name: z.string(),
  customer: z.string(),
  address: z.string(),
  status: z.enum(['open', 'finished']),
  taxable: z.boolean(),
  crew: z.array(z.object({ id: uuid, name: z.string() })),
  /** Of its placements that were not called off; null where there is none. */
  figuredYd3: z.string().nullable(),
  /** On its orders that were not cancelled; null where nothing was ordered. */
  orderedYd3: z.string().nullable(),
  /** On its tickets that were not set aside. */
  deliveredYd3: z.string(),
});
export type JobRow = z.infer<typeof jobRow>;

export const listJobsInput = z.strictObject({
  ...pageInput,
  status: z.enum(['open', 'finished', 'all']).default('all'),
  search: z.string().trim().max(80).default(''),
});
export const listJobsOutput = pageOf(jobRow);

export const getJobInput = z.strictObject({ jobId: uuid });

export const createJobInput = z.strictObject({ ...jobFields, crewIds: z.array(uuid).default([]) });
export const updateJobInput = z.strictObject({
  jobId: uuid,
  ...jobFields,
  status: z.enum(['open', 'finished']),
  crewIds: z.array(uuid),
});

export const jobChoicesInput = z.strictObject({});
export const jobChoicesOutput = z.object({
  foremen: z.array(z.object({ id: uuid, name: z.string() })),
});
