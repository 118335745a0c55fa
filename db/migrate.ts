import { existsSync } from 'node:fs';
import path from 'node:path';
import { sql } from 'drizzle-orm';
import { migrate as migratePg } from 'drizzle-orm/node-postgres/migrator';
import { migrate as migratePglite } from 'drizzle-orm/pglite/migrator';
import type { Store } from './client';

const MIGRATION_LOCK = 70_2606;

/** Brings the store to the newest schema. On a server, one process at a time. */
export async function migrateStore(store: Store): Promise<void> {
  const migrationsFolder = path.join(process.cwd(), 'db', 'migrations');
  if (!existsSync(migrationsFolder)) {
    throw new Error(`${migrationsFolder} is missing: start Strikeoff in its own folder.`);
  }
  if (store.kind === 'pglite') {
    await migratePglite(store.handle as unknown as Parameters<typeof migratePglite>[0], {
      migrationsFolder,
    });
    return;
  }
  await store.handle.transaction(async (held) => {
    // Held by this transaction's connection until it ends; others wait here.
    await held.execute(sql`select pg_advisory_xact_lock(${MIGRATION_LOCK})`);
    await migratePg(store.handle as unknown as Parameters<typeof migratePg>[0], {
      migrationsFolder,
    });
  });
}
