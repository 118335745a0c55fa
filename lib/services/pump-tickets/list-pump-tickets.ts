import { listPumpTickets as findPumpTickets } from '../../../db/queries/pump-tickets';
import { listPumpTicketsInput, listPumpTicketsOutput } from '../../contracts/pump-tickets';
import { ok } from '../../domain/result';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { pumpTicketAnswer } from './internal';

export const listPumpTickets = defineVerb({
  name: 'pumpTickets.list',
  says: 'List pump tickets, a page at a time',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/pump-tickets' },
  input: listPumpTicketsInput,
  output: listPumpTicketsOutput,
  async run({ scope, actor }, { offset, limit, ...filters }) {
    const filter = { ...filters, crewMemberId: crewLimit(actor) };
    const { rows, total } = await findPumpTickets(scope, filter, { offset, limit });
    return ok({ rows: rows.map(pumpTicketAnswer), total });
  },
});
