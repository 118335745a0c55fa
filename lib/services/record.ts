import type { Handle } from '../../db/client';
import { activity } from '../../db/schema/activity';
import type { CompanyId, PersonId } from '../domain/ids';
import { newId } from '../ids';

/** A change as the activity record keeps it. */
export interface Change {
  /** "orders.send" */
  readonly action: string;
  readonly entity: string;
  readonly entityId: string;
  /** One line for a person: "Sent order CR-1187 to Cinder Ridge Ready-Mix". */
  readonly summary: string;
  readonly before?: unknown;
  readonly after?: unknown;
}

export interface ActingPerson {
  readonly companyId: CompanyId;
  /** Null where the product itself acted. */
  readonly id: PersonId | null;
  readonly name: string;
}

/** Adds a row to a company's activity record, in the caller's transaction. */
export async function writeActivity(
  handle: Handle,
  who: ActingPerson,
  at: Date,
  change: Change,
): Promise<void> {
  await handle.insert(activity).values({
    id: newId(),
    companyId: who.companyId,
    at,
    actorId: who.id,
    actorName: who.name,
    action: change.action,
    entity: change.entity,
    entityId: change.entityId,
    summary: change.summary,
    before: change.before ?? null,
    after: change.after ?? null,
  });
}
