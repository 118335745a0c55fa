import type { z } from 'zod';
import type { Handle } from '../../db/client';
import { openStore } from '../../db/client';
import type { Clock } from '../clock';
import { systemClock } from '../clock';
import type { Result } from '../domain/result';
import { fail } from '../domain/result';
import type { Failure } from './failure';
import type { HttpMethod } from './verb';
import { invalidInput } from './verb';

/** What the door knows of a request that nobody has signed in for. */
export interface Caller {
  /** The network address that attempts are counted against. */
  readonly address: string;
  /** The token in the session cookie that came along, valid or not. */
  readonly sessionToken: string | null;
  /** Whether the demo company's sign-ins may be shown. */
  readonly showsDemo: boolean;
}

export interface PublicCtx extends Caller {
  /** The root handle: a public verb opens its transactions itself, after the slow work. */
  readonly handle: Handle;
  readonly clock: Clock;
  /** Has the answer start a session with this token. */
  setSession(token: string): void;
  /** Has the answer end the session. */
  clearSession(): void;
}

/**
 * One thing that can be done without signing in: the doors to the product, and nothing that is
 * a company's. It has no actor, so it can't be asked through the signed-in door by mistake.
 */
export interface PublicVerb<
  Input extends z.ZodType = z.ZodType,
  Output extends z.ZodType = z.ZodType,
> {
  /** "auth.signIn" */
  readonly name: string;
  readonly says: string;
  readonly http: { readonly method: HttpMethod; readonly path: string };
  readonly input: Input;
  readonly output: Output;
  run(ctx: PublicCtx, input: z.output<Input>): Promise<Result<z.output<Output>, Failure>>;
}

export function definePublicVerb<Input extends z.ZodType, Output extends z.ZodType>(
  verb: PublicVerb<Input, Output>,
): PublicVerb<Input, Output> {
  return verb;
}

/** What becomes of the session cookie: a new token, none any more, or as it was. */
export type SessionChange =
  | { readonly kind: 'set'; readonly token: string }
  | { readonly kind: 'clear' }
  | { readonly kind: 'keep' };

/** Runs a public verb. A verb that fails leaves the session as it was. */
export async function callPublicVerb<Input extends z.ZodType, Output extends z.ZodType>(
  verb: PublicVerb<Input, Output>,
  rawInput: unknown,
  caller: Caller,
  clock: Clock = systemClock,
): Promise<{ result: Result<z.output<Output>, Failure>; session: SessionChange }> {
  const kept = { kind: 'keep' } as const;
  const parsed = verb.input.safeParse(rawInput);
  if (!parsed.success) return { result: fail(invalidInput(parsed.error)), session: kept };
  const { handle } = await openStore();
  let session: SessionChange = kept;
  const result = await verb.run(
    {
      ...caller,
      handle,
      clock,
      setSession(token) {
        session = { kind: 'set', token };
      },
      clearSession() {
        session = { kind: 'clear' };
      },
    },
    parsed.data,
  );
  return { result, session: result.ok ? session : kept };
}
