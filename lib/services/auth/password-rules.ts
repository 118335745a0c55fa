import { isObviousPassword } from '../../auth/obvious-password';
import type { Failure } from '../failure';
import { failure } from '../failure';

/** A refusal when a new password is one that anyone would try first. */
export function refuseObvious(
  password: string,
  about: readonly string[],
  field: string,
): Failure | null {
  if (!isObviousPassword(password, about)) return null;
  return failure(
    'invalid',
    'This password is easy to guess. Four unrelated words make a good one.',
    [{ path: field, message: 'too easy to guess' }],
  );
}
