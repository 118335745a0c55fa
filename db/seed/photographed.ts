import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { and, eq } from 'drizzle-orm';
import type { Clock } from '../../lib/clock';
import { newId } from '../../lib/ids';
import { uploadPhoto } from '../../lib/services/photos/upload-photo';
import type { Store } from '../client';
import { tickets } from '../schema/tickets';
import { demoPerson, done } from './acting';

/** Where the photographs of the demo's paper are kept. */
export const PHOTO_FOLDER = path.join('tests', 'fixtures', 'tickets');

/** Tickets of the demo that have a photograph beside them. */
export const PHOTOGRAPHED = [
  '558801',
  '558802',
  '558803',
  '558804',
  '558805',
  '558806',
  'H-40311',
  'H-40312',
  'H-40313',
  'H-40314',
] as const;

/**
 * Sends the photographs as the product's own people would; the worker then reads them like any
 * other. A photo that is there already is left alone.
 */
export async function sendPhotos(store: Store, companyId: string, clock: Clock): Promise<void> {
  const owner = await demoPerson(store.handle, companyId, 'owner');
  for (const number of PHOTOGRAPHED) {
    const [ticket] = await store.handle
      .select({ id: tickets.id, placementId: tickets.placementId })
      .from(tickets)
      .where(and(eq(tickets.companyId, companyId), eq(tickets.number, number)));
    if (!ticket?.placementId) throw new Error(`The demo has no ticket ${number}`);
    await done(uploadPhoto, owner, clock, {
      placementId: ticket.placementId,
      ticketId: ticket.id,
      clientId: newId(),
      fileName: `${number}.jpg`,
      bytes: new Uint8Array(await readFile(path.join(PHOTO_FOLDER, `${number}.jpg`))),
    });
  }
}
