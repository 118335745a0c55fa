import fs from 'node:fs';
import path from 'node:path';
import { is, sql } from 'drizzle-orm';
import { getTableConfig, PgTable } from 'drizzle-orm/pg-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Store } from '../../db/client';
import { testStore } from '../support/store';

let store: Store;
beforeAll(async () => {
  store = await testStore();
});
afterAll(() => store.close());

/** Tables that are nobody's alone, each with its reason. */
const GLOBAL = new Set([
  // A company itself.
  'companies',
  // Found by the hash of a secret, before it is known whose they are.
  'sessions',
  'password_resets',
  // Counts against addresses and accounts that may not exist.
  'rate_limits',
]);

async function rowsOf<Row>(query: ReturnType<typeof sql>): Promise<Row[]> {
  return ((await store.handle.execute(query)) as unknown as { rows: Row[] }).rows;
}

async function declaredTables(): Promise<PgTable[]> {
  const folder = path.resolve(import.meta.dirname, '../../db/schema');
  const tables: PgTable[] = [];
  for (const file of fs.readdirSync(folder)) {
    const module: Record<string, unknown> = await import(path.join(folder, file));
    tables.push(...Object.values(module).filter((value) => is(value, PgTable)));
  }
  return tables;
}

interface Key {
  readonly table: string;
  readonly kind: 'f' | 'u' | 'p';
  readonly columns: string[];
  readonly target: string | null;
}

const keys = () =>
  rowsOf<Key>(sql`
    select c.conrelid::regclass::text as "table", c.contype::text as kind,
      array(select a.attname::text from unnest(c.conkey) with ordinality k(n, place)
        join pg_attribute a on a.attrelid = c.conrelid and a.attnum = k.n order by k.place) as columns,
      nullif(c.confrelid, 0)::regclass::text as target
    from pg_constraint c
    where c.connamespace = 'public'::regnamespace and c.contype in ('f', 'u', 'p')`);

test('the database has every declared table and every declared foreign key', async () => {
  const tables = (await declaredTables()).map(getTableConfig);
  const there = await rowsOf<{ name: string }>(sql`
    select table_name as name from information_schema.tables where table_schema = 'public'`);
  const names = new Set(there.map((row) => row.name));
  expect(tables.filter((table) => !names.has(table.name)).map((table) => table.name)).toEqual([]);
  const declared = tables.flatMap((table) => table.foreignKeys.map(() => table.name)).sort();
  const found = (await keys()).filter((key) => key.kind === 'f').map((key) => key.table);
  expect(found.sort()).toEqual(declared);
});

test('every table but the global ones belongs to companies', async () => {
  const there = await rowsOf<{ name: string; nullable: string | null }>(sql`
    select t.table_name as name, c.is_nullable as nullable from information_schema.tables t
    left join information_schema.columns c on c.table_schema = t.table_schema
      and c.table_name = t.table_name and c.column_name = 'company_id'
    where t.table_schema = 'public' and t.table_name <> 'start_up_self_test'`);
  const without = there.filter((row) => row.nullable === null).map((row) => row.name);
  expect(new Set(without)).toEqual(GLOBAL);
  expect(there.filter((row) => row.nullable === 'YES')).toEqual([]);
});

test('a row can’t point into another company: keys between companies’ tables carry the company', async () => {
  const all = await keys();
  const owned = new Set(
    (await declaredTables())
      .map((table) => getTableConfig(table).name)
      .filter((name) => !GLOBAL.has(name)),
  );
  const foreign = all.filter((key) => key.kind === 'f' && owned.has(key.table));
  const loose = foreign.filter(
    (key) => owned.has(key.target ?? '') && !key.columns.includes('company_id'),
  );
  expect(loose).toEqual([]);
  expect(foreign.length).toBeGreaterThan(40);
  const without = [...owned].filter(
    (table) =>
      !all.some(
        (key) => key.table === table && key.kind === 'u' && key.columns.join() === 'company_id,id',
      ),
  );
  expect(without).toEqual([]);
});
