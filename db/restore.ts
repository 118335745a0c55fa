import path from 'node:path';
import { parseArgs } from 'node:util';
import { readEnv } from '../lib/env';
import { restoreBackup } from './restoring';

/** `npm run restore -- FOLDER [--force]`: puts a backup into the data folder. */
async function main(): Promise<void> {
  const { values, positionals } = parseArgs({
    options: { force: { type: 'boolean', default: false } },
    allowPositionals: true,
  });
  const [from, ...rest] = positionals;
  const { dataDir, databaseUrl } = readEnv();
  if (from === undefined || rest.length > 0) {
    throw new Error('Say which backup: npm run restore -- FOLDER [--force]');
  }
  if (databaseUrl) {
    throw new Error(
      'DATABASE_URL names a PostgreSQL server: restore its database with pg_restore, and copy ' +
        `the photos back into ${path.join(dataDir, 'blobs')}.`,
    );
  }
  const { movedAside } = await restoreBackup({
    from: path.resolve(from),
    dataDir,
    force: values.force,
    now: new Date(),
  });
  console.log(`Restored ${from} into ${dataDir}.`);
  if (movedAside) console.log(`What was there before is in ${movedAside}.`);
}

try {
  await main();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
