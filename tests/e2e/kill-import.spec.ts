import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import type { APIRequestContext } from '@playwright/test';
import { expect, test } from '@playwright/test';
import { requestsOf } from './support/sign-in';

const KILLS = 20;
const LINES = 120;
/** Every fourth kill comes with the answer; the others anywhere before, some at once. */
const waitsForAnswer = (round: number) => round % 4 === 0;
const delayOf = (round: number) => (round % 4 === 1 ? 0 : (round * 97) % 900);

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      const port = typeof address === 'object' && address ? address.port : 0;
      probe.close(() => resolve(port));
    });
  });
}

interface Running {
  readonly child: ChildProcess;
  readonly gone: Promise<void>;
}

async function start(port: number, dataDir: string): Promise<Running> {
  const next = path.join('node_modules', 'next', 'dist', 'bin', 'next');
  const child = spawn(process.execPath, [next, 'start', '-p', String(port), '-H', '127.0.0.1'], {
    detached: true,
    stdio: 'ignore',
    env: {
      ...process.env,
      DATA_DIR: dataDir,
      DATABASE_URL: '',
      DEMO: 'off',
      APP_ORIGIN: `http://localhost:${port}`,
      LOG_LEVEL: 'fatal',
      NODE_ENV: 'production',
    },
  });
  const gone = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  await expect
    .poll(
      () =>
        fetch(`http://localhost:${port}/api/health`).then(
          (answer) => answer.status,
          () => 0,
        ),
      { timeout: 180_000, intervals: [100] },
    )
    .toBe(200);
  return { child, gone };
}

async function kill9({ child, gone }: Running): Promise<void> {
  // The whole group: the server and whatever it started.
  process.kill(-(child.pid ?? 0), 'SIGKILL');
  await gone;
}

function bill(round: number): string {
  const rows = Array.from({ length: LINES }, (_, index) =>
    [`${round}${String(index).padStart(4, '0')}`, '05/04/2026', 'Concrete 3000', '1500.00'].join(),
  );
  return ['Ticket,Date,Description,Amount', ...rows].join('\n');
}

async function json(answer: Promise<import('@playwright/test').APIResponse>) {
  const got = await answer;
  if (!got.ok()) throw new Error(`${got.url()}: ${got.status()} ${await got.text()}`);
  return got.json();
}

async function linesOf(owner: APIRequestContext, number: string): Promise<number | null> {
  const { rows } = await json(owner.get(`/api/statements?search=${number}`));
  const found = rows.filter((row: { number: string }) => row.number === number);
  expect(found.length).toBeLessThanOrEqual(1);
  return found[0]?.lines ?? null;
}

test(`${KILLS} times killed during an import: what was confirmed is there, once, and nothing is there in part`, async () => {
  test.setTimeout(1_200_000);
  const dataDir = mkdtempSync(path.join(os.tmpdir(), 'strikeoff-kill-'));
  const port = await freePort();
  let server = await start(port, dataDir);
  const owner = await requestsOf(`http://localhost:${port}`);
  let [confirmed, absent] = [0, 0];
  try {
    await json(
      owner.post('/api/sign-up', {
        data: {
          companyName: 'Killed Often',
          timeZone: 'America/Chicago',
          name: 'Owner',
          email: 'owner@killed.example',
          password: 'gravel lantern nine',
        },
      }),
    );
    const supplier = await json(
      owner.post('/api/suppliers', {
        data: {
          name: 'Slate Creek',
          kind: 'readyMix',
          dispatchEmail: '',
          creditEmail: '',
          phone: '',
          accountNumber: '',
        },
      }),
    );
    for (let round = 1; round <= KILLS; round += 1) {
      const number = `M-${String(round).padStart(3, '0')}`;
      const { importId } = await json(
        owner.post(`/api/imports?supplierId=${supplier.id}`, {
          data: bill(round),
          headers: { 'content-type': 'text/csv', 'x-file-name': `${number}.csv` },
        }),
      );
      const seen = await json(owner.get(`/api/imports/${importId}`));
      const data = { ...seen.proposed, number, fileSha256: seen.preview.fileSha256 };
      const accept = () => owner.post(`/api/imports/${importId}/accept`, { data });
      const answered = accept().then(
        (answer) => answer.ok(),
        () => false,
      );
      if (waitsForAnswer(round)) await answered;
      else await new Promise((resolve) => setTimeout(resolve, delayOf(round)));
      await kill9(server);
      const wasConfirmed = await answered;
      server = await start(port, dataDir);
      const kept = await linesOf(owner, number);
      if (wasConfirmed) expect(kept, number).toBe(LINES);
      expect([null, LINES], number).toContain(kept);
      if (kept === null) absent += 1;
      else confirmed += 1;
      const again = await json(accept());
      expect(again.repeated).toBe(kept !== null);
      expect(await linesOf(owner, number), number).toBe(LINES);
    }
    const { rows, total } = await json(owner.get('/api/statements?limit=500'));
    expect(total).toBe(KILLS);
    expect(rows.every((row: { lines: number }) => row.lines === LINES)).toBe(true);
    // Kills that all fell on one side of the commit would prove nothing.
    expect(Math.min(confirmed, absent)).toBeGreaterThan(0);
  } finally {
    await owner.dispose();
    await kill9(server).catch(() => undefined);
    rmSync(dataDir, { recursive: true, force: true });
  }
});
