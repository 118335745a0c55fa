import { setTimeout as wait } from 'node:timers/promises';
import type { Store } from '../../db/client';
import type { Clock } from '../clock';
import { log } from '../log';
import { claimNext, finish, freeAll, MAX_ATTEMPTS, putBack, renewLease } from './queue';
import type { Handler, WorkItem, WorkKind } from './work-item';
import { GiveUp } from './work-item';

const RENEW_EVERY_MS = 60_000;

export interface WorkerOptions {
  readonly store: Store;
  readonly clock: Clock;
  readonly handlers: Partial<Record<WorkKind, Handler>>;
  /** How long to wait after finding nothing to do. */
  readonly idleMs?: number;
}

export interface Worker {
  /** Takes no further item and resolves when the one in hand is done. */
  stop(): Promise<void>;
}

/** Starts the loop that does the work items one after the other, off the request path. */
export function startWorker({ store, clock, handlers, idleMs = 1000 }: WorkerOptions): Worker {
  const stopping = new AbortController();
  const loop = async () => {
    if (store.kind === 'pglite') await freeAll(store.handle);
    while (!stopping.signal.aborted) {
      const worked = await doNext(store, clock, handlers).catch((error: unknown) => {
        // The database itself failed; the item, if any, is taken again when its lease is over.
        log.error({ err: error }, 'the worker could not go on; trying again');
        return false;
      });
      if (!worked) await idle(idleMs, stopping.signal);
    }
  };
  const ended = loop();
  return {
    async stop() {
      stopping.abort();
      await ended;
    },
  };
}

async function idle(ms: number, signal: AbortSignal): Promise<void> {
  await wait(ms, undefined, { signal }).catch((error: unknown) => {
    if (!signal.aborted) throw error;
  });
}

/** Does one item if there is one; false when there was nothing to do. */
export async function doNext(
  store: Store,
  clock: Clock,
  handlers: Partial<Record<WorkKind, Handler>>,
): Promise<boolean> {
  const kinds = Object.keys(handlers) as WorkKind[];
  const item = await claimNext(store.handle, kinds, clock.now());
  const handler = item && handlers[item.kind];
  if (!item || !handler) return false;
  const stillAtIt = setInterval(() => {
    renewLease(store.handle, item, clock.now()).catch((error: unknown) => {
      log.error({ err: error, item: item.id }, 'a lease could not be renewed');
    });
  }, RENEW_EVERY_MS);
  try {
    if (item.attempt > MAX_ATTEMPTS) {
      throw new GiveUp('The server ended every time it tried this.');
    }
    await handler(item, store, clock);
    await finish(store.handle, item, clock.now());
  } catch (error) {
    await noteFailure(store, item, error, clock.now());
  } finally {
    clearInterval(stillAtIt);
  }
  return true;
}

async function noteFailure(store: Store, item: WorkItem, error: unknown, now: Date) {
  const message = error instanceof Error ? error.message : String(error);
  const state = await putBack(store.handle, item, message, now, error instanceof GiveUp);
  const facts = { err: error, kind: item.kind, subject: item.subjectId, attempt: item.attempt };
  if (state === 'failed') log.error(facts, 'work was given up');
  else log.warn(facts, 'work failed and is tried again later');
}
