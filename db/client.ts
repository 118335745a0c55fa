import fs from 'node:fs';
import path from 'node:path';
import { PGlite } from '@electric-sql/pglite';
import { drizzle as drizzlePg } from 'drizzle-orm/node-postgres';
import type { PgDatabase, PgQueryResultHKT } from 'drizzle-orm/pg-core';
import { drizzle as drizzlePglite } from 'drizzle-orm/pglite';
import pg from 'pg';
import type { Env } from '../lib/env';
import { readEnv } from '../lib/env';
import { log } from '../lib/log';
import { DurableNodeFS } from './durable-fs';
import { lockDataFolder } from './lock';
import { migrateStore } from './migrate';

/**
 * A connection or an open transaction. It is typed without a schema on purpose: the relational
 * query interface rounds nested amounts, so joins are written out.
 */
export type Handle = PgDatabase<PgQueryResultHKT, Record<string, never>>;

export interface Store {
  readonly kind: 'pglite' | 'postgres';
  readonly handle: Handle;
  /** The embedded engine, for backup and maintenance; null on a PostgreSQL server. */
  readonly engine: PGlite | null;
  close(): Promise<void>;
}

/** Data folders of another major version need a dump and a restore, which the engine won't say. */
const ENGINE_MAJOR = '18';

const memo = globalThis as {
  strikeoffStore?: Promise<Store>;
  strikeoffClosing?: Promise<void>;
  strikeoffIsStopping?: boolean;
};

/**
 * The process's one store, opened on first use and migrated. Module state would not do: the
 * framework evaluates a module once per route bundle.
 */
export function openStore(env: Env = readEnv()): Promise<Store> {
  if (process.env.NEXT_PHASE === 'phase-production-build') {
    throw new Error('The database must not be opened while the application is being built.');
  }
  if (memo.strikeoffIsStopping) return Promise.reject(new Error('The server is stopping.'));
  memo.strikeoffStore ??= (memo.strikeoffClosing ?? Promise.resolve())
    .then(() => open(env))
    .catch((error: unknown) => {
      delete memo.strikeoffStore;
      throw error;
    });
  return memo.strikeoffStore;
}

/** Closes the store if it is open; the next `openStore` opens it anew. */
export async function closeStore(): Promise<void> {
  const open = memo.strikeoffStore;
  if (!open) return memo.strikeoffClosing;
  delete memo.strikeoffStore;
  memo.strikeoffClosing = open
    .then((store) => store.close())
    .finally(() => {
      delete memo.strikeoffClosing;
    });
  await memo.strikeoffClosing;
}

/** Closes the store and keeps it closed: a request that comes late must not open it again. */
export async function closeStoreForGood(): Promise<void> {
  memo.strikeoffIsStopping = true;
  await closeStore();
}

async function open(env: Env): Promise<Store> {
  const store = env.databaseUrl ? openPostgres(env.databaseUrl) : await openEmbedded(env.dataDir);
  try {
    await migrateStore(store);
  } catch (error) {
    await store.close();
    throw error;
  }
  return store;
}

function openPostgres(url: string): Store {
  const pool = new pg.Pool({
    connectionString: url,
    max: 10,
    connectionTimeoutMillis: 10_000,
  });
  // A connection that breaks while nobody uses it would otherwise end the process.
  pool.on('error', (error) => log.warn({ err: error }, 'an idle database connection broke'));
  return {
    kind: 'postgres',
    handle: drizzlePg({ client: pool }) as unknown as Handle,
    engine: null,
    close: () => pool.end(),
  };
}

async function openEmbedded(dataDir: string): Promise<Store> {
  const lock = lockDataFolder(dataDir);
  let engine: PGlite;
  try {
    engine = await startEngine(path.join(dataDir, 'database'));
  } catch (error) {
    lock.release();
    throw error;
  }
  return {
    kind: 'pglite',
    handle: drizzlePglite({ client: engine }) as unknown as Handle,
    engine,
    async close() {
      try {
        await engine.exec('CHECKPOINT');
        await engine.close();
      } finally {
        lock.release();
      }
    },
  };
}

/**
 * Starts the embedded database on a folder, new or not, or on a dump of one. The caller holds
 * the data folder's lock.
 */
export async function startEngine(folder: string, dump?: Blob): Promise<PGlite> {
  refuseOtherMajor(folder);
  fs.mkdirSync(folder, { recursive: true });
  const files = new DurableNodeFS(folder);
  const engine = await PGlite.create({
    fs: files,
    ...(dump ? { loadDataDir: dump } : {}),
    startParams: [
      ...PGlite.defaultStartParams.filter((parameter) => parameter !== '-F'),
      ...['-c', 'wal_sync_method=fsync'],
      ...['-c', 'max_wal_size=64MB', '-c', 'min_wal_size=32MB'],
    ],
  });
  try {
    await proveDurable(engine, files);
  } catch (error) {
    await engine.close();
    throw error;
  }
  return engine;
}

function refuseOtherMajor(folder: string): void {
  const file = path.join(folder, 'PG_VERSION');
  const major = fs.existsSync(file) ? fs.readFileSync(file, 'utf8').trim() : ENGINE_MAJOR;
  if (major === ENGINE_MAJOR) return;
  throw new Error(
    `The database in ${folder} is of version ${major} and this program reads version ` +
      `${ENGINE_MAJOR}. Start the program that wrote it, or restore a backup made by this one.`,
  );
}

/** Refuses to start where a commit does not reach the disk: the hook leans on internals. */
async function proveDurable(engine: PGlite, files: DurableNodeFS): Promise<void> {
  const before = files.syncCount;
  await engine.exec(
    'CREATE TABLE IF NOT EXISTS start_up_self_test (at timestamptz NOT NULL);' +
      'INSERT INTO start_up_self_test VALUES (now());' +
      'DELETE FROM start_up_self_test;',
  );
  if (files.syncCount === before) {
    throw new Error(
      'The embedded database did not flush a commit to disk, so a power cut could lose data. ' +
        'Use the versions in package-lock.json, or a PostgreSQL server with DATABASE_URL.',
    );
  }
}
