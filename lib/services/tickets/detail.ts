import { photosOfTicket } from '../../../db/queries/photos';
import type { TicketEvent } from '../../../db/queries/ticket-ties';
import { billedTicket, eventsOf } from '../../../db/queries/ticket-ties';
import type { FoundTicket } from '../../../db/queries/tickets';
import { roleMay } from '../../auth/policy';
import type { TicketDetail } from '../../contracts/tickets';
import type { Ctx } from '../context';
import { photoAnswer, pourContext } from './readings';

/** One ticket as its page shows it, as much of it as the person may see. */
export async function ticketDetail(ctx: Ctx, ticket: FoundTicket): Promise<TicketDetail> {
  const { scope, actor } = ctx;
  const photos = await photosOfTicket(scope, ticket.id);
  const context = photos.length > 0 ? await pourContext(scope, ticket) : null;
  const named = (id: string | null, name: string | null) =>
    id !== null && name !== null ? { id, name } : null;
  return {
    ...plainFields(ticket),
    supplier: named(ticket.supplierId, ticket.supplierName),
    job: { id: ticket.jobId, number: ticket.jobNumber, name: ticket.jobName },
    placement: named(ticket.placementId, ticket.placementName),
    order:
      ticket.orderId !== null && ticket.orderNumber !== null
        ? { id: ticket.orderId, number: ticket.orderNumber }
        : null,
    times: { timeZone: ctx.company.timeZone, clock: ctx.company.clock },
    confirmedBy: ticket.confirmedByName,
    confirmedAt: ticket.confirmedAt?.toISOString() ?? null,
    photos: context ? photos.map((photo) => photoAnswer(photo, context)) : [],
    billed: roleMay(actor.role, 'statements.read') ? await billedTicket(scope, ticket.id) : [],
    activity:
      actor.role === 'foreman' ? [] : (await eventsOf(scope, 'ticket', ticket.id)).map(event),
  };
}

function plainFields(ticket: FoundTicket) {
  const {
    companyId: _company,
    supplierId: _supplier,
    jobId: _job,
    placementId: _placement,
    orderId: _order,
    clientId: _client,
    createdAt: _created,
    confirmedBy: _by,
    confirmedAt: _at,
    supplierName: _supplierName,
    jobNumber: _jobNumber,
    jobName: _jobName,
    placementName: _placementName,
    orderNumber: _orderNumber,
    confirmedByName: _byName,
    ...fields
  } = ticket;
  return fields;
}

function event({ id, at, actorName, summary, before, after }: TicketEvent) {
  return {
    id,
    at: at.toISOString(),
    actorName,
    summary,
    changes: changesBetween(before, after),
  };
}

/** The fields that differ between a record's two states; nothing where one of them is missing. */
export function changesBetween(
  before: unknown,
  after: unknown,
): { field: string; before: string; after: string }[] {
  if (!isRecord(before) || !isRecord(after)) return [];
  const text = (value: unknown) => (value === null || value === undefined ? '' : String(value));
  return Object.keys(after)
    .map((field) => ({ field, before: text(before[field]), after: text(after[field]) }))
    .filter((change) => change.before !== change.after);
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
