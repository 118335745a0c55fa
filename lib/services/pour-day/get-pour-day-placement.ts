import { placementHead } from '../../../db/queries/pour-day';
import { pumpTicketsOfPlacement } from '../../../db/queries/pump-tickets';
import { supplierNames } from '../../../db/queries/ticket-ties';
import { dayIn } from '../../clock';
import { pourDayPlacement, pourDayPlacementInput } from '../../contracts/pour-day';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { pumpTicketAnswer } from '../pump-tickets/internal';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { placementWork } from './tally';

export const getPourDayPlacement = defineVerb({
  name: 'pourDay.placement',
  says: 'One placement on its pour day: yards in, loads, pump tickets, what was ordered',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/pour-day/{placementId}' },
  input: pourDayPlacementInput,
  output: pourDayPlacement,
  async run({ scope, actor, clock, company }, { placementId }) {
    const head = await placementHead(scope, placementId, crewLimit(actor));
    const work = head && (await placementWork(scope, [placementId])).get(placementId);
    if (!head || !work) return fail(notFound('placement'));
    return ok({
      ...head,
      ...work.tally,
      today: dayIn(company.timeZone, clock.now()),
      times: { timeZone: company.timeZone, clock: company.clock },
      loads: work.loads,
      pumpTickets: (await pumpTicketsOfPlacement(scope, head)).map(pumpTicketAnswer),
      orders: work.orders.map(
        ({ supplierKind: _kind, supplierReference: _reference, ...order }) => order,
      ),
      suppliers: await supplierNames(scope),
    });
  },
});
