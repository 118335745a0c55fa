import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { blobStoreIn, sha256Of } from './blob-store';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'strikeoff-blobs-'));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const filesIn = (place: string) =>
  readdirSync(place, { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile());

test('what is put under its hash comes back byte for byte', async () => {
  const store = blobStoreIn(path.join(folder, 'blobs'));
  const bytes = Uint8Array.from({ length: 70_000 }, (_, index) => (index * 31) % 256);
  const sha256 = await store.put(bytes);
  expect(sha256).toBe(sha256Of(bytes));
  expect(await store.get(sha256)).toEqual(bytes);
});

test('the hash is SHA-256: the FIPS 180-2 example "abc"', () => {
  expect(sha256Of(new TextEncoder().encode('abc'))).toBe(
    'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
  );
});

test('the same file twice, at once even, is stored once and leaves nothing half-written', async () => {
  const store = blobStoreIn(folder);
  const bytes = new Uint8Array([1, 2, 3]);
  await Promise.all([store.put(bytes), store.put(bytes), store.put(bytes)]);
  await store.put(bytes);
  expect(filesIn(folder).map((entry) => entry.name)).toEqual([sha256Of(bytes)]);
});

test('an unknown hash is null, and a hash that is none cannot leave the folder', async () => {
  const store = blobStoreIn(folder);
  expect(await store.get('0'.repeat(64))).toBeNull();
  await expect(store.get('../../etc/passwd')).rejects.toThrow('Not a blob');
});

test('a damaged file is an error, never a photo; storing it anew repairs a torn one', async () => {
  const store = blobStoreIn(folder);
  const bytes = new Uint8Array([9, 8, 7, 6]);
  const sha256 = await store.put(bytes);
  writeFileSync(path.join(folder, sha256.slice(0, 2), sha256), new Uint8Array([9, 8]));
  await expect(store.get(sha256)).rejects.toThrow('damaged');
  await store.put(bytes);
  expect(await store.get(sha256)).toEqual(bytes);
});
