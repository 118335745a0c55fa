import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Store } from '../../db/client';
import { passwordResets, sessions } from '../../db/schema/people';
import { rateLimits } from '../../db/schema/rate-limits';
import { sweep } from '../../lib/work/maintenance';
import { testCompany } from '../support/company';
import { testStore } from '../support/store';

let store: Store;
beforeAll(async () => {
  store = await testStore();
});
afterAll(() => store.close());

const NOW = new Date('2026-06-14T12:00:00Z');
const PAST = new Date(NOW.getTime() - 1000);
const AHEAD = new Date(NOW.getTime() + 1000);

test('what is over is swept away and what still counts stays', async () => {
  const { owner } = await testCompany(store);
  const { personId } = owner;
  await store.handle.insert(sessions).values([
    { id: 'over', userId: personId, expiresAt: PAST },
    { id: 'live', userId: personId, expiresAt: AHEAD },
  ]);
  await store.handle.insert(passwordResets).values([
    { tokenHash: 'over', personId, expiresAt: PAST },
    { tokenHash: 'used', personId, expiresAt: AHEAD, usedAt: PAST },
    { tokenHash: 'live', personId, expiresAt: AHEAD },
  ]);
  await store.handle.insert(rateLimits).values([
    { key: 'over', points: 9, expire: PAST },
    { key: 'live', points: 9, expire: AHEAD },
  ]);
  await sweep(store, NOW);
  const left = {
    sessions: (await store.handle.select().from(sessions)).map((row) => row.id),
    resets: (await store.handle.select().from(passwordResets)).map((row) => row.tokenHash),
    counts: (await store.handle.select().from(rateLimits)).map((row) => row.key),
  };
  expect(left).toEqual({ sessions: ['live'], resets: ['live'], counts: ['live'] });
});
