import { eq } from 'drizzle-orm';
import type { Handle } from '../../db/client';
import { activity } from '../../db/schema/activity';
import { companies } from '../../db/schema/companies';
import type { Scope } from '../../db/tx';
import type { Actor } from '../auth/actor';
import type { Clock } from '../clock';
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

export interface CompanySettings {
  readonly name: string;
  readonly timeZone: string;
  readonly clock: '12' | '24';
  readonly tolerances: Record<string, { absolute: string; percent: string }>;
}

/** What a verb works with: whose rows, who asks, the present, and the activity record. */
export interface Ctx {
  readonly scope: Scope;
  readonly actor: Actor;
  readonly company: CompanySettings;
  readonly clock: Clock;
  /** Writes to the activity record, in the same transaction as the change. */
  record(change: Change): Promise<void>;
  /** Says that a repeated request changed nothing, so there is nothing to record. */
  unchanged(): void;
  /** Whether the verb recorded its change or said there was none; the verb runner checks it. */
  accounted(): boolean;
}

export async function makeContext(handle: Handle, actor: Actor, clock: Clock): Promise<Ctx> {
  const [company] = await handle
    .select({
      name: companies.name,
      timeZone: companies.timeZone,
      clock: companies.clock,
      tolerances: companies.tolerances,
    })
    .from(companies)
    .where(eq(companies.id, actor.companyId));
  if (!company) throw new Error(`Company ${actor.companyId} is missing`);
  let accounted = false;
  const scope: Scope = { companyId: actor.companyId, handle };
  return {
    scope,
    actor,
    company,
    clock,
    accounted: () => accounted,
    unchanged() {
      accounted = true;
    },
    async record(change) {
      accounted = true;
      await handle.insert(activity).values({
        id: newId(),
        companyId: actor.companyId,
        at: clock.now(),
        actorId: actor.personId,
        actorName: actor.via === 'accessKey' ? `${actor.name} (access key)` : actor.name,
        action: change.action,
        entity: change.entity,
        entityId: change.entityId,
        summary: change.summary,
        before: change.before ?? null,
        after: change.after ?? null,
      });
    },
  };
}
