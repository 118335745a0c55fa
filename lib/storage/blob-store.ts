import { createHash, randomUUID } from 'node:crypto';
import fs from 'node:fs/promises';
import path from 'node:path';
import { readEnv } from '../env';

/**
 * Files as they came, each under the hash of its bytes: the same file twice is stored once, and
 * a stored file never changes. Put a file before the transaction that names it: a file that
 * nothing names is only waste, a name without its file is a loss.
 */
export interface BlobStore {
  /** Stores `bytes` so that they survive a power cut, and returns their sha256 in hex. */
  put(bytes: Uint8Array): Promise<string>;
  /** The bytes under `sha256`, or null when there are none. Throws when they are damaged. */
  get(sha256: string): Promise<Uint8Array | null>;
}

export function sha256Of(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}

/** A blob store in `folder`, which is made when it is missing. */
export function blobStoreIn(folder: string): BlobStore {
  const placeOf = (sha256: string) => {
    if (!/^[0-9a-f]{64}$/.test(sha256)) throw new Error(`Not a blob's hash: ${sha256}`);
    return path.join(folder, sha256.slice(0, 2), sha256);
  };
  return {
    async put(bytes) {
      const sha256 = sha256Of(bytes);
      const place = placeOf(sha256);
      if (await isWhole(place, bytes.length)) return sha256;
      await makeFolder(folder, path.dirname(place));
      await writeDurably(place, bytes);
      return sha256;
    },
    async get(sha256) {
      const bytes = await readIfThere(placeOf(sha256));
      if (bytes && sha256Of(bytes) !== sha256) {
        throw new Error(`The stored file ${sha256} is damaged: its bytes have another hash`);
      }
      return bytes;
    },
  };
}

async function isWhole(place: string, size: number): Promise<boolean> {
  const found = await fs.stat(place).catch(() => null);
  return found?.size === size;
}

async function makeFolder(root: string, folder: string): Promise<void> {
  const made = await fs.mkdir(folder, { recursive: true });
  if (made) {
    await syncFolder(root);
    await syncFolder(path.dirname(root));
  }
}

/** Written beside its place, flushed, and renamed: a reader sees the whole file or none. */
async function writeDurably(place: string, bytes: Uint8Array): Promise<void> {
  const temporary = `${place}.${randomUUID()}.part`;
  try {
    const file = await fs.open(temporary, 'wx');
    try {
      await file.writeFile(bytes);
      await file.sync();
    } finally {
      await file.close();
    }
    await fs.rename(temporary, place);
  } catch (error) {
    await fs.rm(temporary, { force: true });
    throw error;
  }
  await syncFolder(path.dirname(place));
}

/** Makes a rename or a new entry of a folder survive a power cut. */
async function syncFolder(folder: string): Promise<void> {
  const opened = await fs.open(folder, 'r');
  try {
    await opened.sync();
  } finally {
    await opened.close();
  }
}

async function readIfThere(place: string): Promise<Uint8Array | null> {
  try {
    return new Uint8Array(await fs.readFile(place));
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
}

/** The product's own blob store, in the data folder beside the database. */
function ownStore(): BlobStore {
  return blobStoreIn(path.join(readEnv().dataDir, 'blobs'));
}

export function putBlob(bytes: Uint8Array): Promise<string> {
  return ownStore().put(bytes);
}

export function getBlob(sha256: string): Promise<Uint8Array | null> {
  return ownStore().get(sha256);
}
