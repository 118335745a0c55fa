import { listTickets as findTickets } from '../../../db/queries/ticket-list';
import { listTicketsInput, listTicketsOutput } from '../../contracts/tickets';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';
import { crewLimit } from './internal';

export const listTickets = defineVerb({
  name: 'tickets.list',
  says: 'List tickets, a page at a time',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/tickets' },
  input: listTicketsInput,
  output: listTicketsOutput,
  async run({ scope, actor }, { offset, limit, ...filters }) {
    const filter = { ...filters, crewMemberId: crewLimit(actor) };
    return ok(await findTickets(scope, filter, { offset, limit }));
  },
});
