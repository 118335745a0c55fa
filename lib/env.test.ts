import path from 'node:path';
import { expect, test } from 'vitest';
import { readEnv } from './env';

const read = (source: Record<string, string>) => readEnv(source as NodeJS.ProcessEnv);

test('without configuration everything has a value', () => {
  expect(read({})).toMatchObject({
    dataDir: path.resolve('.data'),
    databaseUrl: null,
    appOrigin: 'http://localhost:3000',
    demo: true,
    trustProxy: false,
    backupHours: 24,
    backupKeep: 7,
  });
});

test('the address follows the port unless it is given', () => {
  expect(read({ PORT: '4000' }).appOrigin).toBe('http://localhost:4000');
  expect(read({ PORT: '4000', APP_ORIGIN: 'https://a.example' }).appOrigin).toBe(
    'https://a.example',
  );
});

test('backups can be switched off, and keep at least one where they are on', () => {
  expect(read({ BACKUP_HOURS: '0', BACKUP_KEEP: '0' })).toMatchObject({
    backupHours: 0,
    backupKeep: 1,
  });
  expect(read({ BACKUP_HOURS: 'often' }).backupHours).toBe(24);
});
