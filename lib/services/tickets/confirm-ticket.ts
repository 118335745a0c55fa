import type { FoundTicket } from '../../../db/queries/tickets';
import { findTicket, updateTicket } from '../../../db/queries/tickets';
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

export const confirmTicket = defineVerb({
  name: 'tickets.confirm',
  says: 'Say that a ticket’s fields are right; from then on its yards count',
  kind: 'write',
  permission: 'tickets.write',
  http: { method: 'POST', path: '/api/tickets/{ticketId}/confirm' },
  input: confirmTicketInput,
  output,
  async run(ctx, { ticketId, version, ...input }) {
    const before = await findTicket(ctx.scope, ticketId, crewLimit(ctx.actor));
    if (!before) return fail(notFound('ticket'));
    const values = storedValues(input);
    if (before.status === 'confirmed') {
      if (before.confirmedBy !== ctx.actor.personId || !sameValues(before, values)) {
        return fail(alreadyConfirmed(before));
      }
      ctx.unchanged();
      return ok(await ticketDetail(ctx, before));
    }
    const refusal =
      (await checkTies(ctx, input, ticketId)) ?? (await checkNotClosed(ctx, ticketId));
    if (refusal) return fail(refusal);
    const changed = await updateTicket(ctx.scope, ticketId, version, {
      ...values,
      status: 'confirmed',
      confirmedBy: ctx.actor.personId,
      confirmedAt: ctx.clock.now(),
    });
    if (!changed) return fail(staleTicket(before));
    const ticket = await foundAgain(ctx, ticketId);
    await ctx.record({
      action: 'tickets.confirm',
      entity: 'ticket',
      entityId: ticketId,
      summary: `Confirmed ticket ${ticket.number} of ${ticket.supplierName}, ${ticket.quantityYd3} yd³`,
      before: forRecord(before),
      after: forRecord(ticket),
    });
    return ok(await ticketDetail(ctx, ticket));
  },
});

function alreadyConfirmed(ticket: FoundTicket) {
  return failure(
    'conflict',
    `${ticket.confirmedByName ?? 'Somebody'} has confirmed this ticket already, as ${ticket.number}. Open it again to see what it says; you can still correct it.`,
    [{ path: 'version', message: 'confirmed meanwhile' }],
  );
}

/** Whether a repeat, sent because the first answer was lost, says what is stored already. */
function sameValues(ticket: FoundTicket, values: ReturnType<typeof storedValues>): boolean {
  return Object.entries(values).every(([field, value]) => {
    const stored = ticket[field as keyof FoundTicket];
    if (typeof stored === 'string' && typeof value === 'string' && /Yd3$|Gal$/.test(field)) {
      return Number(stored) === Number(value);
    }
    return stored === value;
  });
}
