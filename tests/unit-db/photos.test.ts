import { randomUUID } from 'node:crypto';
import { count, eq } from 'drizzle-orm';
import sharp from 'sharp';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import type { Store } from '../../db/client';
import { workItems } from '../../db/schema/activity';
import { photos, tickets } from '../../db/schema/tickets';
import type { ReadFailure, TicketReading } from '../../importers/ocr/reading';
import type { Actor } from '../../lib/auth/actor';
import { systemClock } from '../../lib/clock';
import type { Result } from '../../lib/domain/result';
import { fail, ok } from '../../lib/domain/result';
import { getPhoto } from '../../lib/services/photos/get-photo';
import { getReading } from '../../lib/services/photos/get-reading';
import { uploadPhoto } from '../../lib/services/photos/upload-photo';
import { getPourDayPlacement } from '../../lib/services/pour-day/get-pour-day-placement';
import { attachTicket } from '../../lib/services/tickets/attach-ticket';
import { confirmTicket } from '../../lib/services/tickets/confirm-ticket';
import { createTicket } from '../../lib/services/tickets/create-ticket';
import { getTicket } from '../../lib/services/tickets/get-ticket';
import { callVerb } from '../../lib/services/verb';
import { readPhotoHandler } from '../../lib/work/read-photo';
import { doNext } from '../../lib/work/worker';
import { type TestCompany, testCompany } from '../support/company';
import { type TestPour, testPicture, testPour, ticketInput } from '../support/pour';
import { temporaryFolder, testStore } from '../support/store';

const folder = temporaryFolder();
let store: Store;
let company: TestCompany;
let pour: TestPour;
beforeAll(async () => {
  process.env.DATA_DIR = folder.path;
  store = await testStore();
});
afterAll(async () => {
  await store.close();
  folder.remove();
});
beforeEach(async () => {
  await store.handle.update(workItems).set({ state: 'done' });
  company = await testCompany(store);
  pour = await testPour(store, company);
});

const field = (value: string, doubtful = false) => ({
  value,
  doubtful,
  confidence: doubtful ? 0.5 : 0.99,
  box: { x: 10, y: 10, width: 50, height: 20 },
});
const reading: TicketReading = {
  fields: { ticketNumber: field('558142'), quantityYd3: field('10.00'), truck: field('1B7', true) },
  notes: [],
  image: { widthPx: 320, heightPx: 480 },
};

function sent(actor: Actor, bytes: Uint8Array, over: object = {}) {
  const { placementId } = pour;
  const input = { placementId, clientId: randomUUID(), fileName: 'photo.jpg', bytes, ...over };
  return callVerb(uploadPhoto, actor, input);
}

async function uploaded(over: object = {}) {
  const answer = await sent(company.foreman, await testPicture(), over);
  if (!answer.ok) throw new Error(answer.error.message);
  return answer.value;
}

function work(result: Result<TicketReading, ReadFailure>): Promise<boolean> {
  return doNext(store, systemClock, { readPhoto: readPhotoHandler(async () => result) });
}

async function ticketCount() {
  const [row] = await store.handle
    .select({ total: count() })
    .from(tickets)
    .where(eq(tickets.companyId, company.companyId));
  return row?.total;
}

test('the same upload three times, twice at once, is one ticket, one photo and one reading', async () => {
  const bytes = await testPicture();
  const clientId = randomUUID();
  const once = () => sent(company.foreman, bytes, { clientId });
  const answers = [...(await Promise.all([once(), once()])), await once()];
  expect(answers.map((answer) => answer.ok)).toEqual([true, true, true]);
  expect(new Set(answers.map((answer) => answer.ok && answer.value.ticketId)).size).toBe(1);
  expect(answers.at(-1)).toMatchObject({ ok: true, value: { repeated: true } });
  expect(await ticketCount()).toBe(1);
  const items = await store.handle
    .select()
    .from(workItems)
    .where(eq(workItems.companyId, company.companyId));
  expect(items).toHaveLength(1);
});

test('the same picture chosen again opens its ticket; for another placement it is refused', async () => {
  const bytes = await testPicture();
  const first = await sent(company.foreman, bytes);
  const again = await sent(company.foreman, bytes);
  expect(again.ok && again.value).toMatchObject({
    repeated: true,
    ticketId: first.ok ? first.value.ticketId : '',
  });
  const other = await testPour(store, company);
  const elsewhere = await sent(company.foreman, bytes, { placementId: other.placementId });
  expect(!elsewhere.ok && elsewhere.error.code).toBe('conflict');
  expect(await ticketCount()).toBe(1);
});

test('a finished reading is offered with what is doubtful, and counts only when confirmed', async () => {
  const { ticketId, photoId } = await uploaded();
  const waiting = await callVerb(getReading, company.foreman, { photoId });
  expect(waiting.ok && waiting.value).toMatchObject({ state: 'waiting', suggestion: null });
  expect(await work(ok(reading))).toBe(true);
  const read = await callVerb(getReading, company.foreman, { photoId });
  expect(read.ok && read.value).toMatchObject({
    state: 'read',
    suggestion: {
      values: { number: '558142', supplierId: pour.supplierId, date: '2026-09-03' },
      orderId: pour.orderId,
      doubtful: ['truck'],
    },
  });
  const { placementId } = pour;
  const before = await callVerb(getPourDayPlacement, company.foreman, { placementId });
  expect(before.ok && before.value).toMatchObject({
    inYd3: '0.00',
    toCheck: 1,
    toCheckYd3: '10.00',
    loads: [{ reading: { number: '558142', doubtful: 1 } }],
  });
  const confirmed = await callVerb(confirmTicket, company.foreman, {
    ticketId,
    version: 1,
    ...ticketInput(pour),
  });
  expect(confirmed.ok && confirmed.value.status).toBe('confirmed');
  const after = await callVerb(getPourDayPlacement, company.foreman, { placementId });
  expect(after.ok && after.value).toMatchObject({ inYd3: '10.00', toCheck: 0, toCheckYd3: '0.00' });
});

test('a confirmation whose answer was lost can be sent again; another person’s is refused', async () => {
  const { ticketId } = await uploaded();
  const input = { ticketId, version: 1, ...ticketInput(pour) };
  const first = await callVerb(confirmTicket, company.foreman, input);
  const again = await callVerb(confirmTicket, company.foreman, input);
  expect(first.ok && again.ok && again.value.version).toBe(2);
  const other = await callVerb(confirmTicket, company.bookkeeper, { ...input, number: '9' });
  expect(!other.ok && other.error.message).toContain('Test foreman has confirmed');
});

test('a reading that comes after a person’s values changes none of them', async () => {
  const { ticketId } = await uploaded();
  await callVerb(confirmTicket, company.foreman, {
    ticketId,
    version: 1,
    ...ticketInput(pour, '777'),
    quantityYd3: '9.25',
  });
  expect(await work(ok(reading))).toBe(true);
  const now = await callVerb(getTicket, company.foreman, { ticketId });
  expect(now.ok && now.value).toMatchObject({
    number: '777',
    quantityYd3: '9.25',
    version: 2,
    photos: [{ reading: { state: 'read' } }],
  });
});

test('a reading repeated after a crash does not replace the finished one', async () => {
  const { photoId } = await uploaded();
  await work(ok(reading));
  await store.handle
    .update(workItems)
    .set({ state: 'running', leaseUntil: new Date(0) })
    .where(eq(workItems.subjectId, photoId));
  await work(fail({ code: 'noTicket', sentence: 'No ticket.' }));
  const now = await callVerb(getReading, company.foreman, { photoId });
  expect(now.ok && now.value.state).toBe('read');
});

test('a photo of a wall fails with a sentence, and the ticket can still be typed', async () => {
  const { ticketId, photoId } = await uploaded();
  await work(fail({ code: 'noTicket', sentence: 'No ticket can be made out in this photo.' }));
  const now = await callVerb(getReading, company.foreman, { photoId });
  expect(now.ok && now.value).toMatchObject({ state: 'failed', failureCode: 'noTicket' });
  const typed = await callVerb(confirmTicket, company.foreman, {
    ticketId,
    version: 1,
    ...ticketInput(pour),
  });
  expect(typed.ok).toBe(true);
});

test('a photo that ends the reader at every try is given up with a sentence', async () => {
  const { photoId } = await uploaded();
  const dying = readPhotoHandler(() => Promise.reject(new Error('the reader died')));
  for (let tries = 0; tries < 4; tries += 1) {
    await store.handle
      .update(workItems)
      .set({ state: 'waiting', runAfter: new Date(0) })
      .where(eq(workItems.subjectId, photoId));
    await doNext(store, systemClock, { readPhoto: dying });
  }
  const now = await callVerb(getReading, company.foreman, { photoId });
  expect(now.ok && now.value).toMatchObject({ state: 'failed', failureCode: 'engine' });
});

test('what is no photo is refused by what it is, whatever it is called, and nothing is kept', async () => {
  const text = (value: string) => new TextEncoder().encode(value);
  const heic = Uint8Array.from([0, 0, 0, 24, ...text('ftypheic'), 0, 0, 0, 0, ...text('heicmif1')]);
  const png = await testPicture();
  const small = await sharp({ create: { width: 50, height: 50, channels: 3, background: 'red' } })
    .jpeg()
    .toBuffer();
  const cases: [Uint8Array, string, string][] = [
    [new Uint8Array(), 'invalid', 'empty'],
    [text('%PDF-1.7\n1 0 obj'), 'wrongType', 'PDF'],
    [heic, 'wrongType', 'HEIC'],
    [text('<svg xmlns="http://www.w3.org/2000/svg"/>'), 'wrongType', 'not a photo'],
    [text('Ticket 558142'), 'wrongType', 'not a photo'],
    [png.slice(0, 24), 'invalid', 'damaged'],
    [new Uint8Array(small), 'invalid', 'too small'],
    [new Uint8Array(20 * 1024 * 1024 + 1), 'tooLarge', '20 MB'],
  ];
  for (const [bytes, code, words] of cases) {
    const refused = await sent(company.foreman, bytes);
    expect(!refused.ok && refused.error).toMatchObject({ code });
    expect(!refused.ok && refused.error.message).toContain(words);
  }
  expect(await ticketCount()).toBe(0);
});

test('a picture of more than 50 megapixels is refused before it is unpacked', async () => {
  const huge = await sharp({
    create: { width: 9000, height: 6000, channels: 3, background: 'white' },
    limitInputPixels: false,
  })
    .png()
    .toBuffer();
  const refused = await sent(company.foreman, new Uint8Array(huge));
  expect(!refused.ok && refused.error).toMatchObject({ code: 'tooLarge' });
});

test('another crew’s foreman can neither see nor add photos, and another company’s neither', async () => {
  const { photoId } = await uploaded();
  const elsewhere = await testCompany(store);
  const sameCompany = { ...company.foreman, personId: elsewhere.foreman.personId };
  for (const stranger of [sameCompany, elsewhere.foreman, elsewhere.owner]) {
    const file = await callVerb(getPhoto, stranger, { photoId });
    expect(!file.ok && file.error.code).toBe('notFound');
    const read = await callVerb(getReading, stranger, { photoId });
    expect(!read.ok && read.error.code).toBe('notFound');
    const added = await sent(stranger, await testPicture());
    expect(!added.ok && added.error.code).toBe('notFound');
  }
  const own = await callVerb(getPhoto, company.foreman, { photoId });
  expect(own.ok && own.value).toMatchObject({ mediaType: 'image/png', inline: true });
});

test('a second photo of a ticket that is here already moves to it and leaves no second load', async () => {
  const made = await callVerb(createTicket, company.foreman, {
    clientId: randomUUID(),
    ...ticketInput(pour),
  });
  const { ticketId, photoId } = await uploaded();
  const refused = await callVerb(confirmTicket, company.foreman, {
    ticketId,
    version: 1,
    ...ticketInput(pour),
  });
  expect(!refused.ok && refused.error).toMatchObject({
    code: 'conflict',
    issues: [{ path: 'number' }],
  });
  const attached = await callVerb(attachTicket, company.foreman, {
    ticketId,
    version: 1,
    supplierId: pour.supplierId,
    number: '558142',
  });
  expect(attached.ok && attached.value).toMatchObject({
    id: made.ok ? made.value.id : '',
    photos: [{ id: photoId }],
  });
  const placement = await callVerb(getPourDayPlacement, company.foreman, {
    placementId: pour.placementId,
  });
  expect(placement.ok && placement.value).toMatchObject({ inYd3: '10.00', loadsIn: 1, toCheck: 0 });
});

test('an upright photo is measured as it is shown, not as the camera stored it', async () => {
  const turned = await sharp({
    create: { width: 600, height: 400, channels: 3, background: '#8a7' },
  })
    .jpeg()
    .withMetadata({ orientation: 6 })
    .toBuffer();
  const answer = await sent(company.foreman, new Uint8Array(turned));
  const [row] = await store.handle
    .select()
    .from(photos)
    .where(eq(photos.id, answer.ok ? answer.value.photoId : randomUUID()));
  expect(row).toMatchObject({ widthPx: 400, heightPx: 600 });
});
