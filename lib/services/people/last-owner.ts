import type { Failure } from '../failure';
import { failure } from '../failure';

/** A company without an owner could never invite or approve again. */
export function lastOwner(name: string): Failure {
  return failure('conflict', `${name} is the only owner. Make someone else owner first.`);
}
