import { randomUUID } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';

/** Why the data folder can't be opened, in a sentence that says what to do. */
export class DataFolderInUse extends Error {
  override readonly name = 'DataFolderInUse';
}

interface Owner {
  /** Different for every taking of the lock. */
  readonly nonce: string;
  readonly pid: number;
  /** The system's boot, so that a pid from before a restart is not mistaken for a living one. */
  readonly bootId: string;
  /** When the process started, so that a reused pid is not mistaken for the owner. */
  readonly startTicks: string;
  /** Whose pids these are: two containers on one folder can't see each other's processes. */
  readonly pidSpace: string;
}

function readText(file: string): string {
  try {
    return fs.readFileSync(file, 'utf8').trim();
  } catch {
    return '';
  }
}

function startTicks(pid: number): string {
  const stat = readText(`/proc/${pid}/stat`);
  return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? '';
}

function pidSpace(): string {
  try {
    return fs.readlinkSync('/proc/self/ns/pid');
  } catch {
    return '';
  }
}

function thisProcess(): Owner {
  return {
    nonce: randomUUID(),
    pid: process.pid,
    bootId: readText('/proc/sys/kernel/random/boot_id'),
    startTicks: startTicks(process.pid),
    pidSpace: pidSpace(),
  };
}

type Life = 'alive' | 'dead' | 'hidden';

function lifeOf(owner: Owner, me: Owner): Life {
  if (owner.bootId !== me.bootId) return 'dead';
  if (owner.pidSpace !== me.pidSpace) return 'hidden';
  try {
    process.kill(owner.pid, 0);
  } catch (error) {
    // EPERM: the process lives but belongs to someone else.
    if ((error as NodeJS.ErrnoException).code !== 'EPERM') return 'dead';
  }
  const ticks = startTicks(owner.pid);
  return owner.startTicks === '' || ticks === owner.startTicks ? 'alive' : 'dead';
}

/** The owner a lock file names; null when there is none, or none that can be read. */
function readOwner(file: string): Owner | null {
  try {
    const owner = JSON.parse(fs.readFileSync(file, 'utf8')) as Partial<Owner> | null;
    return owner && typeof owner.nonce === 'string' && typeof owner.pid === 'number'
      ? (owner as Owner)
      : null;
  } catch {
    return null;
  }
}

/**
 * Takes the one exclusive lock on a data folder, or throws `DataFolderInUse`. The embedded
 * database has no lock of its own and a second process would lose rows silently. A lock left by
 * a dead process is taken over; a living process's lock never is, and none is by its age: the
 * owner may be busy inside the database for minutes.
 */
export function lockDataFolder(dataDir: string): { release(): void } {
  fs.mkdirSync(dataDir, { recursive: true });
  const file = path.join(dataDir, 'database.lock');
  const me = thisProcess();
  take(file, me, dataDir);
  return { release: () => removeIfMine(file, me) };
}

/**
 * Taking over is itself done under a lock, named after the dead owner's nonce, so that of all
 * processes that find the same dead lock exactly one replaces it. If that one dies on the way,
 * its lock is taken over in the same manner.
 */
function take(file: string, me: Owner, dataDir: string): void {
  for (let attempt = 0; attempt < 20; attempt += 1) {
    if (create(file, me)) return;
    const owner = readOwner(file);
    if (owner) refuseIfLiving(owner, me, file, dataDir);
    else if (!fs.existsSync(file)) continue;
    const nonce = owner?.nonce ?? 'unreadable';
    const takeover = `${file}.${nonce.slice(0, 8)}`;
    take(takeover, me, dataDir);
    try {
      if ((readOwner(file)?.nonce ?? 'unreadable') !== nonce) continue;
      replace(file, me);
      return;
    } finally {
      removeIfMine(takeover, me);
    }
  }
  throw new DataFolderInUse(`Another process keeps taking the lock ${file}. Try again.`);
}

function refuseIfLiving(owner: Owner, me: Owner, file: string, dataDir: string): void {
  const life = lifeOf(owner, me);
  if (life === 'alive') {
    throw new DataFolderInUse(
      `The data folder ${dataDir} is in use by process ${owner.pid}. Stop that server first, ` +
        'or give this one a folder of its own with DATA_DIR, or use a PostgreSQL server with ' +
        'DATABASE_URL if several processes must share the data.',
    );
  }
  if (life === 'hidden') {
    throw new DataFolderInUse(
      `The data folder ${dataDir} was locked from another container, which can't be seen from ` +
        `here. Stop the server there; if none is running any more, delete ${file} and try again.`,
    );
  }
}

/** Writes the owner beside the lock and links it into place: no reader sees it half written. */
function create(file: string, me: Owner): boolean {
  const draft = writeDraft(file, me);
  try {
    fs.linkSync(draft, file);
    return true;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
    return false;
  } finally {
    fs.rmSync(draft, { force: true });
  }
}

function replace(file: string, me: Owner): void {
  fs.renameSync(writeDraft(file, me), file);
}

function writeDraft(file: string, me: Owner): string {
  const draft = `${file}.${me.nonce}.draft`;
  fs.writeFileSync(draft, JSON.stringify(me), { flush: true });
  return draft;
}

function removeIfMine(file: string, me: Owner): void {
  if (readOwner(file)?.nonce === me.nonce) fs.rmSync(file, { force: true });
}
