import { ticketChoices as findChoices } from '../../../db/queries/ticket-ties';
import { ticketChoices as output, ticketChoicesInput } from '../../contracts/tickets';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';
import { crewLimit } from './internal';

export const ticketChoices = defineVerb({
  name: 'tickets.choices',
  says: 'The suppliers, jobs, placements and orders that a ticket can be tied to, by name',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/tickets/choices' },
  input: ticketChoicesInput,
  output,
  async run({ scope, actor }, { jobId }) {
    return ok(await findChoices(scope, crewLimit(actor), jobId ?? null));
  },
});
