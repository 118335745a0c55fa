import { and, asc, eq, inArray, lt, lte, or, sql } from 'drizzle-orm';
import type { Handle } from '../../db/client';
import { workItems } from '../../db/schema/activity';
import type { WorkItem, WorkKind } from './work-item';

const LEASE_MS = 5 * 60_000;
export const MAX_ATTEMPTS = 6;

function leaseFrom(now: Date): Date {
  return new Date(now.getTime() + LEASE_MS);
}

/**
 * Takes the next item for this worker, or null. Two workers never get the same one: the row is
 * locked while it is taken, and leased afterwards. A lease that ran out belongs to a worker that
 * died, so its item is taken again.
 */
export async function claimNext(
  handle: Handle,
  kinds: readonly WorkKind[],
  now: Date,
): Promise<WorkItem | null> {
  const next = handle
    .select({ id: workItems.id })
    .from(workItems)
    .where(
      and(
        inArray(workItems.kind, [...kinds]),
        or(
          and(eq(workItems.state, 'waiting'), lte(workItems.runAfter, now)),
          and(eq(workItems.state, 'running'), lt(workItems.leaseUntil, now)),
        ),
      ),
    )
    .orderBy(asc(workItems.runAfter), asc(workItems.createdAt), asc(workItems.id))
    .limit(1)
    .for('update', { skipLocked: true });
  const [row] = await handle
    .update(workItems)
    .set({
      state: 'running',
      leaseUntil: leaseFrom(now),
      attempts: sql`${workItems.attempts} + 1`,
    })
    .where(inArray(workItems.id, next))
    .returning({
      id: workItems.id,
      companyId: workItems.companyId,
      kind: workItems.kind,
      subjectId: workItems.subjectId,
      attempt: workItems.attempts,
    });
  return row ?? null;
}

/** Says that a long piece of work is still being done. */
export async function renewLease(handle: Handle, item: WorkItem, now: Date): Promise<void> {
  await handle
    .update(workItems)
    .set({ leaseUntil: leaseFrom(now) })
    .where(and(eq(workItems.id, item.id), eq(workItems.state, 'running')));
}

export async function finish(handle: Handle, item: WorkItem, now: Date): Promise<void> {
  await handle
    .update(workItems)
    .set({ state: 'done', finishedAt: now, leaseUntil: null, lastError: null })
    .where(eq(workItems.id, item.id));
}

/** A quarter of a minute, a minute, four… at most an hour, until the next try. */
export function backOffMs(attempt: number): number {
  return Math.min(60 * 60_000, 15_000 * 4 ** (attempt - 1));
}

/** Puts an item back for later, or gives it up after the last try or when `isFinal`. */
export async function putBack(
  handle: Handle,
  item: WorkItem,
  error: string,
  now: Date,
  isFinal: boolean,
): Promise<'waiting' | 'failed'> {
  const isOver = isFinal || item.attempt >= MAX_ATTEMPTS;
  const state = isOver ? ('failed' as const) : ('waiting' as const);
  await handle
    .update(workItems)
    .set({
      state,
      lastError: error.slice(0, 500),
      leaseUntil: null,
      runAfter: new Date(now.getTime() + backOffMs(item.attempt)),
      finishedAt: isOver ? now : null,
    })
    .where(eq(workItems.id, item.id));
  return state;
}

/**
 * Frees what a killed server was doing. Only where this process is the only one on the data (the
 * embedded database): elsewhere another worker may hold the lease, and time frees it.
 */
export async function freeAll(handle: Handle): Promise<void> {
  await handle
    .update(workItems)
    .set({ state: 'waiting', leaseUntil: null })
    .where(eq(workItems.state, 'running'));
}
