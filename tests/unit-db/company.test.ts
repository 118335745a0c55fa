import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Store } from '../../db/client';
import { activity } from '../../db/schema/activity';
import { people } from '../../db/schema/people';
import type { Actor } from '../../lib/auth/actor';
import { hashPassword } from '../../lib/auth/password';
import { actorOfSession, startSession } from '../../lib/auth/session';
import { accessKeyActor } from '../../lib/http/request-actor';
import { changePassword } from '../../lib/services/account/change-password';
import { endOtherSessions } from '../../lib/services/account/end-other-sessions';
import { getAccount } from '../../lib/services/account/get-account';
import { updateAccount } from '../../lib/services/account/update-account';
import { listActivity } from '../../lib/services/activity/list-activity';
import { getCompany } from '../../lib/services/company/get-company';
import { updateCompany } from '../../lib/services/company/update-company';
import { issueKey } from '../../lib/services/keys/issue-key';
import { listKeys } from '../../lib/services/keys/list-keys';
import { revokeKey } from '../../lib/services/keys/revoke-key';
import { getMail } from '../../lib/services/outbox/get-mail';
import { listOutbox } from '../../lib/services/outbox/list-outbox';
import { changeRole } from '../../lib/services/people/change-role';
import { invitePerson } from '../../lib/services/people/invite-person';
import { listPeople } from '../../lib/services/people/list-people';
import { removePerson } from '../../lib/services/people/remove-person';
import { callVerb } from '../../lib/services/verb';
import { testCompany } from '../support/company';
import { testStore } from '../support/store';

let store: Store;
beforeAll(async () => {
  store = await testStore();
});
afterAll(() => store.close());

const settings = {
  name: 'Levee Flatwork',
  timeZone: 'America/Denver',
  clock: '24' as const,
  foremenSeePrices: false,
  foremenSeeAllJobs: true,
  tolerances: { yardsDiffer: { absolute: '5.00', percent: '0.5' } },
};

/** The same person, with a session of his own in the table. */
async function signedIn(actor: Actor): Promise<Actor & { token: string }> {
  const token = await startSession(store.handle, actor.personId, new Date());
  const found = await actorOfSession(store.handle, token, new Date());
  if (!found) throw new Error('the session just started is missing');
  return { ...found, token };
}

const isLive = async (token: string) =>
  (await actorOfSession(store.handle, token, new Date())) !== null;

test('settings change as a whole and the record keeps what they were', async () => {
  const { owner } = await testCompany(store);
  expect((await callVerb(updateCompany, owner, settings)).ok).toBe(true);
  expect(await callVerb(getCompany, owner, {})).toMatchObject({ ok: true, value: settings });
  const recorded = await callVerb(listActivity, owner, { entity: 'company' });
  expect(recorded.ok && recorded.value.rows).toMatchObject([
    { before: { name: 'Test Flatwork', tolerances: {} }, after: settings },
  ]);
});

test.each([
  [{ noSuchKind: { absolute: '5', percent: '1' } }, 'tolerances'],
  [{ yardsDiffer: { absolute: '-5', percent: '1' } }, 'tolerances.yardsDiffer.absolute'],
  [{ yardsDiffer: { absolute: '5.001', percent: '1' } }, 'tolerances.yardsDiffer.absolute'],
  [{ yardsDiffer: { absolute: '5', percent: '100.01' } }, 'tolerances.yardsDiffer.percent'],
])('tolerances %j are refused at %s', async (tolerances, path) => {
  const { owner } = await testCompany(store);
  const result = await callVerb(updateCompany, owner, { ...settings, tolerances });
  expect(!result.ok && result.error.issues[0]?.path).toBe(path);
});

test('an unknown time zone is refused', async () => {
  const { owner } = await testCompany(store);
  for (const timeZone of ['Mars/Olympus', '+05:00', '']) {
    const result = await callVerb(updateCompany, owner, { ...settings, timeZone });
    expect(!result.ok && result.error.issues[0]?.path).toBe('timeZone');
  }
});

test('the last owner can neither be removed nor lose the role', async () => {
  const { owner, bookkeeper } = await testCompany(store);
  const { personId } = owner;
  for (const result of [
    await callVerb(removePerson, owner, { personId }),
    await callVerb(changeRole, owner, { personId, role: 'foreman' }),
  ]) {
    expect(result).toMatchObject({ ok: false, error: { code: 'conflict' } });
  }
  await callVerb(changeRole, owner, { personId: bookkeeper.personId, role: 'owner' });
  expect((await callVerb(changeRole, owner, { personId, role: 'foreman' })).ok).toBe(true);
});

test('two owners who demote each other at the same moment leave one owner', async () => {
  const { owner, bookkeeper, companyId } = await testCompany(store);
  await callVerb(changeRole, owner, { personId: bookkeeper.personId, role: 'owner' });
  const second: Actor = { ...bookkeeper, role: 'owner' };
  const results = await Promise.all([
    callVerb(changeRole, owner, { personId: second.personId, role: 'foreman' }),
    callVerb(changeRole, second, { personId: owner.personId, role: 'foreman' }),
  ]);
  expect(results.filter((result) => result.ok)).toHaveLength(1);
  const owners = await store.handle
    .select({ id: people.id })
    .from(people)
    .where(and(eq(people.companyId, companyId), eq(people.role, 'owner')));
  expect(owners).toHaveLength(1);
});

test('a new role ends the person’s sessions, and so does removal', async () => {
  const { owner, bookkeeper, foreman } = await testCompany(store);
  const demoted = await signedIn(bookkeeper);
  const removed = await signedIn(foreman);
  await callVerb(changeRole, owner, { personId: bookkeeper.personId, role: 'foreman' });
  await callVerb(removePerson, owner, { personId: foreman.personId });
  expect([await isLive(demoted.token), await isLive(removed.token)]).toEqual([false, false]);
  const listed = await callVerb(listPeople, owner, {});
  expect(listed.ok && listed.value.people.map((person) => [person.role, person.isYou])).toEqual([
    ['foreman', false],
    ['owner', true],
  ]);
});

test('the same role again changes nothing and is not recorded', async () => {
  const { owner, foreman, companyId } = await testCompany(store);
  const live = await signedIn(foreman);
  const { personId } = foreman;
  expect((await callVerb(changeRole, owner, { personId, role: 'foreman' })).ok).toBe(true);
  expect(await isLive(live.token)).toBe(true);
  const rows = await store.handle.select().from(activity).where(eq(activity.companyId, companyId));
  expect(rows).toEqual([]);
});

test('a colleague is not invited again', async () => {
  const { owner, foreman } = await testCompany(store);
  const { email } = foreman;
  const result = await callVerb(invitePerson, owner, { email, name: 'Again', role: 'foreman' });
  expect(result).toMatchObject({
    ok: false,
    error: { code: 'conflict', issues: [{ path: 'email' }] },
  });
});

test('an access key works as a bookkeeper until it is revoked, and is stored as a hash only', async () => {
  const { owner, companyId } = await testCompany(store);
  const issued = await callVerb(issueKey, owner, { name: 'Nightly export' });
  if (!issued.ok) throw new Error(issued.error.message);
  const { key, row } = issued.value;
  expect(await accessKeyActor(`Bearer ${key}`)).toMatchObject({
    companyId,
    role: 'bookkeeper',
    via: 'accessKey',
    name: 'Nightly export',
  });
  const listed = await callVerb(listKeys, owner, {});
  expect(listed.ok && listed.value.rows[0]?.lastUsedAt).not.toBeNull();
  expect(JSON.stringify(listed)).not.toContain(key);
  const recorded = await callVerb(listActivity, owner, { entity: 'accessKey' });
  expect(JSON.stringify(recorded)).not.toContain(key);
  await callVerb(revokeKey, owner, { keyId: row.id });
  expect(await accessKeyActor(`Bearer ${key}`)).toBeNull();
  expect(await accessKeyActor(`Bearer ${key.slice(0, -1)}x`)).toBeNull();
});

test('a key ends with the ownership of whoever issued it', async () => {
  const { owner, bookkeeper } = await testCompany(store);
  await callVerb(changeRole, owner, { personId: bookkeeper.personId, role: 'owner' });
  const issued = await callVerb(issueKey, owner, { name: 'Nightly export' });
  if (!issued.ok) throw new Error(issued.error.message);
  const second: Actor = { ...bookkeeper, role: 'owner' };
  await callVerb(changeRole, second, { personId: owner.personId, role: 'foreman' });
  expect(await accessKeyActor(`Bearer ${issued.value.key}`)).toBeNull();
});

test('an access key gets at nobody’s account', async () => {
  const { owner } = await testCompany(store);
  const script: Actor = { ...owner, role: 'bookkeeper', via: 'accessKey', sessionId: null };
  const input = { currentPassword: 'x', newPassword: 'gravel lantern nine' };
  for (const result of [
    await callVerb(getAccount, script, {}),
    await callVerb(updateAccount, script, { name: 'X', locale: 'en' }),
    await callVerb(changePassword, script, input),
    await callVerb(endOtherSessions, script, {}),
  ]) {
    expect(result).toMatchObject({ ok: false, error: { code: 'notAllowed' } });
  }
});

test('a new password needs the current one, signs the other devices out and keeps this one', async () => {
  const { foreman } = await testCompany(store);
  const passwordHash = await hashPassword('gravel lantern nine');
  await store.handle.update(people).set({ passwordHash }).where(eq(people.id, foreman.personId));
  const here = await signedIn(foreman);
  const there = await signedIn(foreman);
  const newPassword = 'another gravel lantern';
  const wrong = await callVerb(changePassword, here, { currentPassword: 'no', newPassword });
  expect(wrong).toMatchObject({ ok: false, error: { issues: [{ path: 'currentPassword' }] } });
  const input = { currentPassword: 'gravel lantern nine', newPassword };
  expect(await callVerb(changePassword, here, input)).toEqual({
    ok: true,
    value: { endedSessions: 1 },
  });
  expect([await isLive(here.token), await isLive(there.token)]).toEqual([true, false]);
  expect((await callVerb(changePassword, here, input)).ok).toBe(false);
});

test('the current password can be guessed eight times in a quarter of an hour', async () => {
  const { foreman } = await testCompany(store);
  const passwordHash = await hashPassword('gravel lantern nine');
  await store.handle.update(people).set({ passwordHash }).where(eq(people.id, foreman.personId));
  const guess = (currentPassword: string) =>
    callVerb(changePassword, foreman, { currentPassword, newPassword: 'another gravel lantern' });
  for (let i = 0; i < 8; i += 1) {
    expect(await guess(`guess ${i}`)).toMatchObject({ ok: false, error: { code: 'invalid' } });
  }
  expect(await guess('gravel lantern nine')).toMatchObject({
    ok: false,
    error: { code: 'tooMany' },
  });
});

test('the account lists its devices, and the others can be signed out', async () => {
  const { foreman } = await testCompany(store);
  const here = await signedIn(foreman);
  await signedIn(foreman);
  const own = await callVerb(getAccount, here, {});
  expect(own.ok && own.value.sessions.map((session) => session.isThisOne)).toEqual([true, false]);
  const ended = await callVerb(endOtherSessions, here, {});
  expect(ended).toEqual({ ok: true, value: { endedSessions: 1 } });
  const after = await callVerb(updateAccount, here, { name: 'Luz', locale: 'es' });
  expect(after).toMatchObject({ ok: true, value: { name: 'Luz', locale: 'es', sessions: [{}] } });
});

test('the outbox shows the company’s own messages, newest first, by state and text', async () => {
  const { owner } = await testCompany(store);
  const { owner: stranger } = await testCompany(store);
  for (const [i, name] of ['Ann', 'Bea'].entries()) {
    const clock = { now: () => new Date(Date.now() + i * 1000) };
    const email = `${name}${owner.companyId}@levee.example`;
    await callVerb(invitePerson, owner, { email, name, role: 'foreman' }, { clock });
  }
  const listed = await callVerb(listOutbox, owner, {});
  if (!listed.ok) throw new Error(listed.error.message);
  expect(listed.value.rows.map((row) => [row.to.slice(0, 3), row.state])).toEqual([
    ['bea', 'waiting'],
    ['ann', 'waiting'],
  ]);
  const found = await callVerb(listOutbox, owner, { search: 'ANN', state: 'waiting', limit: 1 });
  expect(found).toMatchObject({ ok: true, value: { total: 1, rows: [{ kind: 'invitation' }] } });
  const sent = await callVerb(listOutbox, owner, { state: 'sent' });
  expect(sent).toMatchObject({ ok: true, value: { total: 0, rows: [] } });
  const mailId = listed.value.rows[0]?.id ?? '';
  const mail = await callVerb(getMail, owner, { mailId });
  expect(mail.ok && mail.value.text).toContain('http://localhost');
  expect(await callVerb(getMail, stranger, { mailId })).toMatchObject({
    ok: false,
    error: { code: 'notFound' },
  });
});

test('activity is filtered by the company’s own days', async () => {
  const { owner } = await testCompany(store);
  // Half past eleven at night in Chicago is the next day in UTC.
  const clock = { now: () => new Date('2026-06-15T04:30:00Z') };
  await callVerb(updateCompany, owner, { ...settings, timeZone: 'America/Chicago' }, { clock });
  const on = async (day: string) => {
    const listed = await callVerb(listActivity, owner, { from: day, to: day });
    return listed.ok && listed.value.total;
  };
  expect([await on('2026-06-13'), await on('2026-06-14'), await on('2026-06-15')]).toEqual([
    0, 1, 0,
  ]);
});
