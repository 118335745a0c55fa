import {
  billedTicket,
  findOrderTie,
  findPlacement,
  isJobOf,
} from '../../../db/queries/ticket-ties';
import {
  type FoundTicket,
  findTicket,
  findTicketByNumber,
  holdTicketNumbers,
  type TicketValues,
} from '../../../db/queries/tickets';
import type { Actor } from '../../auth/actor';
import type { TicketInput } from '../../contracts/tickets';
import { dayText, yardsWithUnit } from '../../text/format';
import type { Ctx } from '../context';
import type { Failure } from '../failure';
import { failure, notFound } from '../failure';

/** Whose crew a person's tickets are limited to; null for whoever sees all jobs. */
export function crewLimit(actor: Actor): string | null {
  return actor.seesAllJobs ? null : actor.personId;
}

/** "ticket 558142", or what to call one whose number nobody has confirmed. */
export function ticketInWords(number: string): string {
  return number ? `ticket ${number}` : 'a ticket without a number yet';
}

export function staleTicket(ticket: FoundTicket): Failure {
  const by = ticket.confirmedByName ? ` The last to confirm it was ${ticket.confirmedByName}.` : '';
  return failure(
    'conflict',
    `Somebody changed this ticket while you had it open.${by} Nothing of yours was saved: look at it again and repeat your change.`,
    [{ path: 'version', message: 'changed meanwhile' }],
  );
}

export type TicketTies = Pick<
  TicketInput,
  'supplierId' | 'jobId' | 'placementId' | 'orderId' | 'number'
>;

/**
 * Whether a ticket may be tied to what it names: all of it the company's own, the placement and
 * the order of the same job, the supplier one of ready-mix, and the number free. Holds the
 * supplier's numbers until the transaction ends. Null when all is well.
 */
export async function checkTies(
  ctx: Ctx,
  ties: TicketTies,
  exceptId: string | null,
): Promise<Failure | null> {
  const { scope, actor } = ctx;
  if (!(await isJobOf(scope, ties.jobId, crewLimit(actor)))) return notFound('job');
  if (ties.placementId !== null) {
    const placement = await findPlacement(scope, ties.placementId, crewLimit(actor));
    if (!placement) return notFound('placement');
    if (placement.jobId !== ties.jobId) {
      return mismatch('placementId', 'The placement belongs to another job.');
    }
  }
  const supplier = await holdTicketNumbers(scope, ties.supplierId);
  if (!supplier) return notFound('supplier');
  if (supplier.kind !== 'readyMix') {
    return mismatch('supplierId', `${supplier.name} does not deliver ready-mix.`);
  }
  if (ties.orderId !== null) {
    const order = await findOrderTie(scope, ties.orderId);
    if (!order) return notFound('order');
    if (order.jobId !== ties.jobId) return mismatch('orderId', 'The order is for another job.');
    if (order.supplierId !== ties.supplierId) {
      return mismatch('orderId', 'The order went to another supplier.');
    }
  }
  return checkNumber(ctx, { ...ties, supplierName: supplier.name }, exceptId);
}

function mismatch(path: string, message: string): Failure {
  return failure('invalid', message, [{ path, message }]);
}

/** Refuses a number that another of the supplier's tickets has. */
async function checkNumber(
  ctx: Ctx,
  wanted: { supplierId: string; supplierName: string; number: string },
  exceptId: string | null,
): Promise<Failure | null> {
  const same = await findTicketByNumber(ctx.scope, wanted.supplierId, wanted.number, exceptId);
  if (!same) return null;
  const theirs = await findTicket(ctx.scope, same.id, crewLimit(ctx.actor));
  if (!theirs) {
    return failure(
      'conflict',
      `Ticket ${wanted.number} of ${wanted.supplierName} is already on another job. Check the number, or ask the office.`,
      [{ path: 'number', message: 'already used on another job' }],
    );
  }
  const yards = theirs.quantityYd3 ? `, ${yardsWithUnit(theirs.quantityYd3)}` : '';
  return failure(
    'conflict',
    `Ticket ${wanted.number} of ${wanted.supplierName} is already here: ${dayText(theirs.date)}${yards}, ${theirs.jobName}. If this is a second photo of it, add the photo to that ticket; if not, check the number.`,
    [{ path: 'number', message: 'already used by another ticket' }],
  );
}

/** Refuses a change of a ticket that a closed statement was settled with. */
export async function checkNotClosed(ctx: Ctx, ticketId: string): Promise<Failure | null> {
  const closed = (await billedTicket(ctx.scope, ticketId)).find((line) => line.closed);
  if (!closed) return null;
  return failure(
    'closed',
    `This ticket was settled on statement ${closed.statementNumber}, which is closed. The owner can reopen the statement first.`,
  );
}

/** The fields of a ticket as its table keeps them, from what a person sent. */
export function storedValues(
  input: Omit<TicketInput, 'ticketId' | 'version'>,
): Omit<TicketValues, 'status'> {
  return {
    number: input.number,
    supplierId: input.supplierId,
    jobId: input.jobId,
    placementId: input.placementId,
    orderId: input.orderId,
    date: input.date,
    plant: input.plant,
    truck: input.truck,
    loadNumber: input.loadNumber,
    mixCode: input.mixCode,
    quantityYd3: input.quantityYd3,
    orderedYd3: input.orderedYd3,
    toDateYd3: input.toDateYd3,
    returnedYd3: input.returnedYd3,
    batchedAt: input.batchedAt,
    arrivedAt: input.arrivedAt,
    startedAt: input.startedAt,
    finishedAt: input.finishedAt,
    leftAt: input.leftAt,
    waterAddedGal: input.waterAddedGal,
    notes: input.notes,
  };
}

/** A ticket as the activity record keeps it: what a person would write down, by name. */
export function forRecord(ticket: FoundTicket): Record<string, string | number | null> {
  return {
    status: ticket.status,
    number: ticket.number,
    supplier: ticket.supplierName,
    job: ticket.jobName,
    placement: ticket.placementName,
    order: ticket.orderNumber,
    date: ticket.date,
    plant: ticket.plant,
    truck: ticket.truck,
    loadNumber: ticket.loadNumber,
    mixCode: ticket.mixCode,
    quantityYd3: ticket.quantityYd3,
    orderedYd3: ticket.orderedYd3,
    toDateYd3: ticket.toDateYd3,
    returnedYd3: ticket.returnedYd3,
    batchedAt: ticket.batchedAt,
    arrivedAt: ticket.arrivedAt,
    startedAt: ticket.startedAt,
    finishedAt: ticket.finishedAt,
    leftAt: ticket.leftAt,
    waterAddedGal: ticket.waterAddedGal,
    notes: ticket.notes,
  };
}

/** A ticket that was there a moment ago, in the same transaction. */
export async function foundAgain(ctx: Ctx, ticketId: string): Promise<FoundTicket> {
  const ticket = await findTicket(ctx.scope, ticketId, null);
  if (!ticket) throw new Error('The ticket just written is missing');
  return ticket;
}
