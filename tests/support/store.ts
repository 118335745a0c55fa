import { randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { PGlite } from '@electric-sql/pglite';
import { drizzle as drizzlePg } from 'drizzle-orm/node-postgres';
import { drizzle as drizzlePglite } from 'drizzle-orm/pglite';
import pg from 'pg';
import type { Handle, Store } from '../../db/client';
import { migrateStore } from '../../db/migrate';

/**
 * A migrated store of the test file's own: in memory, or a fresh database on the PostgreSQL
 * server that TEST_DATABASE_URL names. It becomes the process's store, so that verbs run on it.
 */
export async function testStore(): Promise<Store> {
  const server = process.env.TEST_DATABASE_URL;
  const store = server ? await onServer(server) : await inMemory();
  await migrateStore(store);
  (globalThis as { strikeoffStore?: Promise<Store> }).strikeoffStore = Promise.resolve(store);
  return store;
}

async function inMemory(): Promise<Store> {
  const engine = await PGlite.create();
  return {
    kind: 'pglite',
    handle: drizzlePglite({ client: engine }) as unknown as Handle,
    engine,
    close: () => engine.close(),
  };
}

async function onServer(url: string): Promise<Store> {
  const database = `strikeoff_${randomUUID().replaceAll('-', '')}`;
  const admin = new pg.Client({ connectionString: url });
  await admin.connect();
  await admin.query(`create database ${database}`);
  const address = new URL(url);
  address.pathname = `/${database}`;
  const pool = new pg.Pool({ connectionString: address.href, max: 5 });
  // Dropping the database ends connections that are still saying goodbye.
  pool.on('error', () => undefined);
  pool.on('connect', (client) => client.on('error', () => undefined));
  return {
    kind: 'postgres',
    handle: drizzlePg({ client: pool }) as unknown as Handle,
    engine: null,
    async close() {
      await pool.end();
      await admin.query(`drop database ${database} with (force)`);
      await admin.end();
    },
  };
}

/** A folder that is gone after the test file. */
export function temporaryFolder(): { path: string; remove(): void } {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'strikeoff-'));
  return { path: folder, remove: () => rmSync(folder, { recursive: true, force: true }) };
}
