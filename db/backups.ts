import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import type { Store } from './client';
import { copyDurably, syncFolder, writeDurably } from './durable-files';

/**
 * A backup is a folder: the embedded database as one dump, every stored photo and file, and a
 * manifest that says what belongs to it. It is complete or not there: it is built under another
 * name, flushed to the disk, and renamed.
 */
interface Manifest {
  readonly format: 1;
  readonly madeAt: string;
  readonly database: { readonly file: string; readonly sha256: string };
  /** Paths under `blobs`; each ends in the hash of its bytes. */
  readonly blobs: readonly string[];
}

export interface FoundBackup {
  readonly folder: string;
  readonly madeAt: Date;
}

const NAME = /^(\d{4}-\d{2}-\d{2})T(\d{2})-(\d{2})-(\d{2})-(\d{3})Z$/;
const DATABASE_FILE = 'database.tar.gz';

function backupsFolder(dataDir: string): string {
  return path.join(dataDir, 'backups');
}

function nameFor(moment: Date): string {
  return moment.toISOString().replace(/[:.]/g, '-');
}

/** The complete backups under the data folder, oldest first. */
export function backupsIn(dataDir: string): FoundBackup[] {
  const folder = backupsFolder(dataDir);
  if (!fs.existsSync(folder)) return [];
  return fs
    .readdirSync(folder)
    .sort()
    .flatMap((name) => {
      const parts = NAME.exec(name);
      if (!parts) return [];
      const [, day, hour, minute, second, ms] = parts;
      const madeAt = new Date(`${day}T${hour}:${minute}:${second}.${ms}Z`);
      return [{ folder: path.join(folder, name), madeAt }];
    });
}

/** Removes the oldest backups beyond `keep`, and what an interrupted one left behind. */
export function removeOldBackups(dataDir: string, keep: number): void {
  const old = backupsIn(dataDir).slice(0, -keep);
  for (const { folder } of old) fs.rmSync(folder, { recursive: true, force: true });
  const parent = backupsFolder(dataDir);
  for (const name of fs.existsSync(parent) ? fs.readdirSync(parent) : []) {
    if (name.endsWith('.part')) fs.rmSync(path.join(parent, name), { recursive: true });
  }
}

/** Backs the embedded store up into `to`, or under the data folder by date; where it is now. */
export async function makeBackup(
  store: Store,
  options: { readonly dataDir: string; readonly now: Date; readonly to?: string },
): Promise<string> {
  if (!store.engine) throw new Error('Only the embedded database is backed up here');
  const to = options.to ?? path.join(backupsFolder(options.dataDir), nameFor(options.now));
  if (fs.existsSync(/* turbopackIgnore: true */ to)) throw new Error(`${to} exists already`);
  const draft = `${to}.${process.pid}.part`;
  fs.rmSync(draft, { recursive: true, force: true });
  fs.mkdirSync(draft, { recursive: true });
  try {
    await store.engine.exec('CHECKPOINT');
    // The dump first: a file that it names was stored before it, so the copy below has it.
    const dump = await store.engine.dumpDataDir('gzip');
    const bytes = new Uint8Array(await dump.arrayBuffer());
    writeDurably(path.join(draft, DATABASE_FILE), bytes);
    const copy = options.to === undefined ? shareOrCopy : copyDurably;
    const blobs = copyBlobs(path.join(options.dataDir, 'blobs'), path.join(draft, 'blobs'), copy);
    const manifest: Manifest = {
      format: 1,
      madeAt: options.now.toISOString(),
      database: { file: DATABASE_FILE, sha256: sha256(bytes) },
      blobs,
    };
    const text = `${JSON.stringify(manifest, null, 2)}\n`;
    writeDurably(path.join(draft, 'manifest.json'), new TextEncoder().encode(text));
    syncFolder(draft);
    fs.renameSync(draft, to);
    syncFolder(path.dirname(to));
    return to;
  } catch (error) {
    fs.rmSync(draft, { recursive: true, force: true });
    throw error;
  }
}

export function sha256(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}

type Copy = (from: string, to: string) => void;

function copyBlobs(from: string, to: string, copy: Copy): string[] {
  if (!fs.existsSync(from)) return [];
  const copied: string[] = [];
  for (const shelf of fs.readdirSync(from).sort()) {
    if (!/^[0-9a-f]{2}$/.test(shelf)) continue;
    fs.mkdirSync(path.join(to, shelf), { recursive: true });
    for (const name of fs.readdirSync(path.join(from, shelf)).sort()) {
      if (!/^[0-9a-f]{64}$/.test(name)) continue;
      copy(path.join(from, shelf, name), path.join(to, shelf, name));
      copied.push(`${shelf}/${name}`);
    }
    syncFolder(path.join(to, shelf));
  }
  return copied;
}

/** Stored files never change, so backups in the data folder share them and cost no room. */
function shareOrCopy(from: string, to: string): void {
  try {
    fs.linkSync(from, to);
  } catch {
    // Another disk, or one without links.
    copyDurably(from, to);
  }
}
