import { and, eq } from 'drizzle-orm';
import { DEMO_PASSWORD } from '../../lib/auth/demo';
import { hashPassword } from '../../lib/auth/password';
import type { Clock } from '../../lib/clock';
import type { CompanyId } from '../../lib/domain/ids';
import { writeActivity } from '../../lib/services/record';
import type { Handle, Store } from '../client';
import { activity } from '../schema/activity';
import { companies } from '../schema/companies';
import { demoIds, insertDemoRecords } from './demo-records';
import { sendPhotos } from './photographed';
import { settlePastMonths } from './settle-months';

const READY = 'demo.ready';

/** Loads the demo company's records, whole or not at all. */
export async function seedDemo(store: Store, clock: Clock): Promise<void> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  await store.handle.transaction((handle) =>
    insertDemoRecords(handle as unknown as Handle, demoIds(), passwordHash, clock),
  );
}

async function isReady({ handle }: Store, companyId: string): Promise<boolean> {
  const rows = await handle
    .select({ id: activity.id })
    .from(activity)
    .where(and(eq(activity.companyId, companyId), eq(activity.action, READY)))
    .limit(1);
  return rows.length > 0;
}

/**
 * Has the demo's people take in and settle their past months and send their photographs, as
 * anyone would. Every step may be repeated, so a server that was killed on the way goes on here;
 * nothing is done once all of it is, or where there is no demo company.
 */
export async function finishDemo(store: Store, clock: Clock): Promise<void> {
  const [company] = await store.handle
    .select({ id: companies.id })
    .from(companies)
    .where(eq(companies.isDemo, true))
    .limit(1);
  if (!company || (await isReady(store, company.id))) return;
  await settlePastMonths(store, company.id);
  await sendPhotos(store, company.id, clock);
  await writeActivity(
    store.handle,
    { companyId: company.id as CompanyId, id: null, name: 'Strikeoff' },
    clock.now(),
    {
      action: READY,
      entity: 'company',
      entityId: company.id,
      summary: 'The demo company is ready to be tried',
    },
  );
}
