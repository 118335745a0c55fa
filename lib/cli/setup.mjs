// Plain Node without packages: it runs before anything is installed.
import { spawn, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import path from 'node:path';

export const ROOT = path.resolve(import.meta.dirname, '../..');

/** Says what is wrong in a sentence and ends the process. */
export function stop(sentence) {
  console.error(sentence);
  process.exit(1);
}

export function requireNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 9)) {
    stop(`Strikeoff needs Node.js 20.9 or newer; this is ${process.versions.node}.`);
  }
}

function run(command, args, options = {}) {
  const done = spawnSync(command, args, { cwd: ROOT, stdio: 'inherit', ...options });
  return done.status ?? 1;
}

/** Installs the packages of package-lock.json where they are missing or another lock's. */
export function ensureDependencies() {
  const lock = readFileSync(path.join(ROOT, 'package-lock.json'));
  const wanted = createHash('sha256').update(lock).digest('hex');
  const stamp = path.join(ROOT, 'node_modules', '.strikeoff-lock');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  console.log('Installing packages…');
  if (run('npm', ['ci', '--no-audit', '--no-fund']) !== 0) {
    stop('The packages could not be installed. Check the connection to the npm registry.');
  }
  writeFileSync(stamp, wanted);
}

const SOURCES = ['app', 'components', 'db', 'importers', 'lib', 'public'];
const CONFIGS = [
  'instrumentation.ts',
  'next.config.mjs',
  'package-lock.json',
  'postcss.config.mjs',
  'proxy.ts',
  'tailwind.config.ts',
  'tsconfig.json',
];

function sourceHash() {
  const hash = createHash('sha256');
  const add = (file) => {
    hash.update(path.relative(ROOT, file));
    hash.update(readFileSync(file));
  };
  const walk = (folder) => {
    if (!existsSync(folder)) return;
    const entries = readdirSync(folder, { withFileTypes: true });
    for (const entry of entries.sort((a, b) => a.name.localeCompare(b.name))) {
      const at = path.join(folder, entry.name);
      if (entry.isDirectory()) walk(at);
      else if (!entry.name.includes('.test.')) add(at);
    }
  };
  for (const folder of SOURCES) walk(path.join(ROOT, folder));
  for (const file of CONFIGS) if (existsSync(path.join(ROOT, file))) add(path.join(ROOT, file));
  return hash.digest('hex');
}

/** Builds the application where the sources changed since the last build. */
export function ensureBuild() {
  const wanted = sourceHash();
  const stamp = path.join(ROOT, '.next', 'strikeoff-build');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  console.log('Building the application…');
  const status = run(process.execPath, ['node_modules/next/dist/bin/next', 'build'], {
    env: { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' },
  });
  if (status !== 0) stop('The application could not be built; the reason is above.');
  mkdirSync(path.dirname(stamp), { recursive: true });
  writeFileSync(stamp, wanted);
}

/** A port of the loopback address that is free now. */
export function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address();
      probe.close(() => resolve(port));
    });
  });
}

/** Starts the built application; the caller ends the returned process. */
export function startServer({ port, host = '127.0.0.1', env = {}, stdio = 'inherit' }) {
  return spawn(
    process.execPath,
    ['node_modules/next/dist/bin/next', 'start', '-H', host, '-p', String(port)],
    {
      cwd: ROOT,
      stdio,
      env: { ...process.env, NODE_ENV: 'production', PORT: String(port), ...env },
    },
  );
}

/** Waits until the application answers on its health page; false when it never does. */
export async function waitUntilUp(port, { seconds = 120, isDead = () => false } = {}) {
  const end = Date.now() + seconds * 1000;
  while (Date.now() < end && !isDead()) {
    try {
      const answer = await fetch(`http://127.0.0.1:${port}/api/health`);
      if (answer.ok) return true;
    } catch {
      // Not listening yet.
    }
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  return false;
}
