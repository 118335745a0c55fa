import fs from 'node:fs';

/** Writes a new file so that it survives a power cut; the caller flushes its folder. */
export function writeDurably(file: string, bytes: Uint8Array): void {
  const opened = fs.openSync(file, 'wx');
  try {
    fs.writeFileSync(opened, bytes);
    fs.fsyncSync(opened);
  } finally {
    fs.closeSync(opened);
  }
}

/** Copies a file so that it survives a power cut. */
export function copyDurably(from: string, to: string): void {
  fs.copyFileSync(from, to, fs.constants.COPYFILE_EXCL);
  syncFile(to);
}

export function syncFile(file: string): void {
  const opened = fs.openSync(file, 'r+');
  try {
    fs.fsyncSync(opened);
  } finally {
    fs.closeSync(opened);
  }
}

/** Makes new names and renames within a folder survive a power cut. */
export function syncFolder(folder: string): void {
  const opened = fs.openSync(folder, 'r');
  try {
    fs.fsyncSync(opened);
  } finally {
    fs.closeSync(opened);
  }
}
