import { and, asc, eq, getTableColumns, isNotNull, ne, sql } from 'drizzle-orm';
import { workItems } from '../schema/activity';
import { people } from '../schema/people';
import { photos, readings, tickets } from '../schema/tickets';
import type { Scope } from '../tx';
import { inCrew } from './crew';

export type StoredPhoto = typeof photos.$inferSelect;
export type StoredReading = typeof readings.$inferSelect;

export interface PhotoWithReading {
  readonly photo: StoredPhoto;
  readonly takenByName: string;
  readonly reading: StoredReading | null;
}

/** A photo of a ticket that the person may see; null when it is missing or not theirs. */
export async function findPhoto(
  scope: Scope,
  photoId: string,
  crewMemberId: string | null,
): Promise<PhotoWithReading | null> {
  const [row] = await photosWhere(
    scope,
    and(
      eq(photos.companyId, scope.companyId),
      eq(photos.id, photoId),
      isNotNull(photos.ticketId),
      inCrew(scope, tickets.jobId, crewMemberId),
    ),
  );
  return row ?? null;
}

export function photosOfTicket(scope: Scope, ticketId: string): Promise<PhotoWithReading[]> {
  return photosWhere(
    scope,
    and(eq(photos.companyId, scope.companyId), eq(photos.ticketId, ticketId)),
  );
}

function photosWhere(scope: Scope, where: ReturnType<typeof and>): Promise<PhotoWithReading[]> {
  return scope.handle
    .select({
      photo: getTableColumns(photos),
      takenByName: people.name,
      reading: getTableColumns(readings),
    })
    .from(photos)
    .innerJoin(people, and(eq(people.companyId, photos.companyId), eq(people.id, photos.takenBy)))
    .leftJoin(
      tickets,
      and(eq(tickets.companyId, photos.companyId), eq(tickets.id, photos.ticketId)),
    )
    .leftJoin(
      readings,
      and(eq(readings.companyId, photos.companyId), eq(readings.photoId, photos.id)),
    )
    .where(where)
    .orderBy(asc(photos.createdAt), asc(photos.id));
}

/** The photo that a device sent under its own id, whoever asks. */
export async function findPhotoByClient(
  scope: Scope,
  clientId: string,
): Promise<StoredPhoto | null> {
  const [row] = await scope.handle
    .select()
    .from(photos)
    .where(and(eq(photos.companyId, scope.companyId), eq(photos.clientId, clientId)));
  return row ?? null;
}

/** A photo with the very same bytes on a ticket that was not rejected, with that ticket. */
export async function findSamePhoto(
  scope: Scope,
  sha256: string,
): Promise<{ photoId: string; ticket: typeof tickets.$inferSelect } | null> {
  const [row] = await scope.handle
    .select({ photoId: photos.id, ticket: getTableColumns(tickets) })
    .from(photos)
    .innerJoin(
      tickets,
      and(eq(tickets.companyId, photos.companyId), eq(tickets.id, photos.ticketId)),
    )
    .where(
      and(
        eq(photos.companyId, scope.companyId),
        eq(photos.sha256, sha256),
        ne(tickets.status, 'rejected'),
      ),
    )
    .orderBy(asc(photos.createdAt), asc(photos.id))
    .limit(1);
  return row ?? null;
}

/** Adds a photo, its reading to come, and the work of reading it. */
export async function insertPhoto(
  scope: Scope,
  photo: Omit<StoredPhoto, 'companyId' | 'createdAt'>,
  ids: { readingId: string; workItemId: string },
  now: Date,
): Promise<void> {
  const { companyId } = scope;
  await scope.handle.insert(photos).values({ ...photo, companyId });
  await scope.handle
    .insert(readings)
    .values({ id: ids.readingId, companyId, photoId: photo.id, state: 'waiting' });
  await scope.handle.insert(workItems).values({
    id: ids.workItemId,
    companyId,
    kind: 'readPhoto',
    subjectId: photo.id,
    runAfter: now,
  });
}

/** Moves a ticket's photos to another ticket. */
export async function movePhotos(
  scope: Scope,
  fromTicketId: string,
  toTicketId: string,
): Promise<void> {
  await scope.handle
    .update(photos)
    .set({ ticketId: toTicketId })
    .where(and(eq(photos.companyId, scope.companyId), eq(photos.ticketId, fromTicketId)));
}

/** Stores what became of a reading. One that is `read` is never replaced by a later try. */
export async function setReading(
  scope: Scope,
  photoId: string,
  values: Pick<StoredReading, 'state'> &
    Partial<Pick<StoredReading, 'fields' | 'failureCode' | 'failureSentence' | 'finishedAt'>>,
): Promise<void> {
  await scope.handle
    .update(readings)
    .set(values)
    .where(
      and(
        eq(readings.companyId, scope.companyId),
        eq(readings.photoId, photoId),
        sql`${readings.state} <> 'read'`,
      ),
    );
}
