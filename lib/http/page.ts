import { forbidden, notFound, redirect } from 'next/navigation';
import type { z } from 'zod';
import type { Actor } from '../auth/actor';
import type { Permission } from '../auth/policy';
import { roleMay } from '../auth/policy';
import type { Verb } from '../services/verb';
import { callVerb } from '../services/verb';
import { sessionActor } from './request-actor';

/** The first line of every page behind sign-in: who is asking, and whether they may be here. */
export async function requirePage(permission: Permission): Promise<Actor> {
  const actor = await sessionActor();
  if (!actor) redirect('/sign-in');
  if (!roleMay(actor.role, permission)) forbidden();
  return actor;
}

/** Asks a verb on behalf of a page; what is missing or foreign becomes the not-found page. */
export async function ask<Input extends z.ZodType, Output extends z.ZodType>(
  verb: Verb<Input, Output>,
  actor: Actor,
  input: z.input<Input>,
): Promise<z.output<Output>> {
  const result = await callVerb(verb, actor, input);
  if (result.ok) return result.value;
  if (result.error.code === 'notFound' || result.error.code === 'invalid') notFound();
  if (result.error.code === 'notAllowed') forbidden();
  throw new Error(`${verb.name}: ${result.error.message}`);
}
