import fs from 'node:fs';
import path from 'node:path';
import { NodeFS } from '@electric-sql/pglite/nodefs';
import { afterAll, afterEach, expect, test, vi } from 'vitest';
import { closeStore, openStore, startEngine } from '../../db/client';
import { DurableNodeFS } from '../../db/durable-fs';
import { activity } from '../../db/schema/activity';
import { jobs } from '../../db/schema/jobs';
import { readEnv } from '../../lib/env';
import { temporaryFolder } from '../support/store';
import { runChild } from './children/child';

const scratch = temporaryFolder();
afterAll(scratch.remove);
afterEach(() => vi.restoreAllMocks());

const ROUNDS = 10;

test(`a server killed ${ROUNDS} times in the middle of writing loses nothing it had confirmed`, async () => {
  const dataDir = path.join(scratch.path, 'killed');
  const confirmed = new Set<string>();
  for (let round = 0; round < ROUNDS; round += 1) {
    const child = runChild('tests/ops/children/write-jobs.ts', [], { DATA_DIR: dataDir });
    const start = await child.line((line) => line.startsWith('start '));
    const there = new Set(start.slice('start '.length).split(','));
    expect([...confirmed].filter((number) => !there.has(number))).toEqual([]);
    // Killed at another moment of a write each time: after some rows and some milliseconds.
    await child.line((line) => line.endsWith(`-${3 + round}`));
    await new Promise((resolve) => setTimeout(resolve, (round * 7) % 23));
    child.process.kill('SIGKILL');
    await child.ended;
    for (const line of child.lines) {
      if (line.startsWith('stored ')) confirmed.add(line.slice('stored '.length));
    }
  }
  const store = await openStore({ ...readEnv(), dataDir, databaseUrl: null });
  const stored = await store.handle.select({ number: jobs.number }).from(jobs);
  const recorded = await store.handle.select({ id: activity.id }).from(activity);
  await closeStore();
  const numbers = new Set(stored.map((row) => row.number));
  expect([...confirmed].filter((number) => !numbers.has(number))).toEqual([]);
  // At most the write under way at each kill is there without having been confirmed.
  expect(stored.length - confirmed.size).toBeLessThanOrEqual(ROUNDS);
  // A job and its activity record are one transaction: never one without the other.
  expect(recorded).toHaveLength(stored.length);
  expect(confirmed.size).toBeGreaterThanOrEqual(ROUNDS * 4);
}, 600_000);

test('every commit is flushed to the disk', async () => {
  const engine = await startEngine(path.join(scratch.path, 'flushed'));
  await engine.exec('CREATE TABLE t (n int)');
  const flush = vi.spyOn(fs, 'fsyncSync');
  for (let n = 0; n < 20; n += 1) await engine.query('INSERT INTO t VALUES ($1)', [n]);
  expect(flush.mock.calls.length).toBeGreaterThanOrEqual(20);
  await engine.close();
});

test('the start is refused where commits are not flushed', async () => {
  vi.spyOn(DurableNodeFS.prototype, 'init').mockImplementation(function (
    this: DurableNodeFS,
    ...args
  ) {
    return NodeFS.prototype.init.apply(this, args);
  });
  await expect(startEngine(path.join(scratch.path, 'unflushed'))).rejects.toThrow(
    /did not flush a commit to disk/,
  );
});

test('a database of another major version is refused with a sentence', async () => {
  const folder = path.join(scratch.path, 'older');
  fs.mkdirSync(folder);
  fs.writeFileSync(path.join(folder, 'PG_VERSION'), '17\n');
  await expect(startEngine(folder)).rejects.toThrow(/is of version 17/);
});
