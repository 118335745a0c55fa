import { movePhotos } from '../../../db/queries/photos';
import { findTicket, findTicketByNumber, updateTicket } from '../../../db/queries/tickets';
import { attachTicketInput, ticketDetail as output } from '../../contracts/tickets';
import { fail, ok } from '../../domain/result';
import { failure, notFound } from '../failure';
import { defineVerb } from '../verb';
import { ticketDetail } from './detail';
import { crewLimit, forRecord, foundAgain, staleTicket } from './internal';

export const attachTicket = defineVerb({
  name: 'tickets.attach',
  says: 'Move an unchecked ticket’s photos to the ticket that already has its number',
  kind: 'write',
  permission: 'tickets.write',
  http: { method: 'POST', path: '/api/tickets/{ticketId}/attach' },
  input: attachTicketInput,
  output,
  async run(ctx, { ticketId, version, supplierId, number }) {
    const { scope, actor } = ctx;
    const extra = await findTicket(scope, ticketId, crewLimit(actor));
    if (!extra) return fail(notFound('ticket'));
    const same = await findTicketByNumber(scope, supplierId, number, ticketId);
    const target = same && (await findTicket(scope, same.id, crewLimit(actor)));
    if (!target) return fail(notFound('ticket'));
    if (extra.status !== 'toCheck') {
      return fail(failure('conflict', 'Only a photo that nobody has checked can be moved.'));
    }
    if (!(await updateTicket(scope, ticketId, version, { status: 'rejected' }))) {
      return fail(staleTicket(extra));
    }
    await movePhotos(scope, ticketId, target.id);
    const reason = `a second photo of ticket ${target.number}`;
    await ctx.record({
      action: 'tickets.attach',
      entity: 'ticket',
      entityId: ticketId,
      summary: `Set aside a ticket without a number: ${reason}`,
      before: forRecord(extra),
      after: { ...forRecord(await foundAgain(ctx, ticketId)), reason },
    });
    await ctx.record({
      action: 'tickets.attach',
      entity: 'ticket',
      entityId: target.id,
      summary: `Added another photo to ticket ${target.number}`,
    });
    return ok(await ticketDetail(ctx, target));
  },
});
