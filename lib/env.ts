import path from 'node:path';

/** Configuration, read from the environment in one place. README has the table. */
export interface Env {
  /** Folder of the embedded database, the photos and the backups. */
  readonly dataDir: string;
  /** A PostgreSQL server's address; null for the embedded database. */
  readonly databaseUrl: string | null;
  /** Where people reach the product; links in mail start with it. */
  readonly appOrigin: string;
  readonly resendApiKey: string | null;
  readonly resendBaseUrl: string | null;
  readonly mailFrom: string;
  /** Load the demo company when the database is empty. */
  readonly demo: boolean;
  /** A fixed present for tests, ISO 8601; null for the real one. */
  readonly fixedNow: string | null;
  /** Honour X-Forwarded-For only behind a proxy that sets it. */
  readonly trustProxy: boolean;
  /** Hours between two backups of the embedded database; 0 for none. */
  readonly backupHours: number;
  /** How many of those backups are kept. */
  readonly backupKeep: number;
  readonly logLevel: string;
}

/** A whole number from the environment, or `fallback` where it is missing or is none. */
function wholeNumber(text: string | undefined, fallback: number): number {
  return text !== undefined && /^\d{1,6}$/.test(text) ? Number(text) : fallback;
}

export function readEnv(source: NodeJS.ProcessEnv = process.env): Env {
  const port = source.PORT ?? '3000';
  return {
    dataDir: path.resolve(/* turbopackIgnore: true */ source.DATA_DIR ?? '.data'),
    databaseUrl: source.DATABASE_URL || null,
    appOrigin: source.APP_ORIGIN ?? `http://localhost:${port}`,
    resendApiKey: source.RESEND_API_KEY || null,
    resendBaseUrl: source.RESEND_BASE_URL || null,
    mailFrom: source.MAIL_FROM ?? 'Strikeoff <strikeoff@localhost>',
    demo: source.DEMO !== 'off',
    fixedNow: source.STRIKEOFF_NOW || null,
    trustProxy: source.TRUST_PROXY === 'on',
    backupHours: wholeNumber(source.BACKUP_HOURS, 24),
    backupKeep: Math.max(1, wholeNumber(source.BACKUP_KEEP, 7)),
    logLevel: source.LOG_LEVEL ?? 'info',
  };
}
