import fs from 'node:fs';
import path from 'node:path';
import { PGlite } from '@electric-sql/pglite';
import { drizzle as drizzlePg } from 'drizzle-orm/node-postgres';
import type { PgDatabase, PgQueryResultHKT } from 'drizzle-orm/pg-core';
import { drizzle as drizzlePglite } from 'drizzle-orm/pglite';
import pg from 'pg';
import type { Env } from '../lib/env';
import { readEnv } from '../lib/env';
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

const memo = globalThis as { strikeoffStore?: Promise<Store> };

/**
 * The process's one store, opened on first use and migrated. Module state would not do: the
 * framework evaluates a module once per route bundle.
 */
export function openStore(env: Env = readEnv()): Promise<Store> {
  if (process.env.NEXT_PHASE === 'phase-production-build') {
    throw new Error('The database must not be opened while the application is being built.');
  }
  memo.strikeoffStore ??= open(env).catch((error: unknown) => {
    delete memo.strikeoffStore;
    throw error;
  });
  return memo.strikeoffStore;
}

/** Closes the store if it is open; the next `openStore` opens it anew. */
export async function closeStore(): Promise<void> {
  const open = memo.strikeoffStore;
  delete memo.strikeoffStore;
  if (open) await (await open).close();
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
  const pool = new pg.Pool({ connectionString: url, max: 10 });
  return {
    kind: 'postgres',
    handle: drizzlePg({ client: pool }) as unknown as Handle,
    engine: null,
    close: () => pool.end(),
  };
}

async function openEmbedded(dataDir: string): Promise<Store> {
  const lock = lockDataFolder(dataDir);
  const folder = path.join(dataDir, 'database');
  fs.mkdirSync(folder, { recursive: true });
  const files = new DurableNodeFS(folder);
  let engine: PGlite | undefined;
  try {
    engine = await PGlite.create({
      fs: files,
      startParams: [
        ...PGlite.defaultStartParams.filter((parameter) => parameter !== '-F'),
        ...['-c', 'wal_sync_method=fsync'],
        ...['-c', 'max_wal_size=64MB', '-c', 'min_wal_size=32MB'],
      ],
    });
    await proveDurable(engine, files);
  } catch (error) {
    await engine?.close();
    lock.release();
    throw error;
  }
  const opened = engine;
  return {
    kind: 'pglite',
    handle: drizzlePglite({ client: opened }) as unknown as Handle,
    engine: opened,
    async close() {
      try {
        await opened.exec('CHECKPOINT');
        await opened.close();
      } finally {
        lock.release();
      }
    },
  };
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
