import type { z } from 'zod';
import { openStore } from '../../db/client';
import { inTx } from '../../db/tx';
import type { Actor } from '../auth/actor';
import type { Permission } from '../auth/policy';
import { POLICY, roleMay } from '../auth/policy';
import type { Clock } from '../clock';
import { systemClock } from '../clock';
import type { Result } from '../domain/result';
import { fail, ok } from '../domain/result';
import type { Ctx } from './context';
import { makeContext } from './context';
import type { Failure } from './failure';
import { failure } from './failure';

export type HttpMethod = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/**
 * One thing that people or scripts can do. The same object serves pages, routes, the API's
 * description and the generated tests.
 */
export interface Verb<
  Input extends z.ZodType = z.ZodType,
  Output extends z.ZodType = z.ZodType,
  Prepared extends z.output<Input> = z.output<Input>,
> {
  /** "orders.send" */
  readonly name: string;
  /** A line for the API's description. */
  readonly says: string;
  readonly kind: 'read' | 'write';
  readonly permission: Permission;
  readonly http: { readonly method: HttpMethod; readonly path: string };
  /** Refuses unknown keys: use z.strictObject. */
  readonly input: Input;
  readonly output: Output;
  /**
   * Work that is not the database's and has to be over before the transaction begins: looking
   * into a file, storing its bytes. What it adds to the input reaches `run`. It runs after the
   * permission check and must be harmless when the verb then fails.
   */
  prepare?(input: z.output<Input>, actor: Actor): Promise<Result<Prepared, Failure>>;
  run(ctx: Ctx, input: Prepared): Promise<Result<z.output<Output>, Failure>>;
}

/** Declares a verb; the type parameters follow from its schemas. */
export function defineVerb<
  Input extends z.ZodType,
  Output extends z.ZodType,
  Prepared extends z.output<Input> = z.output<Input>,
>(verb: Verb<Input, Output, Prepared>): Verb<Input, Output, Prepared> {
  return verb;
}

/** Carries a failed result out of a transaction, which it rolls back. */
class RolledBack extends Error {
  constructor(readonly failure: Failure) {
    super(failure.message);
  }
}

export interface CallOptions {
  readonly clock?: Clock;
}

/**
 * Runs a verb for someone: permission, input, one transaction for a write (undone when the verb
 * fails), and the rule that a change without its activity record does not commit.
 */
export async function callVerb<Input extends z.ZodType, Output extends z.ZodType>(
  verb: Verb<Input, Output>,
  actor: Actor,
  rawInput: unknown,
  options: CallOptions = {},
): Promise<Result<z.output<Output>, Failure>> {
  const clock = options.clock ?? systemClock;
  if (!roleMay(actor.role, verb.permission)) {
    return fail(failure('notAllowed', `Your role may not ${POLICY[verb.permission].says}.`));
  }
  const parsed = verb.input.safeParse(rawInput);
  if (!parsed.success) return fail(invalidInput(parsed.error));
  const prepared = verb.prepare ? await verb.prepare(parsed.data, actor) : ok(parsed.data);
  if (!prepared.ok) return prepared;
  const { handle } = await openStore();
  if (verb.kind === 'read')
    return verb.run(await makeContext(handle, actor, clock), prepared.value);
  try {
    return await inTx({ companyId: actor.companyId, handle }, async (scope) => {
      const ctx = await makeContext(scope.handle, actor, clock);
      const result = await verb.run(ctx, prepared.value);
      if (!result.ok) throw new RolledBack(result.error);
      if (!ctx.accounted()) throw new Error(`${verb.name} changed data without recording it`);
      return result;
    });
  } catch (error) {
    if (error instanceof RolledBack) return fail(error.failure);
    throw error;
  }
}

export function invalidInput(error: z.ZodError): Failure {
  const issues = error.issues.map((issue) => ({
    path: issue.path.map(String).join('.'),
    message: issue.message,
  }));
  const fields = [...new Set(issues.map((issue) => issue.path).filter(Boolean))].join(', ');
  return failure(
    'invalid',
    fields ? `Please check: ${fields}.` : 'Something in the request is not right.',
    issues,
  );
}
