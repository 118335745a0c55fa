import type { Actor } from '../../auth/actor';
import type { Failure } from '../failure';
import { failure } from '../failure';

/** A script has no account of its own and must not get at the one of whoever issued its key. */
export function refuseKeys(actor: Actor): Failure | null {
  if (actor.via === 'session') return null;
  return failure('notAllowed', 'An access key has no account; sign in as a person.');
}
