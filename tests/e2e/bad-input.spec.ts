import { readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from '@playwright/test';
import sharp from 'sharp';
import { signedIn, windowOf } from './support/sign-in';

const MB = 1024 * 1024;
const PIXEL_PDF = '%PDF-1.7\n1 0 obj\n<<>>\nendobj\n';

test('a file that is no bill gets a clear answer, and nothing of it stays', async ({ baseURL }) => {
  const bookkeeper = await signedIn(baseURL, 'bookkeeper');
  const suppliers = await (await bookkeeper.get('/api/suppliers?search=Halvorsen')).json();
  const upload = (data: Buffer | string) =>
    bookkeeper.post(`/api/imports?supplierId=${suppliers.rows[0].id}`, {
      data,
      headers: { 'content-type': 'text/csv', 'x-file-name': 'bad.csv' },
      timeout: 240_000,
    });
  const photo = readFileSync(path.join('tests', 'fixtures', 'tickets', '558801.jpg'));
  for (const [data, status, says] of [
    [PIXEL_PDF, 415, 'PDF'],
    [photo, 415, 'JPEG'],
    ['', 415, 'empty'],
    ['\n\n \n', 415, 'blank'],
  ] as const) {
    const answer = await upload(data as string);
    expect(answer.status(), says).toBe(status);
    expect((await answer.json()).error.message).toContain(says);
  }
  const huge = await upload(Buffer.alloc(100 * MB, 'a,b,c\n'));
  expect(huge.status()).toBe(413);
  expect((await huge.json()).error.message).toContain('10 MB');
  const { rows } = await (await bookkeeper.get('/api/imports')).json();
  expect(rows.filter((row: { fileName: string }) => row.fileName === 'bad.csv')).toEqual([]);
  await bookkeeper.dispose();
});

test('a broken row is named on the preview, and nothing is taken in before it is decided', async ({
  browser,
  baseURL,
}) => {
  const context = await windowOf(browser, baseURL, 'bookkeeper');
  const page = await context.newPage();
  await page.goto('/statements/import');
  await page.getByLabel('Who sent it').selectOption({ label: 'Halvorsen Concrete' });
  await page.getByLabel('Choose a file').setInputFiles({
    name: 'broken.csv',
    mimeType: 'text/csv',
    buffer: Buffer.from(
      [
        'Ticket,Date,Description,Mix,Qty,UM,Price,Amount',
        'H-49901,11/03/2026,Concrete HC35,HC35,8.00,YD,146.00,1168.00',
        'H-49902,11/03/2026,Concrete HC35,HC35,eight,YD,146.00,one thousand',
      ].join('\n'),
    ),
  });
  await expect(page.getByText(/Line 3/).first()).toBeVisible();
  await page.getByRole('button', { name: 'Take in 1 line' }).click();
  await expect(page.getByRole('alert').filter({ hasText: 'could not be read' })).toContainText(
    'Nothing was written',
  );
  await page.getByRole('button', { name: 'Discard' }).first().click();
  await page.getByRole('dialog').getByRole('button', { name: 'Discard' }).click();
  await page.waitForURL(/\/statements$/);
  await context.close();
});

test('a photo that is no ticket says so, and a file that is no photo is refused', async ({
  baseURL,
}) => {
  test.setTimeout(400_000);
  const foreman = await signedIn(baseURL, 'foreman');
  const [placement] = (await (await foreman.get('/api/pour-day')).json()).placements;
  const send = (data: Buffer | string, clientId: string) =>
    foreman.post(`/api/placements/${placement.id}/photos?clientId=${clientId}`, {
      data,
      headers: { 'content-type': 'image/jpeg', 'x-file-name': 'photo.jpg' },
      timeout: 240_000,
    });
  const refused = await send(PIXEL_PDF, crypto.randomUUID());
  expect(refused.status()).toBe(415);
  const huge = await send(Buffer.alloc(100 * MB), crypto.randomUUID());
  expect(huge.status()).toBe(413);
  const blank = { width: 1200, height: 1600, channels: 3, background: '#7a6a55' } as const;
  const picture = await sharp({ create: blank }).jpeg().toBuffer();
  const taken = await send(picture, crypto.randomUUID());
  expect(taken.status(), await taken.text()).toBe(200);
  const { ticketId, photoId } = await taken.json();
  const reading = async () => (await foreman.get(`/api/photos/${photoId}/reading`)).json();
  await expect.poll(async () => (await reading()).state, { timeout: 240_000 }).toBe('failed');
  expect((await reading()).failureSentence).toMatch(/\w/);
  const { version } = await (await foreman.get(`/api/tickets/${ticketId}`)).json();
  const aside = await foreman.post(`/api/tickets/${ticketId}/reject`, {
    data: { version, reason: 'no ticket' },
  });
  expect(aside.status(), await aside.text()).toBe(200);
  await foreman.dispose();
});
