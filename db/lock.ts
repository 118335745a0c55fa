import fs from 'node:fs';
import path from 'node:path';

/** Why the data folder can't be opened, in a sentence that says what to do. */
export class DataFolderInUse extends Error {
  override readonly name = 'DataFolderInUse';
}

interface Owner {
  readonly pid: number;
  /** The system's boot, so that a pid from before a restart is not mistaken for a living one. */
  readonly bootId: string;
  /** When the process started, so that a reused pid is not mistaken for the owner. */
  readonly startTicks: string;
}

function bootId(): string {
  try {
    return fs.readFileSync('/proc/sys/kernel/random/boot_id', 'utf8').trim();
  } catch {
    return 'unknown';
  }
}

function startTicks(pid: number): string | null {
  try {
    const stat = fs.readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? null;
  } catch {
    return null;
  }
}

function isAlive(owner: Owner): boolean {
  if (owner.bootId !== bootId()) return false;
  try {
    process.kill(owner.pid, 0);
  } catch (error) {
    // EPERM: the process lives but belongs to someone else.
    if ((error as NodeJS.ErrnoException).code !== 'EPERM') return false;
  }
  const ticks = startTicks(owner.pid);
  return ticks === null || owner.startTicks === '' || ticks === owner.startTicks;
}

function readOwner(file: string): Owner | null {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8')) as Owner;
  } catch {
    return null;
  }
}

/**
 * Takes the one exclusive lock on a data folder, or throws `DataFolderInUse`. The embedded
 * database has no lock of its own and a second process would lose rows silently. A lock left
 * by a dead process is taken over; a living process's lock never is.
 *
 * The file is linked into place complete, so that no reader ever sees it half written.
 */
export function lockDataFolder(dataDir: string): { release(): void } {
  fs.mkdirSync(dataDir, { recursive: true });
  const file = path.join(dataDir, 'database.lock');
  const me: Owner = {
    pid: process.pid,
    bootId: bootId(),
    startTicks: startTicks(process.pid) ?? '',
  };
  const draft = `${file}.${process.pid}`;
  fs.writeFileSync(draft, JSON.stringify(me));
  try {
    for (let attempt = 0; attempt < 5; attempt += 1) {
      try {
        fs.linkSync(draft, file);
        return { release: () => releaseIfMine(file, me) };
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
      }
      takeOverOrRefuse(file, dataDir);
    }
    throw new DataFolderInUse(`Another process keeps taking the lock ${file}. Try again.`);
  } finally {
    fs.rmSync(draft, { force: true });
  }
}

function takeOverOrRefuse(file: string, dataDir: string): void {
  const owner = readOwner(file);
  if (owner && isAlive(owner)) {
    throw new DataFolderInUse(
      `The data folder ${dataDir} is in use by process ${owner.pid}. Stop that server first, ` +
        'or give this one a folder of its own with DATA_DIR, or use a PostgreSQL server with ' +
        'DATABASE_URL if several processes must share the data.',
    );
  }
  // Renaming is atomic: of two processes that find the same dead lock, one moves it away.
  const aside = `${file}.stale.${process.pid}`;
  try {
    fs.renameSync(file, aside);
    const moved = readOwner(aside);
    if (moved && isAlive(moved)) fs.linkSync(aside, file);
  } catch (error) {
    const code = (error as NodeJS.ErrnoException).code;
    if (code !== 'ENOENT' && code !== 'EEXIST') throw error;
  } finally {
    fs.rmSync(aside, { force: true });
  }
}

function releaseIfMine(file: string, me: Owner): void {
  const owner = readOwner(file);
  if (owner && owner.pid === me.pid && owner.startTicks === me.startTicks) {
    fs.rmSync(file, { force: true });
  }
}
