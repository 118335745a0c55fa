import { findTicket } from '../../../db/queries/tickets';
import { getTicketInput, ticketDetail as output } from '../../contracts/tickets';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { ticketDetail } from './detail';
import { crewLimit } from './internal';

export const getTicket = defineVerb({
  name: 'tickets.get',
  says: 'Read one ticket with its photos and what was read from them',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/tickets/{ticketId}' },
  input: getTicketInput,
  output,
  async run(ctx, { ticketId }) {
    const ticket = await findTicket(ctx.scope, ticketId, crewLimit(ctx.actor));
    return ticket ? ok(await ticketDetail(ctx, ticket)) : fail(notFound('ticket'));
  },
});
