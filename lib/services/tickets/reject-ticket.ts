import { findTicket, updateTicket } from '../../../db/queries/tickets';
import { ticketDetail as output, rejectTicketInput } from '../../contracts/tickets';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { ticketDetail } from './detail';
import {
  checkNotClosed,
  crewLimit,
  forRecord,
  foundAgain,
  staleTicket,
  ticketInWords,
} from './internal';

export const rejectTicket = defineVerb({
  name: 'tickets.reject',
  says: 'Set a ticket aside with a reason: its yards count no longer',
  kind: 'write',
  permission: 'tickets.write',
  http: { method: 'POST', path: '/api/tickets/{ticketId}/reject' },
  input: rejectTicketInput,
  output,
  async run(ctx, { ticketId, version, reason }) {
    const before = await findTicket(ctx.scope, ticketId, crewLimit(ctx.actor));
    if (!before) return fail(notFound('ticket'));
    if (before.status === 'rejected') {
      ctx.unchanged();
      return ok(await ticketDetail(ctx, before));
    }
    const refusal = await checkNotClosed(ctx, ticketId);
    if (refusal) return fail(refusal);
    const changed = await updateTicket(ctx.scope, ticketId, version, { status: 'rejected' });
    if (!changed) return fail(staleTicket(before));
    const ticket = await foundAgain(ctx, ticketId);
    await ctx.record({
      action: 'tickets.reject',
      entity: 'ticket',
      entityId: ticketId,
      summary: `Set aside ${ticketInWords(ticket.number)}: ${reason}`,
      before: forRecord(before),
      after: { ...forRecord(ticket), reason },
    });
    return ok(await ticketDetail(ctx, ticket));
  },
});
