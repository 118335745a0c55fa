import {
  findTicket,
  findTicketByClient,
  holdTicketNumbers,
  insertTicket,
} from '../../../db/queries/tickets';
import { createTicketInput, ticketDetail as output } from '../../contracts/tickets';
import { fail, ok } from '../../domain/result';
import { newId } from '../../ids';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { ticketDetail } from './detail';
import { checkTies, crewLimit, forRecord, foundAgain, storedValues } from './internal';

export const createTicket = defineVerb({
  name: 'tickets.createByHand',
  says: 'Add a ticket typed by hand, confirmed by whoever typed it',
  kind: 'write',
  permission: 'tickets.write',
  http: { method: 'POST', path: '/api/tickets' },
  input: createTicketInput,
  output,
  async run(ctx, { clientId, ...input }) {
    // Held first: the same send twice at once then meets its own first ticket, not a taken number.
    await holdTicketNumbers(ctx.scope, input.supplierId);
    const earlier = await findTicketByClient(ctx.scope, clientId);
    if (earlier) {
      const ticket = await findTicket(ctx.scope, earlier.id, crewLimit(ctx.actor));
      if (!ticket) return fail(notFound('ticket'));
      ctx.unchanged();
      return ok(await ticketDetail(ctx, ticket));
    }
    const refusal = await checkTies(ctx, input, null);
    if (refusal) return fail(refusal);
    const id = newId<'ticket'>();
    const added = await insertTicket(ctx.scope, id, clientId, {
      ...storedValues(input),
      status: 'confirmed',
      confirmedBy: ctx.actor.personId,
      confirmedAt: ctx.clock.now(),
    });
    if (!added) throw new Error('The same ticket was sent twice at once; the first one is kept');
    const ticket = await foundAgain(ctx, id);
    await ctx.record({
      action: 'tickets.createByHand',
      entity: 'ticket',
      entityId: id,
      summary: `Typed in ticket ${ticket.number} of ${ticket.supplierName}, ${ticket.quantityYd3} yd³`,
      after: forRecord(ticket),
    });
    return ok(await ticketDetail(ctx, ticket));
  },
});
