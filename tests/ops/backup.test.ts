import fs from 'node:fs';
import path from 'node:path';
import { afterAll, afterEach, beforeAll, beforeEach, expect, test } from 'vitest';
import { backupsIn, makeBackup, removeOldBackups } from '../../db/backups';
import type { Store } from '../../db/client';
import { closeStore, openStore } from '../../db/client';
import { restoreBackup } from '../../db/restoring';
import { jobs } from '../../db/schema/jobs';
import type { Actor } from '../../lib/auth/actor';
import { readEnv } from '../../lib/env';
import { createJob } from '../../lib/services/jobs/create-job';
import { callVerb } from '../../lib/services/verb';
import { blobStoreIn } from '../../lib/storage/blob-store';
import { backUpWhenDue } from '../../lib/work/maintenance';
import { testCompany } from '../support/company';
import { temporaryFolder } from '../support/store';
import { runChild } from './children/child';

const scratch = temporaryFolder();
const empty = path.join(scratch.path, 'empty');
// A new database takes seconds to make, so the tests copy one.
beforeAll(async () => {
  await openStore({ ...readEnv(), dataDir: empty, databaseUrl: null });
  await closeStore();
});
afterAll(scratch.remove);

let dataDir: string;
let store: Store;
let owner: Actor;
let photo: string;
let made = 0;
const NOW = new Date('2026-06-14T12:00:00Z');
const env = () => ({ ...readEnv(), dataDir, databaseUrl: null });
const blobs = () => blobStoreIn(path.join(dataDir, 'blobs'));

beforeEach(async () => {
  made += 1;
  dataDir = path.join(scratch.path, `data-${made}`);
  fs.cpSync(empty, dataDir, { recursive: true });
  store = await openStore(env());
  owner = (await testCompany(store)).owner;
  await addJob('before');
  photo = await blobs().put(new TextEncoder().encode('a photo'));
});
afterEach(closeStore);

async function addJob(number: string) {
  const result = await callVerb(createJob, owner, { number, name: number });
  expect(result.ok).toBe(true);
}

const numbers = async (of: Store) =>
  (await of.handle.select({ number: jobs.number }).from(jobs)).map((row) => row.number);

const restore = (from: string, force: boolean, to = dataDir) =>
  restoreBackup({ from, dataDir: to, force, now: NOW });

test('a backup restored into an empty folder has the rows and the files of its moment', async () => {
  const from = await makeBackup(store, { dataDir, now: NOW, to: path.join(scratch.path, 'one') });
  await addJob('after');
  await closeStore();
  dataDir = path.join(scratch.path, 'elsewhere');
  expect(await restore(from, false)).toEqual({ movedAside: null });
  expect(await numbers(await openStore(env()))).toEqual(['before']);
  expect(new TextDecoder().decode((await blobs().get(photo)) ?? undefined)).toBe('a photo');
});

test('data that is there is not overwritten, and is moved aside when forced', async () => {
  const from = await makeBackup(store, { dataDir, now: NOW });
  await addJob('after');
  await closeStore();
  await expect(restore(from, false)).rejects.toThrow(/holds data already.*--force/);
  expect(await numbers(await openStore(env()))).toEqual(['before', 'after']);
  await closeStore();
  const { movedAside } = await restore(from, true);
  expect(await numbers(await openStore(env()))).toEqual(['before']);
  await closeStore();
  // What was moved aside is whole: it opens as a data folder of its own.
  dataDir = movedAside ?? '';
  expect(await numbers(await openStore(env()))).toEqual(['before', 'after']);
});

test('nothing is restored over a running server', async () => {
  const from = await makeBackup(store, { dataDir, now: NOW });
  await expect(restore(from, true)).rejects.toThrow(/in use by process/);
  expect(await numbers(store)).toEqual(['before']);
});

test.each([
  [
    'its database is cut short',
    (f: string) => fs.truncateSync(path.join(f, 'database.tar.gz'), 99),
  ],
  ['its manifest is cut short', (f: string) => fs.truncateSync(path.join(f, 'manifest.json'), 20)],
  [
    'one of its files is changed',
    (f: string) => fs.writeFileSync(path.join(f, 'blobs', photo.slice(0, 2), photo), 'other bytes'),
  ],
  [
    'one of its files is missing',
    (f: string) => fs.rmSync(path.join(f, 'blobs', photo.slice(0, 2), photo)),
  ],
])('a backup is refused when %s, and the data stays', async (_what, damage) => {
  const from = path.join(scratch.path, `damaged-${made}`);
  await makeBackup(store, { dataDir, now: NOW, to: from });
  damage(from);
  await closeStore();
  await expect(restore(from, true)).rejects.toThrow(/is damaged/);
  expect(await numbers(await openStore(env()))).toEqual(['before']);
  expect(fs.readdirSync(dataDir).filter((name) => name.includes('restor'))).toEqual([]);
});

test('a folder that is no backup is refused', async () => {
  await closeStore();
  await expect(restore(scratch.path, true)).rejects.toThrow(/is no backup/);
});

test('a backup never replaces another and leaves nothing half made', async () => {
  const to = path.join(scratch.path, 'twice');
  await makeBackup(store, { dataDir, now: NOW, to });
  await expect(makeBackup(store, { dataDir, now: NOW, to })).rejects.toThrow(/exists already/);
  expect(fs.readdirSync(scratch.path).filter((name) => name.endsWith('.part'))).toEqual([]);
});

test('a backup is made when the last is old enough, and the oldest go', async () => {
  const hour = 60 * 60_000;
  const at = async (hours: number) => {
    const due = { ...env(), backupHours: 24, backupKeep: 2 };
    await backUpWhenDue(store, due, new Date(NOW.getTime() + hours * hour));
    return backupsIn(dataDir).map((one) => (one.madeAt.getTime() - NOW.getTime()) / hour);
  };
  fs.mkdirSync(path.join(dataDir, 'backups', 'interrupted.part'), { recursive: true });
  expect(await at(0)).toEqual([0]);
  expect(await at(23)).toEqual([0]);
  expect(await at(24)).toEqual([0, 24]);
  expect(await at(50)).toEqual([24, 50]);
  expect(fs.readdirSync(path.join(dataDir, 'backups'))).toHaveLength(2);
  removeOldBackups(dataDir, 1);
  expect(backupsIn(dataDir)).toHaveLength(1);
});

test('the commands say what they did, and refuse in a sentence', async () => {
  const run = async (file: string, args: string[], more: Record<string, string> = {}) => {
    const child = runChild(file, args, { DATA_DIR: dataDir, DATABASE_URL: '', ...more });
    const { code, stderr } = await child.ended;
    return { code, said: `${child.lines.join('\n')}${stderr}` };
  };
  const to = path.join(scratch.path, 'by-command');
  const busy = await run('db/backup.ts', ['--to', to]);
  expect(busy).toMatchObject({ code: 1, said: expect.stringContaining('BACKUP_HOURS') });
  await closeStore();
  const done = await run('db/backup.ts', ['--to', to]);
  expect(done).toEqual({ code: 0, said: `Backup made: ${to}` });
  const full = await run('db/restore.ts', [to]);
  expect(full).toMatchObject({ code: 1, said: expect.stringContaining('--force') });
  const forced = await run('db/restore.ts', [to, '--force']);
  expect(forced).toMatchObject({ code: 0, said: expect.stringContaining('before-restore-') });
  const server = await run('db/backup.ts', [], { DATABASE_URL: 'postgres://nowhere/x' });
  expect(server).toMatchObject({ code: 1, said: expect.stringContaining('pg_dump') });
  expect(await numbers(await openStore(env()))).toEqual(['before']);
}, 240_000);
