// `npm test`: installs what is missing, runs every test, ends with one line of counts.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import {
  ensureBuild,
  ensureDependencies,
  freePort,
  ROOT,
  requireNode,
  startServer,
  stop,
  waitUntilUp,
} from './setup.mjs';
import { startPostgres } from './test-postgres.mjs';

const CHROMIUM = '/usr/bin/chromium';
/** The demo's 1 December 2026, nine in the morning in its time zone. */
const NOW = '2026-12-01T15:00:00Z';

const counts = { passed: 0, failed: 0, skipped: 0 };
const scratch = mkdtempSync(path.join(os.tmpdir(), 'strikeoff-test-'));

function ensureChromium() {
  if (existsSync(CHROMIUM)) return;
  if (process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    console.log('Installing Chromium from Debian’s packages…');
    spawnSync('apt-get', ['update', '-q'], { stdio: 'inherit' });
    spawnSync('apt-get', ['install', '-y', '-q', 'chromium'], { stdio: 'inherit' });
  }
  if (!existsSync(CHROMIUM)) {
    stop(
      `The browser tests need Chromium at ${CHROMIUM}, and it may not be installed from here. ` +
        'Install it (Debian: apt-get install chromium, as root) and run npm test again.',
    );
  }
}

const reportFile = (label) => path.join(scratch, `${label.replace(/\W+/g, '-')}.json`);

/** Runs vitest on `filters`; a run without a report counts as one failure. */
function vitest(label, filters, env = {}) {
  console.log(`\n── ${label}`);
  const report = reportFile(label);
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile=${report}`];
  const done = spawnSync(
    process.execPath,
    ['node_modules/vitest/vitest.mjs', 'run', ...reporters, ...filters],
    { cwd: ROOT, stdio: 'inherit', env: { ...process.env, ...env } },
  );
  try {
    const result = JSON.parse(readFileSync(report, 'utf8'));
    counts.passed += result.numPassedTests;
    counts.failed += result.numFailedTests;
    counts.skipped += result.numPendingTests + result.numTodoTests;
    // A file that could not even be loaded fails without a test of its own.
    if (done.status !== 0 && result.numFailedTests === 0) counts.failed += 1;
  } catch {
    counts.failed += 1;
  }
}

/** Runs the browser tests against a server and a data folder of their own. */
async function playwright(label, args, serverEnv) {
  console.log(`\n── ${label}`);
  const port = await freePort();
  const dataDir = mkdtempSync(path.join(scratch, 'data-'));
  const origin = `http://localhost:${port}`;
  const server = startServer({
    port,
    stdio: ['ignore', 'ignore', 'inherit'],
    env: {
      DATA_DIR: dataDir,
      APP_ORIGIN: origin,
      STRIKEOFF_NOW: NOW,
      LOG_LEVEL: 'warn',
      ...serverEnv,
    },
  });
  let ended = false;
  server.once('exit', () => {
    ended = true;
  });
  try {
    if (!(await waitUntilUp(port, { isDead: () => ended }))) {
      console.error('The server did not come up.');
      counts.failed += 1;
      return;
    }
    const report = reportFile(label);
    spawnSync(process.execPath, ['node_modules/@playwright/test/cli.js', 'test', ...args], {
      cwd: ROOT,
      stdio: 'inherit',
      env: {
        ...process.env,
        BASE_URL: origin,
        STRIKEOFF_NOW: NOW,
        PLAYWRIGHT_JSON_OUTPUT_FILE: report,
      },
    });
    addPlaywright(report);
  } finally {
    await end(server, () => ended);
  }
}

function addPlaywright(report) {
  try {
    const { stats } = JSON.parse(readFileSync(report, 'utf8'));
    counts.passed += stats.expected;
    counts.failed += stats.unexpected + stats.flaky;
    counts.skipped += stats.skipped;
    if (stats.expected + stats.unexpected + stats.flaky === 0) counts.failed += 1;
  } catch {
    counts.failed += 1;
  }
}

async function end(server, hasEnded) {
  if (hasEnded()) return;
  server.kill('SIGTERM');
  const late = setTimeout(() => server.kill('SIGKILL'), 10_000);
  await new Promise((resolve) => server.once('exit', resolve));
  clearTimeout(late);
}

requireNode();
ensureDependencies();
ensureChromium();
const postgres = await startPostgres(scratch);
try {
  ensureBuild();
  vitest('Unit, property and database tests', []);
  if (postgres) {
    vitest('Database tests on a PostgreSQL server', ['tests/unit-db'], {
      TEST_DATABASE_URL: postgres.url,
    });
  } else {
    console.log('\nNo PostgreSQL server is installed: its run of the database tests is left out.');
  }
  await playwright('Browser tests', [], {});
  if (postgres) {
    await playwright('The main journey on a PostgreSQL server', ['--grep', '@journey'], {
      DATABASE_URL: await postgres.newDatabase('journey'),
    });
  }
} finally {
  await postgres?.stop();
  rmSync(scratch, { recursive: true, force: true });
}

const skipped = counts.skipped > 0 ? `, ${counts.skipped} skipped` : '';
console.log(`\n${counts.passed} passed, ${counts.failed} failed${skipped}`);
process.exitCode = counts.failed === 0 && counts.passed > 0 ? 0 : 1;
