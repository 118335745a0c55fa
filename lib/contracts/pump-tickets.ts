import { z } from 'zod';
import { clockMinutes, decimalText, note, pageInput, pageOf, plainDate, uuid } from './common';

/** A pump's day in the order in which it passes, portal to portal. */
export const PUMP_CLOCK_FIELDS = [
  'leftYardAt',
  'arrivedAt',
  'finishedAt',
  'leftAt',
  'backInYardAt',
] as const;
export type PumpClockField = (typeof PUMP_CLOCK_FIELDS)[number];

const optionalClock = clockMinutes.nullable().default(null);

const pumpTicketValues = {
  number: z.string().trim().min(1, 'needed').max(40),
  supplierId: uuid,
  jobId: uuid,
  placementId: uuid.nullable().default(null),
  orderId: uuid.nullable().default(null),
  date: plainDate,
  leftYardAt: optionalClock,
  arrivedAt: optionalClock,
  finishedAt: optionalClock,
  leftAt: optionalClock,
  backInYardAt: optionalClock,
  pumpedYd3: decimalText.refine((text) => Number(text) >= 0, 'zero or more'),
  setUps: z.int().min(0).max(20).default(1),
  notes: note.default(''),
};

function inOrder(pumpTicket: Record<PumpClockField, number | null>, ctx: z.RefinementCtx): void {
  let previous: number | null = null;
  for (const field of PUMP_CLOCK_FIELDS) {
    const at = pumpTicket[field];
    if (at === null) continue;
    if (previous !== null && at < previous) {
      ctx.addIssue({ code: 'custom', path: [field], message: 'earlier than the time before it' });
    }
    previous = at;
  }
}

/** A pump ticket's values by themselves, as a form makes them. */
export const pumpTicketValuesInput = z.strictObject(pumpTicketValues).superRefine(inOrder);

export const createPumpTicketInput = z
  .strictObject({
    /** Made on the device before the first send, so that a repeat is recognised. */
    clientId: uuid,
    ...pumpTicketValues,
  })
  .superRefine(inOrder);

export const updatePumpTicketInput = z
  .strictObject({
    pumpTicketId: uuid,
    /** The `revision` that the person saw: a change made meanwhile is not overwritten. */
    revision: z.string().max(64),
    ...pumpTicketValues,
  })
  .superRefine(inOrder);

export const pumpTicketRow = z.object({
  id: uuid,
  /** Changes whenever any field does. */
  revision: z.string(),
  number: z.string(),
  date: plainDate,
  supplierId: uuid,
  supplierName: z.string(),
  jobId: uuid,
  jobNumber: z.string(),
  jobName: z.string(),
  placementId: uuid.nullable(),
  placementName: z.string().nullable(),
  orderId: uuid.nullable(),
  leftYardAt: clockMinutes.nullable(),
  arrivedAt: clockMinutes.nullable(),
  finishedAt: clockMinutes.nullable(),
  leftAt: clockMinutes.nullable(),
  backInYardAt: clockMinutes.nullable(),
  pumpedYd3: z.string(),
  setUps: z.number().int(),
  notes: z.string(),
});
export type PumpTicketRow = z.infer<typeof pumpTicketRow>;

export const listPumpTicketsInput = z.strictObject({
  ...pageInput,
  supplierId: uuid.optional(),
  jobId: uuid.optional(),
  placementId: uuid.optional(),
  from: plainDate.optional(),
  to: plainDate.optional(),
  search: z.string().trim().max(80).default(''),
});
export type PumpTicketFilters = Omit<z.output<typeof listPumpTicketsInput>, 'offset' | 'limit'>;
export const listPumpTicketsOutput = pageOf(pumpTicketRow);
export const getPumpTicketInput = z.strictObject({ pumpTicketId: uuid });
