import { neighbouringDays, placementsOn } from '../../../db/queries/pour-day';
import { dayIn } from '../../clock';
import { pourDay, pourDayInput } from '../../contracts/pour-day';
import { ok } from '../../domain/result';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';
import { placementWork } from './tally';

export const getPourDay = defineVerb({
  name: 'pourDay.get',
  says: 'A day’s placements with the yards that are in; today when no day is named',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/pour-day' },
  input: pourDayInput,
  output: pourDay,
  async run({ scope, actor, clock, company }, input) {
    const today = dayIn(company.timeZone, clock.now());
    const day = input.day ?? today;
    const heads = await placementsOn(scope, day, crewLimit(actor));
    const work = await placementWork(
      scope,
      heads.map((head) => head.id),
    );
    return ok({
      day,
      today,
      times: { timeZone: company.timeZone, clock: company.clock },
      neighbours: await neighbouringDays(scope, day, crewLimit(actor)),
      placements: heads.map(({ notes: _notes, ...head }) => {
        const found = work.get(head.id);
        if (!found) throw new Error('A placement without its work');
        return { ...head, ...found.tally };
      }),
    });
  },
});
