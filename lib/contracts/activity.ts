import { z } from 'zod';
import { pageInput, pageOf, plainDate, uuid } from './common';

const activityRow = z.object({
  id: uuid,
  at: z.iso.datetime(),
  actorId: uuid.nullable(),
  actorName: z.string(),
  /** "orders.send" */
  action: z.string(),
  entity: z.string(),
  entityId: uuid,
  summary: z.string(),
  before: z.unknown(),
  after: z.unknown(),
});
export type ActivityRow = z.infer<typeof activityRow>;

export const listActivityInput = z.strictObject({
  ...pageInput,
  actorId: uuid.optional(),
  entity: z.string().trim().max(40).optional(),
  entityId: uuid.optional(),
  /** Days in the company's time zone, both included. */
  from: plainDate.optional(),
  to: plainDate.optional(),
  search: z.string().trim().max(80).default(''),
});
export const listActivityOutput = pageOf(activityRow).extend({
  /** What there is to filter by. */
  entities: z.array(z.string()),
});
