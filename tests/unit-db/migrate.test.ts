import { randomUUID } from 'node:crypto';
import { sql } from 'drizzle-orm';
import { drizzle } from 'drizzle-orm/node-postgres';
import pg from 'pg';
import { afterAll, expect, test } from 'vitest';
import type { Handle, Store } from '../../db/client';
import { migrateStore } from '../../db/migrate';
import { testStore } from '../support/store';

const server = process.env.TEST_DATABASE_URL;
const ends: (() => Promise<void>)[] = [];
afterAll(async () => {
  for (const end of ends.reverse()) await end();
});

test('migrating what is migrated changes nothing', async () => {
  const store = await testStore();
  ends.push(() => store.close());
  const applied = async () =>
    store.handle.execute(sql`select count(*)::int as n from drizzle.__drizzle_migrations`);
  const before = JSON.stringify((await applied()) as unknown as { rows: unknown[] });
  await migrateStore(store);
  expect(JSON.stringify(await applied())).toBe(before);
});

test.runIf(server)(
  'three servers that start at once on a new database migrate it once',
  async () => {
    const admin = new pg.Client({ connectionString: server });
    await admin.connect();
    const name = `strikeoff_${randomUUID().replaceAll('-', '')}`;
    await admin.query(`create database ${name}`);
    const address = new URL(server ?? '');
    address.pathname = `/${name}`;
    const stores = Array.from({ length: 3 }, (): Store => {
      const pool = new pg.Pool({ connectionString: address.href, max: 3 });
      // Dropping the database ends connections that are still saying goodbye.
      pool.on('error', () => undefined);
      pool.on('connect', (client) => client.on('error', () => undefined));
      const handle = drizzle({ client: pool }) as unknown as Handle;
      return { kind: 'postgres', handle, engine: null, close: () => pool.end() };
    });
    ends.push(() => admin.end());
    ends.push(async () => {
      await Promise.all(stores.map((store) => store.close()));
      await admin.query(`drop database ${name} with (force)`);
    });
    await Promise.all(stores.map(migrateStore));
    const check = new pg.Client({ connectionString: address.href });
    await check.connect();
    const found = await check.query(
      'select hash, count(*)::int as n from drizzle.__drizzle_migrations group by hash',
    );
    await check.end();
    expect(found.rows.length).toBeGreaterThan(1);
    expect(found.rows.every((row: { n: number }) => row.n === 1)).toBe(true);
  },
);
