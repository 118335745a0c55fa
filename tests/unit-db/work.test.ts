import { createServer, type IncomingHttpHeaders } from 'node:http';
import type { AddressInfo } from 'node:net';
import { eq } from 'drizzle-orm';
import { afterAll, afterEach, beforeAll, beforeEach, expect, test } from 'vitest';
import type { Store } from '../../db/client';
import { outbox, workItems } from '../../db/schema/activity';
import { newId } from '../../lib/ids';
import { invitationMail, orderMail } from '../../lib/mail/templates';
import { writeMail } from '../../lib/mail/write-mail';
import { getMail } from '../../lib/services/outbox/get-mail';
import { callVerb } from '../../lib/services/verb';
import { backOffMs, claimNext, freeAll } from '../../lib/work/queue';
import { sendMail } from '../../lib/work/send-mail';
import type { WorkItem } from '../../lib/work/work-item';
import { GiveUp } from '../../lib/work/work-item';
import { doNext, startWorker } from '../../lib/work/worker';
import { testCompany } from '../support/company';
import { testStore } from '../support/store';

interface Sent {
  readonly headers: IncomingHttpHeaders;
  readonly body: Record<string, unknown>;
}

let store: Store;
/** A stand-in for the mail service: keeps what it gets and answers as the test says. */
let answer: { status: number; body: unknown };
const got: Sent[] = [];
const service = createServer((request, response) => {
  let text = '';
  request.on('data', (part) => {
    text += part;
  });
  request.on('end', () => {
    got.push({ headers: request.headers, body: JSON.parse(text) });
    response.writeHead(answer.status, { 'content-type': 'application/json' });
    response.end(JSON.stringify(answer.body));
  });
});

beforeAll(async () => {
  store = await testStore();
  await new Promise<void>((resolve) => service.listen(0, '127.0.0.1', resolve));
});
afterAll(async () => {
  await store.close();
  await new Promise((resolve) => service.close(resolve));
});
beforeEach(async () => {
  await store.handle.delete(workItems);
  got.length = 0;
  answer = { status: 200, body: { id: 'provider-1' } };
  process.env.RESEND_API_KEY = 're_test';
  process.env.RESEND_BASE_URL = `http://127.0.0.1:${(service.address() as AddressInfo).port}`;
});
afterEach(() => {
  delete process.env.RESEND_API_KEY;
  delete process.env.RESEND_BASE_URL;
});

const START = new Date('2026-06-14T12:00:00Z');
const at = (ms: number) => ({ now: () => new Date(START.getTime() + ms) });

async function invitation() {
  const { companyId, owner } = await testCompany(store);
  const mail = invitationMail({
    companyName: 'Levee\r\nBcc: everyone@levee.example',
    invitedBy: 'Ida',
    name: 'Bo',
    role: 'foreman',
    link: 'http://localhost:3000/invite/secret-token-of-the-link',
    days: 7,
  });
  const scope = { companyId, handle: store.handle };
  const id = await writeMail({ scope, clock: at(0) }, { ...mail, to: 'bo@levee.example' });
  const read = async () => {
    const result = await callVerb(getMail, owner, { mailId: id });
    if (!result.ok) throw new Error(result.error.message);
    return result.value;
  };
  return { id, companyId, read };
}

const work = async (subjectId: string) => {
  const [row] = await store.handle
    .select()
    .from(workItems)
    .where(eq(workItems.subjectId, subjectId));
  return row;
};

test('a message goes out once, under its own id, without a header of its own making', async () => {
  const { id, read } = await invitation();
  expect(await doNext(store, at(0), { sendMail })).toBe(true);
  expect(await doNext(store, at(0), { sendMail })).toBe(false);
  expect(got).toHaveLength(1);
  expect(got[0]?.headers['idempotency-key']).toBe(id);
  expect(got[0]?.body).toMatchObject({
    to: 'bo@levee.example',
    subject: 'Levee Bcc: everyone@levee.example invites you to Strikeoff',
  });
  expect(got[0]?.body.text).toContain('/invite/secret-token-of-the-link');
  expect(await read()).toMatchObject({ state: 'sent', sentAt: START.toISOString(), error: null });
});

test('once sent, the owner’s copy holds no link that opens the account', async () => {
  const { read } = await invitation();
  expect((await read()).text).toContain('secret-token-of-the-link');
  await doNext(store, at(0), { sendMail });
  expect((await read()).text).not.toContain('secret-token-of-the-link');
});

test('a busy mail service is asked again later and the outbox says why', async () => {
  const { id, read } = await invitation();
  answer = { status: 503, body: { statusCode: 503, name: 'x', message: 'Come back later' } };
  await doNext(store, at(0), { sendMail });
  expect(await read()).toMatchObject({ state: 'waiting', error: 'Come back later' });
  expect(await doNext(store, at(backOffMs(1) - 1), { sendMail })).toBe(false);
  answer = { status: 200, body: { id: 'provider-2' } };
  expect(await doNext(store, at(backOffMs(1)), { sendMail })).toBe(true);
  expect(await read()).toMatchObject({ state: 'sent', error: null });
  expect(await work(id)).toMatchObject({ state: 'done', attempts: 2, lastError: null });
});

test('a message that the service refuses is not sent again', async () => {
  const { read } = await invitation();
  answer = { status: 422, body: { statusCode: 422, name: 'x', message: 'No such domain' } };
  await doNext(store, at(0), { sendMail });
  expect(await read()).toMatchObject({ state: 'failed', error: 'No such domain' });
  expect(await doNext(store, at(24 * 60 * 60_000), { sendMail })).toBe(false);
});

test('without a mail service the message is kept for the owner', async () => {
  delete process.env.RESEND_API_KEY;
  const { read } = await invitation();
  await doNext(store, at(0), { sendMail });
  const mail = await read();
  expect(mail).toMatchObject({ state: 'kept', sentAt: null });
  expect(mail.text).toContain('secret-token-of-the-link');
  expect(got).toHaveLength(0);
});

test('a message rolled back with its transaction is never sent', async () => {
  const { companyId } = await testCompany(store);
  const to = 'nobody@levee.example';
  await expect(
    store.handle.transaction(async (handle) => {
      const scope = { companyId, handle: handle as unknown as Store['handle'] };
      const mail = { kind: 'order' as const, subject: 's', text: 't', to };
      await writeMail({ scope, clock: at(0) }, mail);
      throw new Error('undone');
    }),
  ).rejects.toThrow('undone');
  expect(await doNext(store, at(0), { sendMail })).toBe(false);
  expect(await store.handle.select().from(outbox).where(eq(outbox.to, to))).toEqual([]);
});

test('work that fails every time is given up after six tries', async () => {
  const { id } = await invitation();
  let tries = 0;
  const handlers = {
    sendMail: async () => {
      tries += 1;
      throw new Error(`no luck ${tries}`);
    },
  };
  for (let hour = 0; hour < 12; hour += 1) await doNext(store, at(hour * 3_600_000), handlers);
  expect(tries).toBe(6);
  expect(await work(id)).toMatchObject({ state: 'failed', attempts: 6, lastError: 'no luck 6' });
});

test('work that says trying again can’t help is given up at once', async () => {
  const { id } = await invitation();
  const handlers = {
    sendMail: async () => {
      throw new GiveUp('no photo');
    },
  };
  await doNext(store, at(0), handlers);
  expect(await work(id)).toMatchObject({ state: 'failed', attempts: 1, lastError: 'no photo' });
});

test('an item is taken by one worker, again when its lease is over, and at once after a restart', async () => {
  const { id } = await invitation();
  const claim = (ms: number) => claimNext(store.handle, ['sendMail'], at(ms).now());
  const taken = await Promise.all([claim(0), claim(0), claim(0)]);
  expect(taken.filter((item) => item?.subjectId === id)).toHaveLength(1);
  expect(await claim(5 * 60_000)).toBeNull();
  expect(await claim(5 * 60_000 + 1)).toMatchObject({ subjectId: id, attempt: 2 });
  await freeAll(store.handle);
  expect(await claim(0)).toMatchObject({ subjectId: id, attempt: 3 });
});

test('an item that ends the server every time is given up and not tried a seventh time', async () => {
  const { id } = await invitation();
  for (let i = 0; i < 6; i += 1) {
    await claimNext(store.handle, ['sendMail'], START);
    await freeAll(store.handle);
  }
  let tried = false;
  const handlers = {
    sendMail: async () => {
      tried = true;
    },
  };
  await doNext(store, at(0), handlers);
  expect(tried).toBe(false);
  expect(await work(id)).toMatchObject({ state: 'failed' });
});

test('work of a kind that nobody does stays waiting', async () => {
  const { companyId } = await testCompany(store);
  const subjectId = newId();
  await store.handle
    .insert(workItems)
    .values({ id: newId(), companyId, kind: 'readPhoto', subjectId, runAfter: START });
  expect(await doNext(store, at(0), { sendMail })).toBe(false);
  expect(await work(subjectId)).toMatchObject({ state: 'waiting', attempts: 0 });
});

test('the worker does what is there, one after the other, and stopping waits for the one in hand', async () => {
  await invitation();
  await invitation();
  const log: string[] = [];
  let begun = () => {};
  const hasBegun = new Promise<void>((resolve) => {
    begun = resolve;
  });
  const handlers = {
    sendMail: async (item: WorkItem) => {
      log.push(`begin ${item.attempt}`);
      begun();
      await new Promise((resolve) => setTimeout(resolve, 50));
      log.push('end');
    },
  };
  const worker = startWorker({ store, clock: at(0), handlers, idleMs: 5 });
  await hasBegun;
  await worker.stop();
  expect(log).toEqual(['begin 1', 'end']);
  const second = startWorker({ store, clock: at(0), handlers, idleMs: 5 });
  await expect.poll(() => log.length).toBe(4);
  await second.stop();
});

test('an order to dispatch says what, where and when, and that a change replaces what was sent', () => {
  const facts = {
    companyName: 'Levee Flatwork',
    orderNumber: 'L-12',
    version: 2,
    supplierName: 'Oxbow Ready-Mix',
    jobName: 'Mill Street lofts',
    jobAddress: '12 Mill Street',
    pourDay: 'Tuesday, 16 Jun 2026',
    firstTruck: '6:30 am',
    spacingMinutes: 12,
    lines: ['42.00 yd³ of 4000AE'],
    notes: 'Gate code at the trailer',
    orderedBy: 'Ida Brandt',
    answerTo: 'ida@levee.example',
  };
  const mail = orderMail(facts);
  expect(mail.subject).toBe('Changed order L-12 for Tuesday, 16 Jun 2026, Levee Flatwork');
  expect(mail.text).toContain('This replaces what we sent before for order L-12.');
  expect(mail.text).toContain('First truck on site: 6:30 am\nTruck spacing: 12 minutes');
  expect(mail.text).toContain('  - 42.00 yd³ of 4000AE');
  expect(orderMail({ ...facts, version: 1 }).subject).toMatch(/^Order L-12/);
});
