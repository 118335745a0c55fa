import { readFileSync } from 'node:fs';
import path from 'node:path';
import type { APIRequestContext } from '@playwright/test';

/** A record of the demo company for every name that stands in a path. */
export type Samples = Readonly<Record<string, string>>;

async function get(requests: APIRequestContext, address: string) {
  const answer = await requests.get(address);
  if (!answer.ok()) throw new Error(`${address}: ${answer.status()} ${await answer.text()}`);
  return answer.json();
}

async function send(
  requests: APIRequestContext,
  address: string,
  data: object,
): Promise<{ id: string }> {
  const answer = await requests.post(address, { data });
  if (!answer.ok()) throw new Error(`${address}: ${answer.status()} ${await answer.text()}`);
  return answer.json();
}

/** Finds or makes one record of each kind; what it makes disturbs nobody. */
export async function findSamples(
  owner: APIRequestContext,
  foreman: APIRequestContext,
): Promise<Samples> {
  const today = (await get(owner, '/api/pour-day')).placements[0];
  const [job] = (await get(owner, `/api/jobs?search=${encodeURIComponent(today.jobNumber)}`)).rows;
  const [order] = (await get(owner, `/api/orders?jobId=${job.id}`)).rows;
  const [ticket] = (await get(owner, `/api/tickets?jobId=${job.id}&status=confirmed`)).rows;
  const [pump] = (await get(foreman, '/api/pump-tickets')).rows;
  const [supplier] = (await get(owner, '/api/suppliers?search=Cinder')).rows;
  const draft = await send(owner, `/api/suppliers/${supplier.id}/rate-sheets`, {
    name: 'Access walk',
    jobId: null,
    effectiveFrom: '2030-01-01',
  });
  const [statement] = (await get(owner, '/api/statements?status=closed&search=CR')).rows;
  const sheet = await get(owner, `/api/statements/${statement.id}/sheet`);
  const line = sheet.rows.find((row: { billed: unknown }) => row.billed !== null);
  const photographed = (await get(owner, '/api/tickets?search=558801')).rows[0];
  const { photos } = await get(owner, `/api/tickets/${photographed.id}`);
  const invitation = await send(owner, '/api/people/invitations', {
    email: 'walk@bluestem.example',
    name: 'Access walk',
    role: 'foreman',
  });
  const key = await send(owner, '/api/keys', { name: 'Access walk' });
  const [mail] = (await get(owner, '/api/outbox')).rows;
  const people = (await get(owner, '/api/people')).people;
  const bill = readFileSync(path.join('tests', 'fixtures', 'csv', 'pump-service.csv'));
  const upload = await owner.post(`/api/imports?supplierId=${supplier.id}`, {
    data: bill,
    headers: { 'content-type': 'text/csv', 'x-file-name': 'access-walk.csv' },
  });
  return {
    jobId: job.id,
    placementId: today.id,
    orderId: order.id,
    ticketId: ticket.id,
    pumpTicketId: pump.id,
    supplierId: supplier.id,
    rateSheetId: draft.id,
    statementId: statement.id,
    billLineId: line.billed.lineId,
    importId: (await upload.json()).importId,
    photoId: photos[0].id,
    invitationId: invitation.id,
    keyId: (key as unknown as { row: { id: string } }).row.id,
    mailId: mail.id,
    personId: people.find((one: { role: string }) => one.role === 'foreman').id,
    token: 'a'.repeat(43),
    name: 'cinder-ridge-2026-11.csv',
  };
}
