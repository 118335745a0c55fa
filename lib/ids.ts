import { randomUUID } from 'node:crypto';
import type { Id } from './domain/ids';

/** A new record's id, made by the product and not by the database, so that both agree on it. */
export function newId<Kind extends string>(): Id<Kind> {
  return randomUUID() as Id<Kind>;
}
