import { countAttempt } from '../../auth/rate-limit';
import type { Failure } from '../failure';
import { failure } from '../failure';

type Counted = Parameters<typeof countAttempt>;

/** Counts an attempt against each limit; a refusal when one of them is used up. */
export async function refuseTooMany(
  handle: Counted[0],
  what: string,
  limits: readonly (readonly [Counted[1], ...string[]])[],
): Promise<Failure | null> {
  for (const [name, ...who] of limits) {
    const minutes = await countAttempt(handle, name, ...who);
    if (minutes === null) continue;
    const wait = minutes === 1 ? 'a minute' : `${minutes} minutes`;
    return failure('tooMany', `Too many ${what}. Try again in ${wait}.`);
  }
  return null;
}
