import { findPumpTicket } from '../../../db/queries/pump-tickets';
import { getPumpTicketInput, pumpTicketRow } from '../../contracts/pump-tickets';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { pumpTicketAnswer } from './internal';

export const getPumpTicket = defineVerb({
  name: 'pumpTickets.get',
  says: 'Read one pump ticket',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/pump-tickets/{pumpTicketId}' },
  input: getPumpTicketInput,
  output: pumpTicketRow,
  async run({ scope, actor }, { pumpTicketId }) {
    const found = await findPumpTicket(scope, pumpTicketId, crewLimit(actor));
    return found ? ok(pumpTicketAnswer(found)) : fail(notFound('pump ticket'));
  },
});
