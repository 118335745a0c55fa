import { DEMO_PASSWORD } from '../../lib/auth/demo';
import { hashPassword } from '../../lib/auth/password';
import type { Clock } from '../../lib/clock';
import type { Handle, Store } from '../client';
import { demoIds, insertDemoRecords } from './demo-records';

/** Loads the demo company, whole or not at all: a server that is killed on the way starts over. */
export async function seedDemo(store: Store, clock: Clock): Promise<void> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  await store.handle.transaction((handle) =>
    insertDemoRecords(handle as unknown as Handle, demoIds(), passwordHash, clock),
  );
}
