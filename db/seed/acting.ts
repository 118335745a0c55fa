import { and, eq } from 'drizzle-orm';
import type { z } from 'zod';
import type { Actor } from '../../lib/auth/actor';
import { actorOfPerson } from '../../lib/auth/session';
import type { Clock } from '../../lib/clock';
import type { PersonId } from '../../lib/domain/ids';
import type { Verb } from '../../lib/services/verb';
import { callVerb } from '../../lib/services/verb';
import type { Handle } from '../client';
import { people } from '../schema/people';
import { PEOPLE, type PersonKey } from './story';

/** Does as its people would, through the same verbs: what a verb refuses stops the loading. */
export async function done<Input extends z.ZodType, Output extends z.ZodType>(
  verb: Verb<Input, Output>,
  actor: Actor,
  clock: Clock,
  input: z.input<Input>,
): Promise<z.output<Output>> {
  const result = await callVerb(verb, actor, input, { clock });
  if (!result.ok) throw new Error(`The demo’s ${verb.name}: ${result.error.message}`);
  return result.value;
}

export async function demoPerson(
  handle: Handle,
  companyId: string,
  key: PersonKey,
): Promise<Actor> {
  const email = PEOPLE.find((one) => one.key === key)?.email ?? '';
  const [row] = await handle
    .select({ id: people.id })
    .from(people)
    .where(and(eq(people.companyId, companyId), eq(people.email, email)));
  const actor = row && (await actorOfPerson(handle, row.id as PersonId, 'session'));
  if (!actor) throw new Error(`The demo’s ${key} is missing`);
  return actor;
}
