import { findPlacementRow } from '../../../db/queries/placements';
import { getPlacementInput, placementRow } from '../../contracts/placements';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';

export const getPlacement = defineVerb({
  name: 'placements.get',
  says: 'Read one placement with its yards',
  kind: 'read',
  permission: 'jobs.read',
  http: { method: 'GET', path: '/api/placements/{placementId}' },
  input: getPlacementInput,
  output: placementRow,
  async run({ scope, actor }, { placementId }) {
    const found = await findPlacementRow(scope, placementId, crewLimit(actor));
    return found ? ok(found) : fail(notFound('placement'));
  },
});
