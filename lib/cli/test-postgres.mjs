// A throw-away PostgreSQL server for the tests, where one is installed.
import { spawnSync } from 'node:child_process';
import { chmodSync, chownSync, existsSync, mkdirSync, mkdtempSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { freePort } from './setup.mjs';

const INSTALLS = '/usr/lib/postgresql';

function newestBin() {
  if (!existsSync(INSTALLS)) return null;
  const versions = readdirSync(INSTALLS).sort((a, b) => Number(b) - Number(a));
  const bins = versions.map((version) => path.join(INSTALLS, version, 'bin'));
  return bins.find((folder) => existsSync(path.join(folder, 'initdb'))) ?? null;
}

const isRoot = process.getuid?.() === 0;

/** The server refuses to run as root: there, Debian's postgres account runs it. */
function asServerUser(command, args, stdio = 'pipe') {
  const [file, rest] = isRoot ? ['runuser', ['-u', 'postgres', '--', command]] : [command, []];
  return spawnSync(file, [...rest, ...args], { encoding: 'utf8', stdio });
}

function serverOwner() {
  const id = (flag) => Number(spawnSync('id', [flag, 'postgres'], { encoding: 'utf8' }).stdout);
  return { uid: id('-u'), gid: id('-g') };
}

function makeHome(scratch) {
  const home = mkdtempSync(path.join(scratch, 'postgres-'));
  const data = path.join(home, 'data');
  mkdirSync(data);
  for (const folder of [scratch, home]) chmodSync(folder, 0o755);
  chmodSync(data, 0o700);
  if (isRoot) {
    const owner = serverOwner();
    for (const folder of [home, data]) chownSync(folder, owner.uid, owner.gid);
  }
  return { home, data };
}

function must(done, what) {
  if (done.status !== 0)
    throw new Error(`${what} failed: ${done.stdout ?? ''}${done.stderr ?? ''}`);
}

/**
 * Starts a server in a folder of its own below `scratch`, on the loopback address. Null where
 * PostgreSQL is not installed. `newDatabase` makes an empty database and returns its address.
 */
export async function startPostgres(scratch) {
  const bin = newestBin();
  if (!bin) return null;
  const tool = (name) => path.join(bin, name);
  const { home, data } = makeHome(scratch);
  const port = await freePort();
  const init = ['-D', data, '-U', 'strikeoff', '-A', 'trust', '-E', 'UTF8', '--no-sync'];
  must(asServerUser(tool('initdb'), init), 'initdb');
  const settings = [
    `-p ${port}`,
    '-c listen_addresses=127.0.0.1',
    `-c unix_socket_directories=${home}`,
    '-c fsync=off',
  ].join(' ');
  const start = ['-D', data, '-w', '-l', path.join(home, 'log'), '-o', settings, 'start'];
  // The server keeps inherited pipes open, which would never let this call end.
  must(asServerUser(tool('pg_ctl'), start, 'ignore'), 'pg_ctl');
  const address = (database) => `postgres://strikeoff@127.0.0.1:${port}/${database}`;
  return {
    url: address('postgres'),
    async newDatabase(name) {
      const where = ['-h', '127.0.0.1', '-p', String(port), '-U', 'strikeoff'];
      must(asServerUser(tool('createdb'), [...where, name]), 'createdb');
      return address(name);
    },
    async stop() {
      asServerUser(tool('pg_ctl'), ['-D', data, '-w', '-m', 'immediate', 'stop']);
    },
  };
}
