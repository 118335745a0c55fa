import { findPhoto } from '../../../db/queries/photos';
import { findTicket } from '../../../db/queries/tickets';
import { getPhotoInput, reading } from '../../contracts/photos';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { pourContext, readingAnswer } from '../tickets/readings';
import { defineVerb } from '../verb';

export const getReading = defineVerb({
  name: 'readings.get',
  says: 'How far the reading of a photo is, and what was read',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/photos/{photoId}/reading' },
  input: getPhotoInput,
  output: reading,
  async run({ scope, actor }, { photoId }) {
    const found = await findPhoto(scope, photoId, crewLimit(actor));
    const ticketId = found?.photo.ticketId;
    const ticket = ticketId ? await findTicket(scope, ticketId, crewLimit(actor)) : null;
    if (!found || !ticket) return fail(notFound('photo'));
    return ok(readingAnswer(found, await pourContext(scope, ticket)));
  },
});
