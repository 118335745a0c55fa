import path from 'node:path';
import { parseArgs } from 'node:util';
import { readEnv } from '../lib/env';
import { makeBackup } from './backups';
import { closeStore, openStore } from './client';
import { DataFolderInUse } from './lock';

/** `npm run backup [-- --to FOLDER]`: backs up the embedded database and the stored files. */
async function main(): Promise<void> {
  const { values } = parseArgs({ options: { to: { type: 'string' } } });
  const env = readEnv();
  if (env.databaseUrl) {
    throw new Error(
      'DATABASE_URL names a PostgreSQL server: back its database up with pg_dump (for example ' +
        `pg_dump --format=custom --file=strikeoff.dump "$DATABASE_URL"), then copy the folder ` +
        `${path.join(env.dataDir, 'blobs')}, which holds the photos. In this order every photo ` +
        'that the dump names is in the copy.',
    );
  }
  const store = await openStore(env);
  try {
    const to = values.to === undefined ? {} : { to: path.resolve(values.to) };
    const folder = await makeBackup(store, { dataDir: env.dataDir, now: new Date(), ...to });
    console.log(`Backup made: ${folder}`);
  } finally {
    await closeStore();
  }
}

try {
  await main();
} catch (error) {
  if (error instanceof DataFolderInUse) {
    console.error(
      `${error.message} A running server makes backups by itself, every BACKUP_HOURS hours, in ` +
        `${path.join(readEnv().dataDir, 'backups')}.`,
    );
  } else console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
