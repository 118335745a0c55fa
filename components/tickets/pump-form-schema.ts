import { z } from 'zod';
import type { PumpTicketRow } from '@/lib/contracts/pump-tickets';
import { PUMP_CLOCK_FIELDS, pumpTicketValuesInput } from '@/lib/contracts/pump-tickets';
import { clockText, parseClock, unrollPastMidnight } from '@/lib/domain/time/clock-minutes';

/** A pump ticket as its form holds it: text everywhere, empty where there is nothing. */
const fields = z.object({
  number: z.string(),
  supplierId: z.string(),
  jobId: z.string(),
  placementId: z.string(),
  orderId: z.string(),
  date: z.string(),
  leftYardAt: z.string(),
  arrivedAt: z.string(),
  finishedAt: z.string(),
  leftAt: z.string(),
  backInYardAt: z.string(),
  pumpedYd3: z.string(),
  setUps: z.string(),
  notes: z.string(),
});
export type PumpForm = z.infer<typeof fields>;

/** The form's text made into what the API takes; what is wrong lands on its field. */
export const pumpForm = fields.transform((form, ctx) => {
  const times = unrollPastMidnight(PUMP_CLOCK_FIELDS.map((field) => parseClock(form[field])));
  const parsed = pumpTicketValuesInput.safeParse({
    ...form,
    placementId: form.placementId || null,
    orderId: form.orderId || null,
    ...Object.fromEntries(PUMP_CLOCK_FIELDS.map((field, index) => [field, times[index] ?? null])),
    pumpedYd3: form.pumpedYd3.trim().replace(',', '.'),
    setUps: Number(form.setUps || '0'),
  });
  if (parsed.success) return parsed.data;
  for (const issue of parsed.error.issues) {
    const path = issue.path.map(String);
    const field = path[0] as keyof PumpForm | undefined;
    const empty = field !== undefined && form[field].trim() === '';
    ctx.addIssue({ code: 'custom', path, message: empty ? 'needed' : issue.message });
  }
  return z.NEVER;
});

const time = (minutes: number | null) => (minutes === null ? '' : clockText(minutes));

export function formOfPumpTicket(ticket: PumpTicketRow): PumpForm {
  return {
    number: ticket.number,
    supplierId: ticket.supplierId,
    jobId: ticket.jobId,
    placementId: ticket.placementId ?? '',
    orderId: ticket.orderId ?? '',
    date: ticket.date,
    leftYardAt: time(ticket.leftYardAt),
    arrivedAt: time(ticket.arrivedAt),
    finishedAt: time(ticket.finishedAt),
    leftAt: time(ticket.leftAt),
    backInYardAt: time(ticket.backInYardAt),
    pumpedYd3: ticket.pumpedYd3,
    setUps: String(ticket.setUps),
    notes: ticket.notes,
  };
}

export function emptyPumpForm(known: Partial<PumpForm>): PumpForm {
  return {
    number: '',
    supplierId: '',
    jobId: '',
    placementId: '',
    orderId: '',
    date: '',
    leftYardAt: '',
    arrivedAt: '',
    finishedAt: '',
    leftAt: '',
    backInYardAt: '',
    pumpedYd3: '',
    setUps: '1',
    notes: '',
    ...known,
  };
}
