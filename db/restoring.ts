import fs from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import { sha256 } from './backups';
import { startEngine } from './client';
import { copyDurably, syncFile, syncFolder } from './durable-files';
import { lockDataFolder } from './lock';

const manifestSchema = z.object({
  format: z.literal(1),
  madeAt: z.iso.datetime(),
  database: z.object({ file: z.literal('database.tar.gz'), sha256: z.string() }),
  blobs: z.array(z.string().regex(/^[0-9a-f]{2}\/[0-9a-f]{64}$/)),
});

/** What makes up the data; the lock and the backups themselves are not part of it. */
const PARTS = ['database', 'blobs'] as const;

/**
 * Puts a backup into a data folder. It is checked and built beside the data first and moved into
 * place last, so that a damaged backup or an interruption leaves what was there. Data that is
 * there already is never overwritten: with `force` it is moved aside.
 */
export async function restoreBackup(options: {
  readonly from: string;
  readonly dataDir: string;
  readonly force: boolean;
  readonly now: Date;
}): Promise<{ movedAside: string | null }> {
  const { from, dataDir, now } = options;
  const lock = lockDataFolder(dataDir);
  try {
    const there = PARTS.filter((part) => hasContent(path.join(dataDir, part)));
    if (there.length > 0 && !options.force) {
      throw new Error(
        `${dataDir} holds data already. Nothing was changed. Add --force to move that data ` +
          'aside and restore, or name an empty folder with DATA_DIR.',
      );
    }
    const stamp = now.toISOString().replace(/[:.]/g, '-');
    const draft = path.join(dataDir, `restoring-${stamp}`);
    try {
      await build(from, draft);
      const movedAside = there.length > 0 ? path.join(dataDir, `before-restore-${stamp}`) : null;
      moveIntoPlace(draft, dataDir, movedAside);
      return { movedAside };
    } finally {
      fs.rmSync(draft, { recursive: true, force: true });
    }
  } finally {
    lock.release();
  }
}

function hasContent(folder: string): boolean {
  return fs.existsSync(folder) && fs.readdirSync(folder).length > 0;
}

/** Unpacks a backup into `draft`, with every hash checked and the database opened once. */
async function build(from: string, draft: string): Promise<void> {
  const manifest = readManifest(from);
  const dump = fs.readFileSync(path.join(from, manifest.database.file));
  if (sha256(dump) !== manifest.database.sha256) throw damaged(from, manifest.database.file);
  for (const blob of manifest.blobs) {
    const source = path.join(from, 'blobs', blob);
    if (!fs.existsSync(source) || sha256(fs.readFileSync(source)) !== path.basename(blob)) {
      throw damaged(from, `blobs/${blob}`);
    }
    const target = path.join(draft, 'blobs', blob);
    fs.mkdirSync(path.dirname(target), { recursive: true });
    copyDurably(source, target);
  }
  fs.mkdirSync(path.join(draft, 'blobs'), { recursive: true });
  const database = path.join(draft, 'database');
  const engine = await startEngine(database, new Blob([dump]));
  await engine.exec('CHECKPOINT');
  await engine.close();
  syncTree(draft);
}

function readManifest(from: string) {
  let text: string;
  try {
    text = fs.readFileSync(path.join(from, 'manifest.json'), 'utf8');
  } catch {
    throw new Error(`${from} is no backup: it has no manifest.json.`);
  }
  try {
    return manifestSchema.parse(JSON.parse(text));
  } catch {
    throw damaged(from, 'manifest.json');
  }
}

function damaged(from: string, file: string): Error {
  return new Error(
    `The backup ${from} is damaged: ${file} is missing or not what was written. Nothing was ` +
      'changed. Take another backup.',
  );
}

function syncTree(folder: string): void {
  for (const entry of fs.readdirSync(folder, { withFileTypes: true })) {
    const at = path.join(folder, entry.name);
    if (entry.isDirectory()) syncTree(at);
    else if (entry.isFile()) syncFile(at);
  }
  syncFolder(folder);
}

function moveIntoPlace(draft: string, dataDir: string, aside: string | null): void {
  if (aside) fs.mkdirSync(aside);
  for (const part of PARTS) {
    const place = path.join(dataDir, part);
    if (fs.existsSync(place)) {
      if (aside) fs.renameSync(place, path.join(aside, part));
      else fs.rmdirSync(place);
    }
    fs.renameSync(path.join(draft, part), place);
  }
  if (aside) syncFolder(aside);
  syncFolder(dataDir);
}
