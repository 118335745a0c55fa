import { eq } from 'drizzle-orm';
import type { Handle } from '../../db/client';
import { companies } from '../../db/schema/companies';
import type { Scope } from '../../db/tx';
import type { Actor } from '../auth/actor';
import type { Clock } from '../clock';
import type { Change } from './record';
import { writeActivity } from './record';

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
      const name = actor.via === 'accessKey' ? `${actor.name} (access key)` : actor.name;
      const who = { companyId: actor.companyId, id: actor.personId, name };
      await writeActivity(handle, who, clock.now(), change);
    },
  };
}
