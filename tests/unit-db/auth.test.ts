import { and, desc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Store } from '../../db/client';
import { activity, outbox, workItems } from '../../db/schema/activity';
import { companies } from '../../db/schema/companies';
import { passwordResets, people, sessions } from '../../db/schema/people';
import { actorOfSession } from '../../lib/auth/session';
import { hashToken } from '../../lib/auth/tokens';
import { acceptInvitation } from '../../lib/services/auth/accept-invitation';
import { forgotPassword } from '../../lib/services/auth/forgot-password';
import { getInvitation } from '../../lib/services/auth/get-invitation';
import { resetPassword } from '../../lib/services/auth/reset-password';
import { signIn } from '../../lib/services/auth/sign-in';
import { signInHints } from '../../lib/services/auth/sign-in-hints';
import { signOut } from '../../lib/services/auth/sign-out';
import { signUp } from '../../lib/services/auth/sign-up';
import { invitePerson } from '../../lib/services/people/invite-person';
import { listPeople } from '../../lib/services/people/list-people';
import { removePerson } from '../../lib/services/people/remove-person';
import { withdrawInvitation } from '../../lib/services/people/withdraw-invitation';
import { callVerb } from '../../lib/services/verb';
import { testBrowser } from '../support/public';
import { testStore } from '../support/store';

let store: Store;
beforeAll(async () => {
  store = await testStore();
});
afterAll(() => store.close());

const PASSWORD = 'gravel lantern nine';
let made = 0;

async function newCompany() {
  made += 1;
  const browser = testBrowser();
  const email = `owner${made}@levee${made}.example`;
  const result = await browser.ask(signUp, {
    companyName: `Levee Flatwork ${made}`,
    timeZone: 'America/Denver',
    name: 'Ida Brandt',
    email,
    password: PASSWORD,
  });
  expect(result).toMatchObject({ ok: true });
  const owner = await actorOf(browser);
  return { browser, email, owner };
}

async function actorOf(browser: { token(): string | null }, now = new Date()) {
  const actor = await actorOfSession(store.handle, browser.token() ?? '', now);
  if (!actor) throw new Error('nobody is signed in');
  return actor;
}

/** The link's token in the newest message to an address. */
async function mailedToken(to: string): Promise<string> {
  const [mail] = await store.handle
    .select({ text: outbox.text })
    .from(outbox)
    .where(eq(outbox.to, to))
    .orderBy(desc(outbox.createdAt), desc(outbox.id));
  const token = /\/(?:invite|reset-password)\/([\w-]+)/.exec(mail?.text ?? '')?.[1];
  if (!token) throw new Error('no link in the message');
  return token;
}

test('sign-up makes a company with one owner, signed in, and says so in the activity record', async () => {
  const { owner } = await newCompany();
  expect(owner).toMatchObject({ role: 'owner', name: 'Ida Brandt', seesPrices: true });
  const rows = await store.handle
    .select({ action: activity.action })
    .from(activity)
    .where(eq(activity.companyId, owner.companyId));
  expect(rows).toEqual([{ action: 'auth.signUp' }]);
});

test('of two sign-ups with one address at once one gets through and the other leaves no company', async () => {
  const before = await store.handle.select({ id: companies.id }).from(companies);
  const input = {
    companyName: 'Twice Flatwork',
    timeZone: 'America/Chicago',
    name: 'Twice',
    email: 'twice@levee.example',
    password: PASSWORD,
  };
  const results = await Promise.all([
    testBrowser().ask(signUp, input),
    testBrowser().ask(signUp, input),
  ]);
  expect(results.map((r) => r.ok).sort()).toEqual([false, true]);
  expect(results.find((r) => !r.ok)).toMatchObject({
    error: { code: 'conflict', issues: [{ path: 'email' }] },
  });
  const after = await store.handle.select({ id: companies.id }).from(companies);
  expect(after.length - before.length).toBe(1);
});

test('the session table holds the hash of the cookie and never the cookie', async () => {
  const { browser } = await newCompany();
  const token = browser.token() ?? '';
  const rows = await store.handle.select().from(sessions);
  expect(rows.some((row) => row.id === hashToken(token))).toBe(true);
  expect(JSON.stringify(rows)).not.toContain(token);
});

test('sign-in starts a new session, sign-out ends it on the server', async () => {
  const { email } = await newCompany();
  const browser = testBrowser();
  expect(
    await browser.ask(signIn, { email: ` ${email.toUpperCase()} `, password: PASSWORD }),
  ).toEqual({ ok: true, value: { next: '/' } });
  const first = browser.token() ?? '';
  await browser.ask(signIn, { email, password: PASSWORD });
  expect(browser.token()).not.toBe(first);
  expect(await actorOfSession(store.handle, first, new Date())).toBeNull();
  const second = browser.token() ?? '';
  await browser.ask(signOut, {});
  expect(browser.token()).toBeNull();
  expect(await actorOfSession(store.handle, second, new Date())).toBeNull();
});

test('an unknown address and a wrong password get the same answer', async () => {
  const { email } = await newCompany();
  const wrong = await testBrowser().ask(signIn, { email, password: 'wrong wrong wrong' });
  const unknown = await testBrowser().ask(signIn, {
    email: 'nobody@nowhere.example',
    password: 'wrong wrong wrong',
  });
  expect(wrong).toEqual(unknown);
  expect(wrong).toMatchObject({ ok: false, error: { code: 'notSignedIn' } });
});

test('the ninth attempt on an account from one address is refused, the right password too, and another address still gets in', async () => {
  const { email } = await newCompany();
  const guesser = testBrowser();
  for (let i = 0; i < 8; i += 1) {
    const result = await guesser.ask(signIn, { email, password: `guess number ${i}` });
    expect(result).toMatchObject({ ok: false, error: { code: 'notSignedIn' } });
  }
  const ninth = await guesser.ask(signIn, { email, password: PASSWORD });
  expect(ninth).toMatchObject({ ok: false, error: { code: 'tooMany' } });
  const elsewhere = await testBrowser().ask(signIn, { email, password: PASSWORD });
  expect(elsewhere.ok).toBe(true);
});

test('a session ends 90 days after it began, however much it is used', async () => {
  const { browser } = await newCompany();
  const day = 24 * 60 * 60 * 1000;
  const at = (days: number) => new Date(Date.now() + days * day);
  expect(await actorOfSession(store.handle, browser.token() ?? '', at(89))).not.toBeNull();
  expect(await actorOfSession(store.handle, browser.token() ?? '', at(91))).toBeNull();
  expect(await actorOfSession(store.handle, browser.token() ?? '', at(0))).toBeNull();
});

test('a session that nobody used for 14 days is over', async () => {
  const { browser } = await newCompany();
  await store.handle
    .update(sessions)
    .set({ expiresAt: new Date(Date.now() - 1000) })
    .where(eq(sessions.id, hashToken(browser.token() ?? '')));
  expect(await actorOfSession(store.handle, browser.token() ?? '', new Date())).toBeNull();
});

test('use moves the sliding limit on', async () => {
  const { browser } = await newCompany();
  const mine = eq(sessions.id, hashToken(browser.token() ?? ''));
  const soon = new Date(Date.now() + 60_000);
  await store.handle.update(sessions).set({ expiresAt: soon }).where(mine);
  await actorOf(browser);
  const [row] = await store.handle.select().from(sessions).where(mine);
  expect(row?.expiresAt.getTime()).toBeGreaterThan(soon.getTime() + 13 * 24 * 60 * 60 * 1000);
});

test('a reset link works once, ends every session, and is stored as a hash only', async () => {
  const { email, browser: oldDevice } = await newCompany();
  expect(await testBrowser().ask(forgotPassword, { email })).toEqual({
    ok: true,
    value: { done: true },
  });
  const token = await mailedToken(email);
  expect(JSON.stringify(await store.handle.select().from(passwordResets))).not.toContain(token);
  const browser = testBrowser();
  const reset = await browser.ask(resetPassword, { token, password: 'another gravel lantern' });
  expect(reset.ok).toBe(true);
  expect((await actorOf(browser)).email).toBe(email);
  expect(await actorOfSession(store.handle, oldDevice.token() ?? '', new Date())).toBeNull();
  const again = await testBrowser().ask(resetPassword, { token, password: 'yet another lantern' });
  expect(again).toMatchObject({ ok: false, error: { code: 'notFound' } });
  expect((await testBrowser().ask(signIn, { email, password: PASSWORD })).ok).toBe(false);
});

test('a reset link is over after an hour, and a newer one replaces it', async () => {
  const { email } = await newCompany();
  await testBrowser().ask(forgotPassword, { email });
  const first = await mailedToken(email);
  await testBrowser().ask(forgotPassword, { email });
  const second = await mailedToken(email);
  expect(second).not.toBe(first);
  const password = 'another gravel lantern';
  const replaced = await testBrowser().ask(resetPassword, { token: first, password });
  expect(replaced.ok).toBe(false);
  const later = { now: () => new Date(Date.now() + 61 * 60_000) };
  const late = await testBrowser(later).ask(resetPassword, { token: second, password });
  expect(late).toMatchObject({ ok: false, error: { code: 'notFound' } });
});

test('asking for a reset of an unknown address answers the same, as slowly, and writes nothing', async () => {
  const { email } = await newCompany();
  const timed = async (address: string) => {
    const start = performance.now();
    const result = await testBrowser().ask(forgotPassword, { email: address });
    return { result, ms: performance.now() - start };
  };
  const count = async () => (await store.handle.select({ id: outbox.id }).from(outbox)).length;
  const known = await timed(email);
  const before = await count();
  const unknown = await timed('nobody@nowhere.example');
  expect(await count()).toBe(before);
  expect(unknown.result).toEqual(known.result);
  expect(Math.min(known.ms, unknown.ms)).toBeGreaterThanOrEqual(299);
});

test('the fourth reset message within an hour is not written, and the answer does not tell', async () => {
  const { email } = await newCompany();
  const answers = [];
  for (let i = 0; i < 5; i += 1) {
    answers.push(await testBrowser().ask(forgotPassword, { email }));
  }
  expect(answers.every((answer) => answer.ok)).toBe(true);
  const mails = await store.handle
    .select({ id: outbox.id })
    .from(outbox)
    .where(and(eq(outbox.to, email), eq(outbox.kind, 'passwordReset')));
  expect(mails).toHaveLength(3);
});

test('an invited foreman joins once with the link; message and work item were written with it', async () => {
  const { owner } = await newCompany();
  const email = `crew${made}@levee.example`;
  const invited = await callVerb(invitePerson, owner, { email, name: 'Bo Reyes', role: 'foreman' });
  expect(invited.ok).toBe(true);
  const token = await mailedToken(email);
  const [mail] = await store.handle.select().from(outbox).where(eq(outbox.to, email));
  const work = await store.handle
    .select()
    .from(workItems)
    .where(eq(workItems.subjectId, mail?.id ?? ''));
  expect(work).toMatchObject([{ kind: 'sendMail', state: 'waiting' }]);
  const browser = testBrowser();
  expect(await browser.ask(getInvitation, { token })).toMatchObject({
    ok: true,
    value: { email, name: 'Bo Reyes', role: 'foreman' },
  });
  const joined = await browser.ask(acceptInvitation, {
    token,
    name: 'Bo Reyes',
    password: PASSWORD,
  });
  expect(joined.ok).toBe(true);
  expect(await actorOf(browser)).toMatchObject({
    role: 'foreman',
    companyId: owner.companyId,
    seesPrices: false,
    seesAllJobs: false,
  });
  const again = await testBrowser().ask(acceptInvitation, { token, name: 'X', password: PASSWORD });
  expect(again).toMatchObject({ ok: false, error: { code: 'notFound' } });
});

test('a withdrawn, a replaced and an expired invitation let nobody in', async () => {
  const { owner } = await newCompany();
  const invite = (email: string) =>
    callVerb(invitePerson, owner, { email, name: 'Bo', role: 'bookkeeper' });
  const tokenOf = async (email: string) => {
    await invite(email);
    return mailedToken(email);
  };
  const join = (token: string, clock?: { now(): Date }) =>
    testBrowser(clock).ask(acceptInvitation, { token, name: 'Bo', password: PASSWORD });

  const replaced = await tokenOf(`a${made}@levee.example`);
  await invite(`a${made}@levee.example`);
  expect((await join(replaced)).ok).toBe(false);

  const withdrawn = await tokenOf(`b${made}@levee.example`);
  const listed = await callVerb(listPeople, owner, {});
  const row = listed.ok && listed.value.invitations.find((i) => i.email.startsWith('b'));
  if (!row) throw new Error('the invitation is not listed');
  expect((await callVerb(withdrawInvitation, owner, { invitationId: row.id })).ok).toBe(true);
  expect((await join(withdrawn)).ok).toBe(false);

  const expired = await tokenOf(`c${made}@levee.example`);
  const eightDaysOn = { now: () => new Date(Date.now() + 8 * 24 * 60 * 60_000) };
  expect((await join(expired, eightDaysOn)).ok).toBe(false);
});

test('an invitation does not tell that the address has an account in another company', async () => {
  const other = await newCompany();
  const { owner } = await newCompany();
  const invited = await callVerb(invitePerson, owner, {
    email: other.email,
    name: 'Ida',
    role: 'owner',
  });
  expect(invited.ok).toBe(true);
  const token = await mailedToken(other.email);
  const joined = await testBrowser().ask(acceptInvitation, {
    token,
    name: 'I',
    password: PASSWORD,
  });
  expect(joined).toMatchObject({ ok: false, error: { code: 'conflict' } });
});

test('someone who was removed can be invited again and keeps the same records', async () => {
  const { owner } = await newCompany();
  const email = `back${made}@levee.example`;
  const join = async () => {
    await callVerb(invitePerson, owner, { email, name: 'Cy', role: 'foreman' });
    const browser = testBrowser();
    const token = await mailedToken(email);
    await browser.ask(acceptInvitation, { token, name: 'Cy', password: PASSWORD });
    return browser;
  };
  const first = await join();
  const { personId } = await actorOf(first);
  expect((await callVerb(removePerson, owner, { personId })).ok).toBe(true);
  expect(await actorOfSession(store.handle, first.token() ?? '', new Date())).toBeNull();
  const back = await join();
  expect((await actorOf(back)).personId).toBe(personId);
});

test.each([
  'password123',
  'P4ssw0rd!!',
  '1234567890',
  'aaaaaaaaaaaa',
  'WelcomeWelcome1',
  'qwertyuiop',
])('%s is refused as a password', async (password) => {
  made += 1;
  const result = await testBrowser().ask(signUp, {
    companyName: 'Guess Flatwork',
    timeZone: 'America/Chicago',
    name: 'Guess',
    email: `guess${made}@levee.example`,
    password,
  });
  expect(result).toMatchObject({
    ok: false,
    error: { code: 'invalid', issues: [{ path: 'password' }] },
  });
});

test('sign-ins are shown for a demo company only, and not where they are switched off', async () => {
  const none = await testBrowser().ask(signInHints, {});
  expect(none).toEqual({ ok: true, value: { demo: null } });
  const { owner, email } = await newCompany();
  await store.handle
    .update(companies)
    .set({ isDemo: true })
    .where(eq(companies.id, owner.companyId));
  expect(await testBrowser().ask(signInHints, {})).toMatchObject({
    ok: true,
    value: { demo: { people: [{ email, role: 'owner' }] } },
  });
  await store.handle
    .update(companies)
    .set({ isDemo: false })
    .where(eq(companies.id, owner.companyId));
});

test('no password, hash or token is in the activity record', async () => {
  const rows = JSON.stringify(await store.handle.select().from(activity));
  expect(rows).not.toContain(PASSWORD);
  expect(rows).not.toContain('$argon2');
  const hashes = await store.handle.select({ hash: people.passwordHash }).from(people);
  expect(hashes.every(({ hash }) => hash.startsWith('$argon2id$'))).toBe(true);
});
