import { randomUUID } from 'node:crypto';
import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import type { Store } from '../../db/client';
import { activity } from '../../db/schema/activity';
import { billLines, matches, statements } from '../../db/schema/statements';
import type { Actor } from '../../lib/auth/actor';
import { newId } from '../../lib/ids';
import { getPourDay } from '../../lib/services/pour-day/get-pour-day';
import { getPourDayPlacement } from '../../lib/services/pour-day/get-pour-day-placement';
import { createPumpTicket } from '../../lib/services/pump-tickets/create-pump-ticket';
import { updatePumpTicket } from '../../lib/services/pump-tickets/update-pump-ticket';
import { createTicket } from '../../lib/services/tickets/create-ticket';
import { exportTickets } from '../../lib/services/tickets/export-tickets';
import { getTicket } from '../../lib/services/tickets/get-ticket';
import { listTickets } from '../../lib/services/tickets/list-tickets';
import { rejectTicket } from '../../lib/services/tickets/reject-ticket';
import { setClock } from '../../lib/services/tickets/set-clock';
import { updateTicket } from '../../lib/services/tickets/update-ticket';
import { callVerb } from '../../lib/services/verb';
import { type TestCompany, testCompany } from '../support/company';
import { type TestPour, testPour, ticketInput } from '../support/pour';
import { testStore } from '../support/store';

let store: Store;
let company: TestCompany;
let pour: TestPour;
beforeAll(async () => {
  store = await testStore();
});
afterAll(() => store.close());
beforeEach(async () => {
  company = await testCompany(store);
  pour = await testPour(store, company);
});

async function typed(actor: Actor, over: object = {}) {
  const input = { clientId: randomUUID(), ...ticketInput(pour), ...over };
  const made = await callVerb(createTicket, actor, input);
  if (!made.ok) throw new Error(made.error.message);
  return made.value;
}

const eventsOf = (entityId: string) =>
  store.handle
    .select()
    .from(activity)
    .where(and(eq(activity.companyId, company.companyId), eq(activity.entityId, entityId)));

test('a ticket typed by hand moves the yards, once, however often it is sent', async () => {
  const input = { clientId: randomUUID(), ...ticketInput(pour) };
  const first = await callVerb(createTicket, company.foreman, input);
  const again = await callVerb(createTicket, company.foreman, input);
  expect(first.ok && again.ok && first.value.id === again.value.id).toBe(true);
  const seen = await callVerb(getPourDayPlacement, company.foreman, {
    placementId: pour.placementId,
  });
  expect(seen.ok && seen.value).toMatchObject({
    orderedYd3: '60.00',
    inYd3: '10.00',
    loadsIn: 1,
    toCheck: 0,
  });
});

test('what went back to the plant is taken off the yards in', async () => {
  await typed(company.foreman, { returnedYd3: '1.25' });
  const day = await callVerb(getPourDay, company.foreman, { day: '2026-09-03' });
  expect(day.ok && day.value.placements.map((one) => one.inYd3)).toEqual(['8.75']);
});

test('a number that the supplier used already is refused with a sentence, in any case', async () => {
  await typed(company.foreman, { number: 'a77' });
  const input = { clientId: randomUUID(), ...ticketInput(pour, 'A77') };
  const second = await callVerb(createTicket, company.foreman, input);
  expect(!second.ok && second.error).toMatchObject({ code: 'conflict' });
  expect(!second.ok && second.error.message).toContain('already here: 3 Sep 2026, 10.00 yd³');
});

test('the number of a rejected ticket is free again, and confirming anew would count once', async () => {
  const ticket = await typed(company.foreman);
  const rejected = await callVerb(rejectTicket, company.foreman, {
    ticketId: ticket.id,
    version: ticket.version,
    reason: 'sent to the wrong site',
  });
  expect(rejected.ok && rejected.value.status).toBe('rejected');
  await typed(company.foreman);
  const seen = await callVerb(getPourDayPlacement, company.foreman, {
    placementId: pour.placementId,
  });
  expect(seen.ok && seen.value.inYd3).toBe('10.00');
});

test('two people with the same ticket open: the second is told, and nothing of his is stored', async () => {
  const ticket = await typed(company.foreman);
  const change = { ticketId: ticket.id, version: ticket.version, ...ticketInput(pour) };
  const one = await callVerb(updateTicket, company.bookkeeper, { ...change, quantityYd3: '9.50' });
  expect(one.ok).toBe(true);
  const two = await callVerb(updateTicket, company.foreman, { ...change, quantityYd3: '9.00' });
  expect(!two.ok && two.error).toMatchObject({ code: 'conflict', issues: [{ path: 'version' }] });
  const now = await callVerb(getTicket, company.bookkeeper, { ticketId: ticket.id });
  expect(now.ok && now.value.quantityYd3).toBe('9.50');
});

test('a correction is recorded with what it was before and what it is after', async () => {
  const ticket = await typed(company.foreman);
  await callVerb(updateTicket, company.bookkeeper, {
    ticketId: ticket.id,
    version: ticket.version,
    ...ticketInput(pour),
    quantityYd3: '9.50',
  });
  const now = await callVerb(getTicket, company.bookkeeper, { ticketId: ticket.id });
  expect(now.ok && now.value.activity[0]).toMatchObject({
    actorName: 'Test bookkeeper',
    changes: [{ field: 'quantityYd3', before: '10.00', after: '9.50' }],
  });
  expect(await eventsOf(ticket.id)).toHaveLength(2);
});

test('ties that do not belong together are refused at their field', async () => {
  const other = await testPour(store, company);
  const wrong = [
    [{ placementId: other.placementId }, 'placementId'],
    [{ orderId: other.orderId }, 'orderId'],
    [{ supplierId: pour.pumpSupplierId, orderId: null }, 'supplierId'],
    [{ returnedYd3: '10.01' }, 'returnedYd3'],
    [{ arrivedAt: 400 }, 'arrivedAt'],
    [{ quantityYd3: '30.01' }, 'quantityYd3'],
  ] as const;
  for (const [over, path] of wrong) {
    const input = { clientId: randomUUID(), ...ticketInput(pour), ...over };
    const refused = await callVerb(createTicket, company.bookkeeper, input);
    expect(!refused.ok && refused.error.issues[0]?.path).toBe(path);
  }
});

test('another crew’s and another company’s tickets do not exist for a foreman', async () => {
  const ticket = await typed(company.bookkeeper);
  const elsewhere = await testCompany(store);
  await testPour(store, elsewhere);
  const strangers = [
    { ...company.foreman, personId: elsewhere.foreman.personId },
    elsewhere.foreman,
    elsewhere.owner,
  ];
  for (const stranger of strangers) {
    const seen = await callVerb(getTicket, stranger, { ticketId: ticket.id });
    expect(!seen.ok && seen.error.code).toBe('notFound');
    const placement = await callVerb(getPourDayPlacement, stranger, {
      placementId: pour.placementId,
    });
    expect(!placement.ok && placement.error.code).toBe('notFound');
    const rejected = await callVerb(rejectTicket, stranger, {
      ticketId: ticket.id,
      version: 1,
      reason: 'not mine',
    });
    expect(!rejected.ok && rejected.error.code).toBe('notFound');
    const listed = await callVerb(listTickets, stranger, {});
    expect(listed.ok && listed.value.total).toBe(0);
  }
});

test('the clock takes the present in the company’s time zone, and can be corrected', async () => {
  const ticket = await typed(company.foreman, { arrivedAt: null });
  const tap = (event: string, at?: number | null) =>
    callVerb(
      setClock,
      company.foreman,
      { ticketId: ticket.id, event, ...(at === undefined ? {} : { at }) },
      // 8:21 in Chicago.
      { clock: { now: () => new Date('2026-09-03T13:21:00Z') } },
    );
  expect((await tap('arrivedAt')).ok).toBe(true);
  const corrected = await tap('arrivedAt', 500);
  expect(corrected.ok && corrected.value.arrivedAt).toBe(500);
  const tooEarly = await tap('startedAt', 499);
  expect(!tooEarly.ok && tooEarly.error.message).toContain('08:19 does not fit beside 08:20');
  const back = await tap('arrivedAt', null);
  expect(back.ok && back.value.arrivedAt).toBeNull();
});

test('a tap after midnight counts on from the day of the pour; on another day it is refused', async () => {
  const ticket = await typed(company.foreman, { arrivedAt: 1400 });
  const at = (now: string) =>
    callVerb(
      setClock,
      company.foreman,
      { ticketId: ticket.id, event: 'startedAt' },
      { clock: { now: () => new Date(now) } },
    );
  const late = await at('2026-09-04T05:10:00Z');
  expect(late.ok && late.value.startedAt).toBe(1450);
  const nextDay = await at('2026-09-04T20:00:00Z');
  expect(!nextDay.ok && nextDay.error.code).toBe('invalid');
});

async function billed(ticketId: string, status: 'open' | 'closed') {
  const { companyId } = company;
  const { supplierId } = pour;
  const statementId = newId();
  const billLineId = newId();
  await store.handle.insert(statements).values({
    companyId,
    id: statementId,
    supplierId,
    number: 'S-9',
    periodStart: '2026-09-01',
    periodEnd: '2026-09-30',
    status,
  });
  await store.handle.insert(billLines).values({
    companyId,
    id: billLineId,
    supplierId,
    statementId,
    position: 1,
    rowKey: 'row 1',
    chargeKind: 'mix',
    description: 'Mix',
    amount: '1580.00',
  });
  await store.handle.insert(matches).values({
    companyId,
    id: newId(),
    billLineId,
    ticketId,
    method: 'number',
    confidence: 1,
    reason: 'the same number',
  });
}

test('a ticket settled on a closed statement can’t be changed under it', async () => {
  const ticket = await typed(company.foreman);
  await billed(ticket.id, 'closed');
  const refused = await callVerb(rejectTicket, company.bookkeeper, {
    ticketId: ticket.id,
    version: ticket.version,
    reason: 'late',
  });
  expect(!refused.ok && refused.error).toMatchObject({ code: 'closed' });
  expect(!refused.ok && refused.error.message).toContain('statement S-9');
});

test('the bookkeeper sees where a ticket is billed; the foreman sees neither that nor any price', async () => {
  const ticket = await typed(company.foreman);
  await billed(ticket.id, 'open');
  const office = await callVerb(getTicket, company.bookkeeper, { ticketId: ticket.id });
  expect(office.ok && office.value.billed).toMatchObject([{ statementNumber: 'S-9' }]);
  const site = [
    await callVerb(getTicket, company.foreman, { ticketId: ticket.id }),
    await callVerb(getPourDay, company.foreman, { day: '2026-09-03' }),
    await callVerb(getPourDayPlacement, company.foreman, { placementId: pour.placementId }),
    await callVerb(listTickets, company.foreman, {}),
  ];
  for (const answer of site) {
    expect(answer.ok).toBe(true);
    const text = JSON.stringify(answer.ok && answer.value);
    expect(text).not.toMatch(/"[^"]*(price|amount|cost|rate|dollar|total.*\$)[^"]*":/i);
    expect(text).not.toContain('1580');
  }
});

test('the list filters, searches, sorts and pages; the export says the same', async () => {
  for (const [number, quantityYd3] of [
    ['100', '10.00'],
    ['101', '4.50'],
    ['20', '9.00'],
  ]) {
    await typed(company.bookkeeper, { number, quantityYd3 });
  }
  const by = async (input: object) => {
    const found = await callVerb(listTickets, company.bookkeeper, input);
    return found.ok ? found.value.rows.map((row) => row.number) : found.error.message;
  };
  expect(await by({ sort: 'quantity', direction: 'up' })).toEqual(['101', '20', '100']);
  expect(await by({ search: '10', sort: 'number', direction: 'up' })).toEqual(['100', '101']);
  expect(await by({ sort: 'number', direction: 'up', offset: 1, limit: 1 })).toEqual(['101']);
  expect(await by({ from: '2026-09-04' })).toEqual([]);
  expect(await by({ status: 'toCheck' })).toEqual([]);
  expect(await by({ search: '%' })).toEqual([]);
  const file = await callVerb(exportTickets, company.bookkeeper, { search: '10' });
  const lines = new TextDecoder().decode(file.ok ? file.value.bytes : undefined).split('\r\n');
  expect(lines).toHaveLength(4);
});

test('a cell that a spreadsheet would run is exported as text', async () => {
  await typed(company.bookkeeper, { truck: '=HYPERLINK("http://x")' });
  const file = await callVerb(exportTickets, company.bookkeeper, {});
  const text = new TextDecoder().decode(file.ok ? file.value.bytes : undefined);
  expect(text).toContain(`"'=HYPERLINK(""http://x"")"`);
});

test('a pump ticket is added once, its number used once, a stale change of it refused', async () => {
  const input = {
    clientId: randomUUID(),
    number: 'P-31',
    supplierId: pour.pumpSupplierId,
    jobId: pour.jobId,
    placementId: pour.placementId,
    date: '2026-09-03',
    arrivedAt: 400,
    finishedAt: 700,
    pumpedYd3: '58.00',
  };
  const first = await callVerb(createPumpTicket, company.foreman, input);
  const again = await callVerb(createPumpTicket, company.foreman, input);
  expect(first.ok && again.ok && again.value).toEqual(first.ok && first.value);
  const taken = await callVerb(createPumpTicket, company.foreman, {
    ...input,
    clientId: randomUUID(),
  });
  expect(!taken.ok && taken.error.message).toContain('here already');
  if (!first.ok) throw new Error(first.error.message);
  const { clientId: _, ...values } = input;
  const change = { ...values, pumpTicketId: first.value.id, revision: first.value.revision };
  const changed = await callVerb(updatePumpTicket, company.bookkeeper, { ...change, setUps: 2 });
  expect(changed.ok && changed.value.setUps).toBe(2);
  const stale = await callVerb(updatePumpTicket, company.foreman, { ...change, setUps: 3 });
  expect(!stale.ok && stale.error.code).toBe('conflict');
});
