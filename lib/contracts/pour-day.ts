import { z } from 'zod';
import { clockMinutes, plainDate, uuid } from './common';
import { pumpTicketRow } from './pump-tickets';
import { ticketRow, timeStyle } from './tickets';

const tally = {
  /** Yards on orders that were sent or confirmed; null where nothing was ordered. */
  orderedYd3: z.string().nullable(),
  figuredYd3: z.string(),
  /** Yards of confirmed tickets, less what went back. */
  inYd3: z.string(),
  loadsIn: z.number().int(),
  /** Tickets photographed and not yet checked, and the yards that their readings say. */
  toCheck: z.number().int(),
  toCheckYd3: z.string(),
};

const placementHead = {
  id: uuid,
  name: z.string(),
  element: z.string(),
  pourDate: plainDate,
  firstTruckAt: clockMinutes.nullable(),
  status: z.enum(['planned', 'poured', 'cancelled']),
  jobId: uuid,
  jobNumber: z.string(),
  jobName: z.string(),
  address: z.string(),
};

export const pourDayInput = z.strictObject({ day: plainDate.optional() });
export const pourDay = z.object({
  day: plainDate,
  today: plainDate,
  times: timeStyle,
  neighbours: z.object({ before: plainDate.nullable(), after: plainDate.nullable() }),
  placements: z.array(z.object({ ...placementHead, ...tally })),
});
export type PourDay = z.infer<typeof pourDay>;

export const pourDayPlacementInput = z.strictObject({ placementId: uuid });
export const pourDayPlacement = z.object({
  ...placementHead,
  ...tally,
  notes: z.string(),
  today: plainDate,
  times: timeStyle,
  loads: z.array(ticketRow),
  pumpTickets: z.array(pumpTicketRow),
  orders: z.array(
    z.object({
      id: uuid,
      number: z.string(),
      supplierId: uuid,
      supplierName: z.string(),
      status: z.string(),
      lines: z.array(z.object({ code: z.string(), quantity: z.string(), unit: z.string() })),
    }),
  ),
  suppliers: z.array(
    z.object({ id: uuid, name: z.string(), kind: z.enum(['readyMix', 'pump', 'material']) }),
  ),
});
export type PourDayPlacement = z.infer<typeof pourDayPlacement>;
