import { findPumpTicket, insertPumpTicket } from '../../../db/queries/pump-tickets';
import { createPumpTicketInput, pumpTicketRow } from '../../contracts/pump-tickets';
import { fail, ok } from '../../domain/result';
import { failure } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { checkPumpTies, pumpTicketAnswer } from './internal';

export const createPumpTicket = defineVerb({
  name: 'pumpTickets.create',
  says: 'Add a pump ticket',
  kind: 'write',
  permission: 'tickets.write',
  http: { method: 'POST', path: '/api/pump-tickets' },
  input: createPumpTicketInput,
  output: pumpTicketRow,
  async run(ctx, { clientId, ...values }) {
    const earlier = await findPumpTicket(ctx.scope, clientId, crewLimit(ctx.actor));
    if (earlier) {
      ctx.unchanged();
      return ok(pumpTicketAnswer(earlier));
    }
    const refusal = await checkPumpTies(ctx, values, null);
    if (refusal) return fail(refusal);
    // The device's own id becomes the record's: a repeat then meets the first one.
    if (!(await insertPumpTicket(ctx.scope, clientId, values))) {
      return fail(failure('conflict', 'This pump ticket could not be added. Send it once more.'));
    }
    const added = await findPumpTicket(ctx.scope, clientId, null);
    if (!added) throw new Error('The pump ticket just added is missing');
    await ctx.record({
      action: 'pumpTickets.create',
      entity: 'pumpTicket',
      entityId: clientId,
      summary: `Added pump ticket ${added.number} of ${added.supplierName}, ${added.pumpedYd3} yd³ pumped`,
      after: added,
    });
    return ok(pumpTicketAnswer(added));
  },
});
