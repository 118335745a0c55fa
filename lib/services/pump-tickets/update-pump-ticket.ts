import {
  findPumpTicket,
  holdPumpTicket,
  updatePumpTicket as storePumpTicket,
} from '../../../db/queries/pump-tickets';
import { pumpTicketRow, updatePumpTicketInput } from '../../contracts/pump-tickets';
import { fail, ok } from '../../domain/result';
import { failure, notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { checkPumpTies, pumpTicketAnswer } from './internal';

export const updatePumpTicket = defineVerb({
  name: 'pumpTickets.update',
  says: 'Correct a pump ticket',
  kind: 'write',
  permission: 'tickets.write',
  http: { method: 'PUT', path: '/api/pump-tickets/{pumpTicketId}' },
  input: updatePumpTicketInput,
  output: pumpTicketRow,
  async run(ctx, { pumpTicketId, revision, ...values }) {
    await holdPumpTicket(ctx.scope, pumpTicketId);
    const before = await findPumpTicket(ctx.scope, pumpTicketId, crewLimit(ctx.actor));
    if (!before) return fail(notFound('pump ticket'));
    if (pumpTicketAnswer(before).revision !== revision) {
      return fail(
        failure(
          'conflict',
          'Somebody changed this pump ticket while you had it open. Nothing of yours was saved: look at it again and repeat your change.',
          [{ path: 'revision', message: 'changed meanwhile' }],
        ),
      );
    }
    const refusal = await checkPumpTies(ctx, values, pumpTicketId);
    if (refusal) return fail(refusal);
    await storePumpTicket(ctx.scope, pumpTicketId, values);
    const after = await findPumpTicket(ctx.scope, pumpTicketId, null);
    if (!after) throw new Error('The pump ticket just changed is missing');
    await ctx.record({
      action: 'pumpTickets.update',
      entity: 'pumpTicket',
      entityId: pumpTicketId,
      summary: `Corrected pump ticket ${after.number} of ${after.supplierName}`,
      before,
      after,
    });
    return ok(pumpTicketAnswer(after));
  },
});
