import type { PhotoWithReading } from '../../../db/queries/photos';
import { ordersOfPlacements, supplierNames } from '../../../db/queries/ticket-ties';
import type { StoredTicket } from '../../../db/queries/tickets';
import type { Scope } from '../../../db/tx';
import { ticketReadingSchema } from '../../../importers/ocr/reading';
import type { Photo, Reading } from '../../contracts/photos';
import type { PourContext } from '../../domain/tickets/suggest-ticket';
import { suggestTicket } from '../../domain/tickets/suggest-ticket';

/** What is known about the pour that a ticket belongs to. */
export async function pourContext(
  scope: Scope,
  ticket: Pick<StoredTicket, 'date' | 'placementId'>,
): Promise<PourContext> {
  const suppliers = (await supplierNames(scope)).filter((one) => one.kind === 'readyMix');
  const { placementId } = ticket;
  const orders = placementId
    ? ((await ordersOfPlacements(scope, [placementId])).get(placementId) ?? [])
    : [];
  return {
    pourDate: ticket.date,
    suppliers,
    orders: orders
      .filter((order) => order.supplierKind === 'readyMix')
      .map((order) => ({ ...order, mixCodes: order.lines.map((line) => line.code) })),
  };
}

/** A photo with what was read from it, as screens get it. */
export function photoAnswer(found: PhotoWithReading, context: PourContext): Photo {
  const { photo } = found;
  return {
    id: photo.id,
    widthPx: photo.widthPx,
    heightPx: photo.heightPx,
    takenBy: found.takenByName,
    reading: readingAnswer(found, context),
  };
}

export function readingAnswer(found: PhotoWithReading, context: PourContext): Reading {
  const { photo, reading } = found;
  const read = reading?.state === 'read' ? ticketReadingSchema.parse(reading.fields) : null;
  return {
    photoId: photo.id,
    state: reading?.state ?? 'waiting',
    failureCode: reading?.failureCode ?? null,
    failureSentence: reading?.failureSentence ?? null,
    fields: read?.fields ?? null,
    notes: read?.notes ?? [],
    suggestion: read ? suggestTicket(read.fields, context) : null,
  };
}
