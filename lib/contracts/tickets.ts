import { z } from 'zod';
import { MAX_LOAD_YD3 } from '../domain/tickets/limits';
import { clockMinutes, decimalText, note, pageInput, pageOf, plainDate, uuid } from './common';
import { photo, READING_STATES } from './photos';

export const TICKET_STATUSES = ['toCheck', 'confirmed', 'rejected'] as const;

/** The truck clock in the order in which a load lives. */
export const CLOCK_FIELDS = [
  'batchedAt',
  'arrivedAt',
  'startedAt',
  'finishedAt',
  'leftAt',
] as const;
export type ClockField = (typeof CLOCK_FIELDS)[number];

const shortText = z
  .string()
  .trim()
  .max(40)
  .transform((text) => text || null)
  .nullable()
  .default(null);
const amount = decimalText.refine((text) => Number(text) >= 0, 'zero or more');
const optionalAmount = amount.nullable().default(null);
const optionalClock = clockMinutes.nullable().default(null);

/** A ticket as a person confirms it. */
export const ticketValues = {
  number: z.string().trim().min(1, 'needed').max(40),
  supplierId: uuid,
  jobId: uuid,
  placementId: uuid.nullable().default(null),
  orderId: uuid.nullable().default(null),
  date: plainDate,
  plant: shortText,
  truck: shortText,
  loadNumber: z.int().min(1).max(999).nullable().default(null),
  mixCode: z.string().trim().max(40).default(''),
  quantityYd3: decimalText
    .refine((text) => Number(text) > 0, 'more than zero')
    .refine((text) => Number(text) <= MAX_LOAD_YD3, 'too much for one truck'),
  orderedYd3: optionalAmount,
  toDateYd3: optionalAmount,
  returnedYd3: optionalAmount,
  batchedAt: optionalClock,
  arrivedAt: optionalClock,
  startedAt: optionalClock,
  finishedAt: optionalClock,
  leftAt: optionalClock,
  waterAddedGal: optionalAmount,
  notes: note.default(''),
};

interface Checkable extends Record<ClockField, number | null> {
  readonly quantityYd3: string;
  readonly returnedYd3: string | null;
}

/** What must hold between the fields of a ticket. */
export function ticketProblems(ticket: Checkable): { path: string; message: string }[] {
  const problems: { path: string; message: string }[] = [];
  const { returnedYd3 } = ticket;
  if (returnedYd3 !== null && Number(returnedYd3) > Number(ticket.quantityYd3)) {
    problems.push({ path: 'returnedYd3', message: 'more than was delivered' });
  }
  let previous: number | null = null;
  for (const field of CLOCK_FIELDS) {
    const at = ticket[field];
    if (at === null) continue;
    if (previous !== null && at < previous) {
      problems.push({ path: field, message: 'earlier than the time before it' });
    }
    previous = at;
  }
  return problems;
}

function agreeing(ticket: Checkable, ctx: z.RefinementCtx): void {
  for (const { path, message } of ticketProblems(ticket)) {
    ctx.addIssue({ code: 'custom', path: [path], message });
  }
}

/** A ticket's values by themselves, as a form makes them. */
export const ticketValuesInput = z.strictObject(ticketValues).superRefine(agreeing);
export type TicketValuesInput = z.output<typeof ticketValuesInput>;

const addressed = {
  ticketId: uuid,
  /** The version that the person saw: a change made meanwhile is not overwritten. */
  version: z.int().min(1),
};

export const createTicketInput = z
  .strictObject({ clientId: uuid, ...ticketValues })
  .superRefine(agreeing);
export const confirmTicketInput = z
  .strictObject({ ...addressed, ...ticketValues })
  .superRefine(agreeing);
export type TicketInput = z.output<typeof confirmTicketInput>;

export const rejectTicketInput = z.strictObject({
  ...addressed,
  reason: z.string().trim().min(1, 'needed').max(300),
});
export const attachTicketInput = z.strictObject({
  ...addressed,
  supplierId: uuid,
  number: z.string().trim().min(1).max(40),
});
export const setClockInput = z.strictObject({
  ticketId: uuid,
  event: z.enum(['arrivedAt', 'startedAt', 'finishedAt', 'leftAt']),
  /** Minutes after midnight of the ticket's date; null takes a time back; absent means now. */
  at: clockMinutes.nullable().optional(),
});
export type ClockEvent = z.output<typeof setClockInput>['event'];

export const TICKET_SORTS = ['date', 'number', 'supplier', 'job', 'quantity', 'status'] as const;
const filters = {
  status: z.enum([...TICKET_STATUSES, 'all']).default('all'),
  supplierId: uuid.optional(),
  jobId: uuid.optional(),
  placementId: uuid.optional(),
  from: plainDate.optional(),
  to: plainDate.optional(),
  search: z.string().trim().max(80).default(''),
  sort: z.enum(TICKET_SORTS).default('date'),
  direction: z.enum(['up', 'down']).default('down'),
};
export const listTicketsInput = z.strictObject({ ...pageInput, ...filters });
export const exportTicketsInput = z.strictObject(filters);
export type TicketFilters = z.output<typeof exportTicketsInput>;

export const ticketRow = z.object({
  id: uuid,
  status: z.enum(TICKET_STATUSES),
  number: z.string(),
  date: plainDate,
  supplierName: z.string().nullable(),
  jobId: uuid,
  jobNumber: z.string(),
  jobName: z.string(),
  placementName: z.string().nullable(),
  mixCode: z.string(),
  quantityYd3: z.string().nullable(),
  returnedYd3: z.string().nullable(),
  truck: z.string().nullable(),
  plant: z.string().nullable(),
  loadNumber: z.number().int().nullable(),
  batchedAt: clockMinutes.nullable(),
  arrivedAt: clockMinutes.nullable(),
  startedAt: clockMinutes.nullable(),
  finishedAt: clockMinutes.nullable(),
  leftAt: clockMinutes.nullable(),
  hasPhoto: z.boolean(),
  /** What the reading says of a ticket that nobody has checked yet. */
  reading: z
    .object({
      state: z.enum(READING_STATES),
      number: z.string().nullable(),
      quantityYd3: z.string().nullable(),
      truck: z.string().nullable(),
      doubtful: z.number().int(),
    })
    .nullable(),
});
export type TicketRow = z.infer<typeof ticketRow>;
export const listTicketsOutput = pageOf(ticketRow);

const named = z.object({ id: uuid, name: z.string() });

/** How the company writes moments and clock times. */
export const timeStyle = z.object({ timeZone: z.string(), clock: z.enum(['12', '24']) });

export const ticketDetail = z.object({
  id: uuid,
  version: z.number().int(),
  status: z.enum(TICKET_STATUSES),
  number: z.string(),
  date: plainDate,
  supplier: named.nullable(),
  job: z.object({ id: uuid, number: z.string(), name: z.string() }),
  placement: named.nullable(),
  order: z.object({ id: uuid, number: z.string() }).nullable(),
  plant: z.string().nullable(),
  truck: z.string().nullable(),
  loadNumber: z.number().int().nullable(),
  mixCode: z.string(),
  quantityYd3: z.string().nullable(),
  orderedYd3: z.string().nullable(),
  toDateYd3: z.string().nullable(),
  returnedYd3: z.string().nullable(),
  batchedAt: clockMinutes.nullable(),
  arrivedAt: clockMinutes.nullable(),
  startedAt: clockMinutes.nullable(),
  finishedAt: clockMinutes.nullable(),
  leftAt: clockMinutes.nullable(),
  waterAddedGal: z.string().nullable(),
  notes: z.string(),
  times: timeStyle,
  confirmedBy: z.string().nullable(),
  confirmedAt: z.iso.datetime().nullable(),
  photos: z.array(photo),
  /** Where the ticket is billed; empty for whoever may not see statements. */
  billed: z.array(
    z.object({
      statementId: uuid,
      statementNumber: z.string(),
      invoiceNumber: z.string().nullable(),
      position: z.number().int(),
      closed: z.boolean(),
    }),
  ),
  /** What happened to it, newest first; empty for whoever works on site. */
  activity: z.array(
    z.object({
      id: uuid,
      at: z.iso.datetime(),
      actorName: z.string(),
      summary: z.string(),
      changes: z.array(z.object({ field: z.string(), before: z.string(), after: z.string() })),
    }),
  ),
});
export type TicketDetail = z.infer<typeof ticketDetail>;

export const getTicketInput = z.strictObject({ ticketId: uuid });

/** What a ticket can be tied to: names for the choices of a form or a filter. */
export const ticketChoicesInput = z.strictObject({ jobId: uuid.optional() });
export const ticketChoices = z.object({
  suppliers: z.array(z.object({ ...named.shape, kind: z.enum(['readyMix', 'pump', 'material']) })),
  jobs: z.array(z.object({ id: uuid, number: z.string(), name: z.string() })),
  placements: z.array(
    z.object({ ...named.shape, jobId: uuid, jobName: z.string(), pourDate: plainDate }),
  ),
  orders: z.array(
    z.object({
      id: uuid,
      number: z.string(),
      supplierId: uuid,
      jobId: uuid,
      placementId: uuid.nullable(),
    }),
  ),
});
export type TicketChoices = z.infer<typeof ticketChoices>;
