import fs from 'node:fs';
import path from 'node:path';
import { afterEach, expect, test } from 'vitest';
import { closeStore, openStore } from '../../db/client';
import { DataFolderInUse, lockDataFolder } from '../../db/lock';
import { readEnv } from '../../lib/env';
import { temporaryFolder } from '../support/store';
import { type Child, runChild } from './children/child';

const TAKE = 'tests/ops/children/take-lock.ts';
const folders: { remove(): void }[] = [];
const children: Child[] = [];

function folder(): string {
  const made = temporaryFolder();
  folders.push(made);
  return made.path;
}

function contender(dataDir: string, at = 0): Child {
  const child = runChild(TAKE, [dataDir, String(at)]);
  children.push(child);
  return child;
}

afterEach(async () => {
  for (const child of children) child.process.kill('SIGKILL');
  await Promise.all(children.map((child) => child.ended));
  children.length = 0;
  for (const made of folders.splice(0)) made.remove();
});

test('a second taking in the same process is refused, and works after the first is released', () => {
  const dataDir = folder();
  const lock = lockDataFolder(dataDir);
  expect(() => lockDataFolder(dataDir)).toThrow(DataFolderInUse);
  lock.release();
  lockDataFolder(dataDir).release();
  expect(fs.readdirSync(dataDir)).toEqual([]);
});

test('another process is refused with a sentence that names the owner and the ways out', async () => {
  const dataDir = folder();
  const lock = lockDataFolder(dataDir);
  const said = await contender(dataDir).line(() => true);
  expect(said).toContain('DataFolderInUse');
  expect(said).toContain(`in use by process ${process.pid}`);
  expect(said).toContain('DATA_DIR');
  expect(said).toContain('DATABASE_URL');
  lock.release();
});

test('the lock of a killed process is taken over', async () => {
  const dataDir = folder();
  const owner = contender(dataDir);
  await owner.line((line) => line === 'got it');
  expect(() => lockDataFolder(dataDir)).toThrow(DataFolderInUse);
  owner.process.kill('SIGKILL');
  await owner.ended;
  lockDataFolder(dataDir).release();
  expect(fs.readdirSync(dataDir)).toEqual([]);
});

test('of six processes that find a dead lock at the same moment exactly one gets it', async () => {
  for (let round = 0; round < 3; round += 1) {
    const dataDir = folder();
    const dead = contender(dataDir);
    await dead.line((line) => line === 'got it');
    dead.process.kill('SIGKILL');
    await dead.ended;
    const at = Date.now() + 2500;
    const contenders = Array.from({ length: 6 }, () => contender(dataDir, at));
    const said = await Promise.all(contenders.map((child) => child.line(() => true)));
    expect(said.filter((line) => line === 'got it')).toHaveLength(1);
    expect(said.filter((line) => line.startsWith('DataFolderInUse'))).toHaveLength(5);
    for (const child of contenders) child.process.kill('SIGKILL');
  }
}, 240_000);

const writeLock = (dataDir: string, change: Record<string, unknown>) => {
  const lock = lockDataFolder(dataDir);
  const file = path.join(dataDir, 'database.lock');
  const owner = JSON.parse(fs.readFileSync(file, 'utf8')) as Record<string, unknown>;
  lock.release();
  fs.writeFileSync(file, JSON.stringify({ ...owner, nonce: 'another', ...change }));
};

test.each([
  ['a process from before a restart of the machine', { bootId: 'an earlier boot' }],
  ['a pid that another program has now', { startTicks: '1' }],
  ['a pid that nobody has', { pid: 2 ** 22 + 1 }],
])('a lock of %s is taken over', (_name, change) => {
  const dataDir = folder();
  writeLock(dataDir, change);
  lockDataFolder(dataDir).release();
});

test('a lock file that a power cut emptied is taken over', () => {
  const dataDir = folder();
  fs.writeFileSync(path.join(dataDir, 'database.lock'), '');
  lockDataFolder(dataDir).release();
  expect(fs.readdirSync(dataDir)).toEqual([]);
});

test('a lock from another container is never taken over: its process can’t be seen', () => {
  const dataDir = folder();
  writeLock(dataDir, { pidSpace: 'pid:[1]' });
  expect(() => lockDataFolder(dataDir)).toThrow(/another container/);
});

test('a process that died while taking over does not block the next', () => {
  const dataDir = folder();
  writeLock(dataDir, { pid: 2 ** 22 + 1, nonce: 'deaddead-1' });
  const takeover = path.join(dataDir, 'database.lock.deaddead');
  fs.copyFileSync(path.join(dataDir, 'database.lock'), takeover);
  const halfway = JSON.parse(fs.readFileSync(takeover, 'utf8')) as Record<string, unknown>;
  fs.writeFileSync(takeover, JSON.stringify({ ...halfway, nonce: 'deadbeef-2' }));
  lockDataFolder(dataDir).release();
  expect(fs.existsSync(path.join(dataDir, 'database.lock'))).toBe(false);
});

test('the store is not opened while the application is being built', async () => {
  const dataDir = folder();
  process.env.NEXT_PHASE = 'phase-production-build';
  try {
    expect(() => openStore({ ...readEnv(), dataDir })).toThrow(
      /while the application is being built/,
    );
  } finally {
    delete process.env.NEXT_PHASE;
  }
  expect(fs.readdirSync(dataDir)).toEqual([]);
});

test('a second store on the folder is refused while the first is open, and possible afterwards', async () => {
  const dataDir = folder();
  const env = { ...readEnv(), dataDir, databaseUrl: null };
  const first = await openStore(env);
  expect(await openStore(env)).toBe(first);
  expect(await contender(dataDir).line(() => true)).toContain('DataFolderInUse');
  await closeStore();
  const again = await openStore(env);
  expect(again).not.toBe(first);
  await closeStore();
});

test('closing and opening at the same moment is done one after the other', async () => {
  const dataDir = folder();
  const env = { ...readEnv(), dataDir, databaseUrl: null };
  await openStore(env);
  const closing = closeStore();
  const reopened = openStore(env);
  await closing;
  expect((await reopened).kind).toBe('pglite');
  await closeStore();
});
