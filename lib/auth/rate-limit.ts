import { createHash } from 'node:crypto';
import { RateLimiterDrizzle, RateLimiterRes } from 'rate-limiter-flexible';
import type { Handle } from '../../db/client';
import { rateLimits } from '../../db/schema/rate-limits';

const MINUTE = 60;
const HOUR = 60 * MINUTE;

/**
 * How many attempts are taken. The account's own limits hold against many addresses, the
 * address's against many accounts; the narrow one, account and address together, is so that a
 * stranger's guessing does not soon lock the owner of the account out.
 */
const LIMITS = {
  signInAccountAndAddress: { points: 8, seconds: 15 * MINUTE },
  signInAccount: { points: 40, seconds: HOUR },
  signInAddress: { points: 60, seconds: 15 * MINUTE },
  signUpAddress: { points: 20, seconds: HOUR },
  forgotAccount: { points: 3, seconds: HOUR },
  forgotAddress: { points: 20, seconds: HOUR },
  linkAddress: { points: 60, seconds: 15 * MINUTE },
  currentPassword: { points: 8, seconds: 15 * MINUTE },
} as const;
export type LimitName = keyof typeof LIMITS;

const limitersOf = new WeakMap<Handle, Map<LimitName, RateLimiterDrizzle>>();

/**
 * Counts are rows, so neither a restart nor a second server process forgets them; once a key is
 * over its limit the refusals come from memory and cost the database nothing.
 */
function limiter(handle: Handle, name: LimitName): RateLimiterDrizzle {
  const limiters = limitersOf.get(handle) ?? new Map<LimitName, RateLimiterDrizzle>();
  limitersOf.set(handle, limiters);
  const known = limiters.get(name);
  if (known) return known;
  const { points, seconds } = LIMITS[name];
  const made = new RateLimiterDrizzle({
    storeClient: handle,
    schema: rateLimits,
    keyPrefix: name,
    points,
    duration: seconds,
    inMemoryBlockOnConsumed: points + 1,
    // Old rows are swept by the worker's maintenance.
    clearExpiredByTimeout: false,
  });
  limiters.set(name, made);
  return made;
}

/** Hashed, so that the table lists neither addresses nor accounts. */
function keyOf(parts: readonly string[]): string {
  return createHash('sha256').update(parts.join('\n')).digest('hex').slice(0, 32);
}

/** Counts one attempt. Minutes to wait when it is one too many, else null. */
export async function countAttempt(
  handle: Handle,
  name: LimitName,
  ...who: readonly string[]
): Promise<number | null> {
  try {
    await limiter(handle, name).consume(keyOf(who));
    return null;
  } catch (error) {
    if (error instanceof RateLimiterRes) return Math.max(1, Math.ceil(error.msBeforeNext / 60_000));
    throw error;
  }
}

/** Forgets the attempts counted so far, after one that was right. */
export async function forgetAttempts(
  handle: Handle,
  name: LimitName,
  ...who: readonly string[]
): Promise<void> {
  await limiter(handle, name).delete(keyOf(who));
}

/** Gives back an attempt that turned out right, and keeps what others from there got wrong. */
export async function giveAttemptBack(
  handle: Handle,
  name: LimitName,
  ...who: readonly string[]
): Promise<void> {
  await limiter(handle, name).reward(keyOf(who), 1);
}
