import { subscribe } from 'node:diagnostics_channel';
import type { IncomingMessage, Server } from 'node:http';
import type { Store } from '../../db/client';
import { closeStoreForGood, openStore } from '../../db/client';
import { DataFolderInUse } from '../../db/lock';
import { companies } from '../../db/schema/companies';
import { finishDemo, seedDemo } from '../../db/seed';
import { systemClock } from '../clock';
import type { Env } from '../env';
import { readEnv } from '../env';
import { forgetForwarded } from '../http/client-address';
import { log } from '../log';
import { HANDLERS } from '../work/handlers';
import { startMaintenance } from '../work/maintenance';
import { startWorker } from '../work/worker';

const DRAIN_MS = 10_000;

/**
 * Everything that a server does besides answering: opens and migrates the store, loads the demo
 * into an empty one, starts the worker and the maintenance, and sees to an orderly end.
 */
export async function startServing(): Promise<void> {
  const env = readEnv();
  const servers = watchRequests(env);
  const store = await openOrExit();
  if (env.demo && (await isEmpty(store))) {
    log.info('the database is empty: loading the demo company');
    await seedDemo(store, systemClock);
  }
  if (env.demo) await finishDemo(store, systemClock);
  const worker = startWorker({ store, clock: systemClock, handlers: HANDLERS });
  const maintenance = startMaintenance(store, env);
  const stop = async () => {
    await drain(servers);
    await worker.stop();
    await maintenance.stop();
    await closeStoreForGood();
  };
  endWith(stop, 'SIGTERM', 143);
  endWith(stop, 'SIGINT', 130);
}

/** A data folder that can't be had is a matter of a sentence, not of a stack. */
async function openOrExit(): Promise<Store> {
  try {
    return await openStore();
  } catch (error) {
    if (error instanceof DataFolderInUse) console.error(error.message);
    else log.fatal({ err: error }, 'the store could not be opened');
    process.exit(1);
  }
}

async function isEmpty({ handle }: Store): Promise<boolean> {
  const rows = await handle.select({ id: companies.id }).from(companies).limit(1);
  return rows.length === 0;
}

/**
 * Notes which servers answer requests, to stop them first at the end; and where no proxy is
 * declared, drops what clients claim about their own address before anyone reads it.
 */
function watchRequests(env: Env): Set<Server> {
  const servers = new Set<Server>();
  subscribe('http.server.request.start', (message) => {
    const { request, server } = message as { request: IncomingMessage; server: Server };
    servers.add(server);
    if (!env.trustProxy) forgetForwarded(request.headers);
  });
  return servers;
}

/** Takes no new request and waits for those under way, but not for ever. */
async function drain(servers: ReadonlySet<Server>): Promise<void> {
  const closed = [...servers].map(
    (server) => new Promise<void>((resolve) => server.close(() => resolve())),
  );
  const late = new Promise<void>((resolve) => {
    setTimeout(resolve, DRAIN_MS).unref();
  });
  await Promise.race([Promise.all(closed), late]);
}

/**
 * Ends the process after `stop`. The framework's own handlers would exit as soon as the last
 * answer is out, in the middle of the database's closing, so they are replaced.
 */
function endWith(stop: () => Promise<void>, signal: NodeJS.Signals, code: number): void {
  process.removeAllListeners(signal);
  process.on(signal, () => {
    once(stop)
      .catch((error: unknown) => log.error({ err: error }, 'the server did not end in order'))
      .finally(() => process.exit(code));
  });
}

let ending: Promise<void> | undefined;

/** A second signal, common with Ctrl-C, must not close everything twice. */
function once(stop: () => Promise<void>): Promise<void> {
  ending ??= stop();
  return ending;
}
