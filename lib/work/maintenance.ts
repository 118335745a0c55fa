import { and, isNotNull, lt, or, sql } from 'drizzle-orm';
import { backupsIn, makeBackup, removeOldBackups } from '../../db/backups';
import type { Store } from '../../db/client';
import { passwordResets, sessions } from '../../db/schema/people';
import { rateLimits } from '../../db/schema/rate-limits';
import type { Env } from '../env';
import { log } from '../log';

const HOUR_MS = 60 * 60_000;

export interface Maintenance {
  stop(): Promise<void>;
}

/**
 * What the embedded database has no background processes for, and backups of it. On a PostgreSQL
 * server only our own sweeping remains.
 */
export function startMaintenance(store: Store, env: Env): Maintenance {
  let running: Promise<void> = Promise.resolve();
  const every = (ms: number, what: string, work: () => Promise<void>) =>
    setInterval(() => {
      // One after the other: each of them keeps the embedded database busy.
      running = running.then(work).catch((error: unknown) => {
        log.error({ err: error, what }, 'maintenance failed and is tried again at its next turn');
      });
    }, ms);
  const timers = [every(HOUR_MS, 'sweep', () => sweep(store, new Date()))];
  if (store.kind === 'pglite') {
    timers.push(every(HOUR_MS / 6, 'checkpoint', () => run(store, 'CHECKPOINT')));
    timers.push(every(6 * HOUR_MS, 'vacuum', () => run(store, 'VACUUM ANALYZE')));
    if (env.backupHours > 0) {
      // Looked at often and made when due, so that restarts neither skip nor multiply backups.
      timers.push(every(HOUR_MS / 4, 'backup', () => backUpWhenDue(store, env, new Date())));
    }
  }
  for (const timer of timers) timer.unref();
  return {
    async stop() {
      for (const timer of timers) clearInterval(timer);
      await running;
    },
  };
}

async function run(store: Store, statement: 'CHECKPOINT' | 'VACUUM ANALYZE'): Promise<void> {
  await store.handle.execute(sql.raw(statement));
}

/** Removes what nobody can use any more: sessions, links and counts that are over. */
export async function sweep({ handle }: Store, now: Date): Promise<void> {
  await handle.delete(sessions).where(lt(sessions.expiresAt, now));
  await handle
    .delete(passwordResets)
    .where(or(lt(passwordResets.expiresAt, now), isNotNull(passwordResets.usedAt)));
  await handle
    .delete(rateLimits)
    .where(and(isNotNull(rateLimits.expire), lt(rateLimits.expire, now)));
}

/** Makes a backup when the newest is older than BACKUP_HOURS, and removes those beyond BACKUP_KEEP. */
export async function backUpWhenDue(store: Store, env: Env, now: Date): Promise<void> {
  const newest = backupsIn(env.dataDir).at(-1);
  const age = newest ? now.getTime() - newest.madeAt.getTime() : Number.POSITIVE_INFINITY;
  if (age < env.backupHours * HOUR_MS) return;
  const folder = await makeBackup(store, { dataDir: env.dataDir, now });
  removeOldBackups(env.dataDir, env.backupKeep);
  log.info({ folder }, 'backup made');
}
