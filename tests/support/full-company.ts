import { and, eq } from 'drizzle-orm';
import type { Store } from '../../db/client';
import { outbox } from '../../db/schema/activity';
import { jobCrew, jobs, placements } from '../../db/schema/jobs';
import { billLines } from '../../db/schema/statements';
import { rateClauses, rateSheets, suppliers } from '../../db/schema/suppliers';
import { pumpTickets, tickets } from '../../db/schema/tickets';
import type { Actor } from '../../lib/auth/actor';
import { newId } from '../../lib/ids';
import { acceptImport } from '../../lib/services/imports/accept-import';
import { previewImport } from '../../lib/services/imports/preview-import';
import { uploadImport } from '../../lib/services/imports/upload-import';
import { issueKey } from '../../lib/services/keys/issue-key';
import { createOrder } from '../../lib/services/orders/create-order';
import { sendOrder } from '../../lib/services/orders/send-order';
import { invitePerson } from '../../lib/services/people/invite-person';
import { uploadPhoto } from '../../lib/services/photos/upload-photo';
import { createRateSheet } from '../../lib/services/rate-sheets/create-rate-sheet';
import { closeStatement } from '../../lib/services/statements/close-statement';
import { strikeRows } from '../../lib/services/statements/strike-rows';
import type { Verb } from '../../lib/services/verb';
import { callVerb } from '../../lib/services/verb';
import { type TestCompany, testCompany } from './company';
import { testPicture } from './pour';

/** What a verb answers, or the reason why it did not. */
// biome-ignore lint/suspicious/noExplicitAny: the answers' shapes are the verbs' own; tests look into them
export async function answerOf(verb: unknown, actor: Actor, input: unknown): Promise<any> {
  const { name } = verb as Verb;
  const result = await callVerb(verb as Verb, actor, input);
  if (!result.ok) throw new Error(`${name}: ${JSON.stringify(result.error)}`);
  return result.value;
}

const HEAD = 'Date,Ticket,Description,Mix,Qty,UM,Price,Amount';
/** Loads by number with their day of May 2026: a statement's days have no load but its own. */
const LOAD_DAYS = { '7001': '04', '7002': '04', '7003': '04', '7004': '05', '7005': '06' } as const;

const lineOf = (number: string, yards: string, amount: string, day = '04') =>
  `05/${day}/2026,${number},Concrete 3000,3000,${yards},YD,150.00,${amount}`;

/** A bill by itself, as its supplier would send it. */
export const billBytes = (...lines: readonly string[]) =>
  new TextEncoder().encode([HEAD, ...lines].join('\n'));
/** A bill that the company has not been sent yet. */
export const OTHER_BILL = billBytes(lineOf('7099', '9.00', '1350.00'));

/** Suppliers with an approved price, a crew's job, and its placement with five checked loads. */
async function insertRecords({ handle }: Store, company: TestCompany, tag: string) {
  const { companyId } = company;
  const ids = {
    supplierId: newId(),
    pumpSupplierId: newId(),
    jobId: newId(),
    placementId: newId(),
    pumpTicketId: newId(),
    ticketId: newId(),
  };
  await handle.insert(suppliers).values([
    {
      companyId,
      id: ids.supplierId,
      name: `Slate Creek ${tag}`,
      kind: 'readyMix',
      dispatchEmail: 'dispatch@slate.example',
    },
    { companyId, id: ids.pumpSupplierId, name: `Tall Boom ${tag}`, kind: 'pump' },
  ]);
  const rateSheetId = newId();
  await handle.insert(rateSheets).values({
    companyId,
    id: rateSheetId,
    supplierId: ids.supplierId,
    name: `2026 ${tag}`,
    version: 1,
    status: 'approved',
    effectiveFrom: '2026-01-01',
  });
  await handle.insert(rateClauses).values({
    companyId,
    id: newId(),
    rateSheetId,
    position: 0,
    clause: { kind: 'mixPrice', mixCode: '3000', description: null, dollarsPerYd3: '150.00' },
  });
  const { supplierId, pumpSupplierId, jobId, placementId } = ids;
  await handle.insert(jobs).values({ companyId, id: jobId, number: tag, name: `Barn ${tag}` });
  const { personId } = company.foreman;
  await handle.insert(jobCrew).values({ companyId, id: newId(), jobId, personId });
  await handle.insert(placements).values({
    companyId,
    id: placementId,
    jobId,
    name: `Floor ${tag}`,
    element: 'slab',
    pourDate: '2026-05-04',
    status: 'poured',
    figuredYd3: '30.00',
  });
  const load = { companyId, supplierId, jobId, placementId, status: 'confirmed' as const };
  await handle.insert(tickets).values(
    Object.entries(LOAD_DAYS).map(([number, day]) => ({
      ...load,
      id: number === '7001' ? ids.ticketId : newId(),
      number,
      date: `2026-05-${day}`,
      mixCode: '3000',
      quantityYd3: '8.00',
      notes: tag,
      clientId: newId(),
    })),
  );
  await handle.insert(pumpTickets).values({
    companyId,
    id: ids.pumpTicketId,
    supplierId: pumpSupplierId,
    jobId,
    placementId,
    number: `T-${tag}`,
    date: '2026-05-04',
    pumpedYd3: '32.00',
  });
  return ids;
}

interface BilledStatement {
  readonly statementId: string;
  /** In the order of the bill; a line's id is also its row's key on the sheet. */
  readonly lineIds: readonly string[];
}

async function takeIn(
  { handle }: Store,
  { companyId, owner }: TestCompany,
  supplierId: string,
  number: string,
  day: string,
  lines: readonly string[],
): Promise<BilledStatement> {
  const file = { supplierId, fileName: `${number}.csv`, bytes: billBytes(...lines) };
  const { importId } = await answerOf(uploadImport, owner, file);
  const seen = await answerOf(previewImport, owner, { importId });
  const { statementId } = await answerOf(acceptImport, owner, {
    importId,
    fileSha256: seen.preview.fileSha256,
    ...seen.proposed,
    number,
    periodStart: `2026-05-${day}`,
    periodEnd: `2026-05-${day}`,
  });
  const rows = await handle
    .select({ id: billLines.id })
    .from(billLines)
    .where(and(eq(billLines.companyId, companyId), eq(billLines.statementId, statementId)))
    .orderBy(billLines.position);
  return { statementId, lineIds: rows.map((row) => row.id) };
}

/**
 * Statements in every state: `open` with a line that agrees, one half a yard over, and one struck
 * by the owner; one that is `settled`, ready to be closed; and one that is `closed`.
 */
async function billed(store: Store, company: TestCompany, supplierId: string, tag: string) {
  const open = await takeIn(store, company, supplierId, `A-${tag}`, '04', [
    lineOf('7001', '8.00', '1200.00'),
    lineOf('7002', '8.50', '1275.00'),
    lineOf('7003', '8.00', '1200.00'),
  ]);
  const closed = await takeIn(store, company, supplierId, `B-${tag}`, LOAD_DAYS['7004'], [
    lineOf('7004', '8.00', '1200.00', LOAD_DAYS['7004']),
  ]);
  const settled = await takeIn(store, company, supplierId, `D-${tag}`, LOAD_DAYS['7005'], [
    lineOf('7005', '8.00', '1200.00', LOAD_DAYS['7005']),
  ]);
  const { owner } = company;
  const strike = ({ statementId }: BilledStatement, rowKeys: readonly (string | undefined)[]) =>
    answerOf(strikeRows, owner, { statementId, rowKeys });
  await strike(closed, closed.lineIds);
  await answerOf(closeStatement, owner, { statementId: closed.statementId });
  await strike(settled, settled.lineIds);
  await strike(open, [open.lineIds[2]]);
  return { open, settled, closed };
}

/** A company that has at least one record of every kind, `tag` in the name of each. */
export async function fullCompany(store: Store, tag = newId().slice(-12)) {
  const company = await testCompany(store);
  const { companyId, owner, foreman } = company;
  const ids = await insertRecords(store, company, tag);
  const { supplierId, jobId, placementId } = ids;
  const { photoId, ticketId: toCheckId } = await answerOf(uploadPhoto, owner, {
    placementId,
    clientId: newId(),
    fileName: 'photo.png',
    bytes: await testPicture(),
  });
  const order = {
    supplierId,
    jobId,
    placementId,
    pourDate: '2026-05-04',
    firstTruckAt: 420,
    spacingMinutes: 20,
    notes: tag,
    lines: [{ code: '3000', description: '', quantity: '32.00', unit: 'yd³' }],
  };
  const draftOrder = await answerOf(createOrder, owner, { clientId: newId(), ...order });
  const sentOrder = await answerOf(createOrder, owner, { clientId: newId(), ...order });
  await answerOf(sendOrder, owner, { orderId: sentOrder.id });
  const pumpOrder = await answerOf(createOrder, owner, {
    clientId: newId(),
    ...order,
    supplierId: ids.pumpSupplierId,
    lines: [{ code: 'PUMP', description: '', quantity: '4', unit: 'hours' }],
  });
  const sheet = { supplierId, name: `Draft ${tag}`, jobId, effectiveFrom: '2027-01-01' };
  const draftSheet = await answerOf(createRateSheet, owner, sheet);
  const invitation = await answerOf(invitePerson, owner, {
    email: `${tag}@example.test`,
    name: `Invited ${tag}`,
    role: 'foreman',
  });
  const key = await answerOf(issueKey, owner, { name: `Script ${tag}` });
  const [mail] = await store.handle.select().from(outbox).where(eq(outbox.companyId, companyId));
  const waiting = {
    supplierId,
    fileName: `${tag}.csv`,
    bytes: billBytes(lineOf('7050', '5', '750')),
  };
  const { importId } = await answerOf(uploadImport, owner, waiting);
  return {
    ...company,
    ...ids,
    ...(await billed(store, company, supplierId, tag)),
    tag,
    order,
    toCheckId: toCheckId as string,
    photoId: photoId as string,
    draftOrder: draftOrder as { id: string; version: number },
    sentOrderId: sentOrder.id as string,
    pumpOrderId: pumpOrder.id as string,
    draftSheetId: draftSheet.id as string,
    invitationId: invitation.id as string,
    keyId: key.row.id as string,
    mailId: mail?.id ?? '',
    importId: importId as string,
    crewPersonId: foreman.personId as string,
  };
}
export type FullCompany = Awaited<ReturnType<typeof fullCompany>>;
