import { findTicket, updateTicket as storeTicket } from '../../../db/queries/tickets';
import { confirmTicketInput, ticketDetail as output } from '../../contracts/tickets';
import { fail, ok } from '../../domain/result';
import { failure, notFound } from '../failure';
import { defineVerb } from '../verb';
import { ticketDetail } from './detail';
import {
  checkNotClosed,
  checkTies,
  crewLimit,
  forRecord,
  foundAgain,
  staleTicket,
  storedValues,
} from './internal';

export const updateTicket = defineVerb({
  name: 'tickets.update',
  says: 'Correct a confirmed ticket',
  kind: 'write',
  permission: 'tickets.write',
  http: { method: 'PUT', path: '/api/tickets/{ticketId}' },
  input: confirmTicketInput,
  output,
  async run(ctx, { ticketId, version, ...input }) {
    const before = await findTicket(ctx.scope, ticketId, crewLimit(ctx.actor));
    if (!before) return fail(notFound('ticket'));
    if (before.status !== 'confirmed') {
      return fail(failure('conflict', 'This ticket is not confirmed: check and confirm it first.'));
    }
    const refusal =
      (await checkNotClosed(ctx, ticketId)) ?? (await checkTies(ctx, input, ticketId));
    if (refusal) return fail(refusal);
    if (!(await storeTicket(ctx.scope, ticketId, version, storedValues(input)))) {
      return fail(staleTicket(before));
    }
    const ticket = await foundAgain(ctx, ticketId);
    await ctx.record({
      action: 'tickets.update',
      entity: 'ticket',
      entityId: ticketId,
      summary: `Corrected ticket ${ticket.number} of ${ticket.supplierName}`,
      before: forRecord(before),
      after: forRecord(ticket),
    });
    return ok(await ticketDetail(ctx, ticket));
  },
});
