import { findPhoto } from '../../../db/queries/photos';
import { fileAnswer } from '../../contracts/common';
import { getPhotoInput } from '../../contracts/photos';
import { fail, ok } from '../../domain/result';
import { getBlob } from '../../storage/blob-store';
import { notFound } from '../failure';
import { crewLimit } from '../tickets/internal';
import { defineVerb } from '../verb';

const ENDINGS = { 'image/jpeg': 'jpg', 'image/png': 'png', 'image/webp': 'webp' } as const;

export const getPhoto = defineVerb({
  name: 'photos.get',
  says: 'A ticket’s photo as it was sent',
  kind: 'read',
  permission: 'tickets.read',
  http: { method: 'GET', path: '/api/photos/{photoId}' },
  input: getPhotoInput,
  output: fileAnswer,
  async run({ scope, actor }, { photoId }) {
    const found = await findPhoto(scope, photoId, crewLimit(actor));
    if (!found) return fail(notFound('photo'));
    const { sha256, mediaType } = found.photo;
    const bytes = await getBlob(sha256);
    if (!bytes) throw new Error(`The file of photo ${photoId} (${sha256}) is missing`);
    const fileName = `ticket-photo-${sha256.slice(0, 8)}.${ENDINGS[mediaType]}`;
    return ok({ bytes, mediaType, fileName, inline: true });
  },
});
