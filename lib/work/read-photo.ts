import { eq } from 'drizzle-orm';
import { findPhoto, setReading } from '../../db/queries/photos';
import { readingContext } from '../../db/queries/reading-context';
import { findTicket } from '../../db/queries/tickets';
import { companies } from '../../db/schema/companies';
import type { Scope } from '../../db/tx';
import { inTx } from '../../db/tx';
import type { ReadContext, ReadFailure, TicketReading } from '../../importers/ocr/reading';
import { READ_FAILURES } from '../../importers/ocr/reading';
import { type Clock, dayIn } from '../clock';
import type { CompanyId } from '../domain/ids';
import type { Result } from '../domain/result';
import { writeActivity } from '../services/record';
import { getBlob } from '../storage/blob-store';
import type { Handler, WorkItem } from './work-item';

/** What reads a picture; importers/ocr has the real one. */
export type ReadTicket = (
  bytes: Uint8Array,
  context: ReadContext,
) => Promise<Result<TicketReading, ReadFailure>>;

/** After this many tries a picture that ends the reader each time is given up for good. */
const MAX_TRIES = 3;

/**
 * The work of reading one photo. It writes the reading and nothing else: a ticket's own values
 * are only ever a person's, so a reading that comes late has nothing to overwrite.
 */
export function readPhotoHandler(read: ReadTicket): Handler {
  return async (item, store, clock) => {
    const scope: Scope = { companyId: item.companyId as CompanyId, handle: store.handle };
    const found = await findPhoto(scope, item.subjectId, null);
    // A finished reading stands: this is the repeat of work whose end was not noted.
    if (!found || found.reading?.state === 'read') return;
    if (item.attempt > MAX_TRIES) {
      await storeFailure(scope, item, clock, { code: 'engine', sentence: READ_FAILURES.engine });
      return;
    }
    await setReading(scope, item.subjectId, { state: 'reading' });
    const bytes = await getBlob(found.photo.sha256);
    if (!bytes) throw new Error(`The file of photo ${item.subjectId} is missing`);
    const context = await contextOf(scope, found.photo.ticketId, clock);
    const result = await read(bytes, context);
    if (result.ok) {
      await storeReading(scope, item, clock, result.value);
    } else if (result.error.code === 'engine' && item.attempt < MAX_TRIES) {
      throw new Error(result.error.sentence);
    } else {
      await storeFailure(scope, item, clock, result.error);
    }
  };
}

async function contextOf(
  scope: Scope,
  ticketId: string | null,
  clock: Clock,
): Promise<ReadContext> {
  const [company] = await scope.handle
    .select({ timeZone: companies.timeZone })
    .from(companies)
    .where(eq(companies.id, scope.companyId));
  if (!company) throw new Error(`Company ${scope.companyId} is missing`);
  const ticket = ticketId ? await findTicket(scope, ticketId, null) : null;
  const known = await readingContext(scope, ticket?.placementId ?? null);
  return {
    today: dayIn(company.timeZone, clock.now()),
    ...known,
    jobs: ticket ? [ticket.jobName] : [],
  };
}

async function storeReading(
  scope: Scope,
  item: WorkItem,
  clock: Clock,
  reading: TicketReading,
): Promise<void> {
  const fields = Object.values(reading.fields);
  const doubtful = fields.filter((field) => field.doubtful).length;
  await note(scope, item, clock, `Read ${fields.length} fields, ${doubtful} doubtful`, (inside) =>
    setReading(inside, item.subjectId, {
      state: 'read',
      fields: reading,
      failureCode: null,
      failureSentence: null,
      finishedAt: clock.now(),
    }),
  );
}

async function storeFailure(
  scope: Scope,
  item: WorkItem,
  clock: Clock,
  failure: ReadFailure,
): Promise<void> {
  await note(scope, item, clock, `Could not read the photo: ${failure.sentence}`, (inside) =>
    setReading(inside, item.subjectId, {
      state: 'failed',
      failureCode: failure.code,
      failureSentence: failure.sentence,
      finishedAt: clock.now(),
    }),
  );
}

/** Stores an outcome together with its line in the activity record. */
async function note(
  scope: Scope,
  item: WorkItem,
  clock: Clock,
  summary: string,
  store: (scope: Scope) => Promise<void>,
): Promise<void> {
  await inTx(scope, async (inside) => {
    await store(inside);
    const found = await findPhoto(inside, item.subjectId, null);
    await writeActivity(
      inside.handle,
      { companyId: scope.companyId, id: null, name: 'Strikeoff' },
      clock.now(),
      {
        action: 'photos.read',
        entity: 'ticket',
        entityId: found?.photo.ticketId ?? item.subjectId,
        summary,
      },
    );
  });
}
