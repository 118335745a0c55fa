import { z } from 'zod';
import type { Suggestion } from '@/lib/contracts/photos';
import type { TicketDetail } from '@/lib/contracts/tickets';
import { CLOCK_FIELDS, ticketValuesInput } from '@/lib/contracts/tickets';
import { clockText, parseClock, unrollPastMidnight } from '@/lib/domain/time/clock-minutes';

/** A ticket as its form holds it: text everywhere, empty where there is nothing. */
const shape = {
  number: z.string(),
  supplierId: z.string(),
  jobId: z.string(),
  placementId: z.string(),
  orderId: z.string(),
  date: z.string(),
  plant: z.string(),
  truck: z.string(),
  loadNumber: z.string(),
  mixCode: z.string(),
  quantityYd3: z.string(),
  orderedYd3: z.string(),
  toDateYd3: z.string(),
  returnedYd3: z.string(),
  batchedAt: z.string(),
  arrivedAt: z.string(),
  startedAt: z.string(),
  finishedAt: z.string(),
  leftAt: z.string(),
  waterAddedGal: z.string(),
  notes: z.string(),
};
const fields = z.object(shape);
export type TicketForm = z.infer<typeof fields>;
export type TicketFormField = keyof TicketForm;

const NOTHING_CHOSEN = 'needed';

/** The form's text made into what the API takes; what is wrong lands on its field. */
export const ticketForm = fields.transform((form, ctx) => {
  const parsed = ticketValuesInput.safeParse(asInput(form));
  if (parsed.success) return parsed.data;
  for (const issue of parsed.error.issues) {
    const path = issue.path.map(String);
    const field = path[0] as TicketFormField | undefined;
    const empty = field !== undefined && form[field].trim() === '';
    ctx.addIssue({ code: 'custom', path, message: empty ? NOTHING_CHOSEN : issue.message });
  }
  return z.NEVER;
});

function asInput(form: TicketForm) {
  const times = unrollPastMidnight(CLOCK_FIELDS.map((field) => parseClock(form[field])));
  return {
    number: form.number,
    supplierId: form.supplierId,
    jobId: form.jobId,
    placementId: form.placementId || null,
    orderId: form.orderId || null,
    date: form.date,
    plant: form.plant,
    truck: form.truck,
    loadNumber: form.loadNumber.trim() === '' ? null : Number(form.loadNumber),
    mixCode: form.mixCode,
    quantityYd3: decimal(form.quantityYd3) ?? '',
    orderedYd3: decimal(form.orderedYd3),
    toDateYd3: decimal(form.toDateYd3),
    returnedYd3: decimal(form.returnedYd3),
    ...Object.fromEntries(CLOCK_FIELDS.map((field, index) => [field, times[index] ?? null])),
    waterAddedGal: decimal(form.waterAddedGal),
    notes: form.notes,
  };
}

/** A number as typed, a comma or a leading point allowed; null for nothing. */
function decimal(text: string): string | null {
  const plain = text.trim().replace(',', '.').replace(/^\./, '0.').replace(/\.$/, '');
  return plain === '' ? null : plain;
}

const time = (minutes: number | null) => (minutes === null ? '' : clockText(minutes));

/** What the form starts with for a ticket that is there. */
export function formOfTicket(ticket: TicketDetail): TicketForm {
  return {
    number: ticket.number,
    supplierId: ticket.supplier?.id ?? '',
    jobId: ticket.job.id,
    placementId: ticket.placement?.id ?? '',
    orderId: ticket.order?.id ?? '',
    date: ticket.date,
    plant: ticket.plant ?? '',
    truck: ticket.truck ?? '',
    loadNumber: ticket.loadNumber === null ? '' : String(ticket.loadNumber),
    mixCode: ticket.mixCode,
    quantityYd3: ticket.quantityYd3 ?? '',
    orderedYd3: ticket.orderedYd3 ?? '',
    toDateYd3: ticket.toDateYd3 ?? '',
    returnedYd3: ticket.returnedYd3 ?? '',
    batchedAt: time(ticket.batchedAt),
    arrivedAt: time(ticket.arrivedAt),
    startedAt: time(ticket.startedAt),
    finishedAt: time(ticket.finishedAt),
    leftAt: time(ticket.leftAt),
    waterAddedGal: ticket.waterAddedGal ?? '',
    notes: ticket.notes,
  };
}

/** The same with what the photo's finished reading offers, for a ticket that is to be checked. */
export function startOfCheck(ticket: TicketDetail): TicketForm {
  const form = formOfTicket(ticket);
  const suggestion = ticket.photos.at(-1)?.reading.suggestion;
  if (!suggestion || ticket.status === 'confirmed') return form;
  return { ...form, ...Object.fromEntries(fillable(suggestion, form, new Set())) };
}

/** What the form starts with for a ticket that is typed in. */
export function emptyForm(known: Partial<TicketForm>): TicketForm {
  const blank = Object.fromEntries(Object.keys(shape).map((field) => [field, '']));
  return { ...(blank as TicketForm), ...known };
}

/**
 * The fields that a reading may fill: those that nobody has touched and nothing is in, or the
 * date, which every ticket has from its placement.
 */
export function fillable(
  suggestion: Suggestion,
  form: TicketForm,
  touched: ReadonlySet<string>,
): [TicketFormField, string][] {
  const offered: [TicketFormField, string][] = [
    ...(Object.entries(suggestion.values) as [TicketFormField, string][]),
    ...(suggestion.orderId
      ? ([['orderId', suggestion.orderId]] as [TicketFormField, string][])
      : []),
  ];
  return offered.filter(
    ([field, value]) =>
      !touched.has(field) && value !== form[field] && (form[field] === '' || field === 'date'),
  );
}
