import path from 'node:path';
import { expect, test } from '@playwright/test';
import { windowOf } from '../support/sign-in';

const PHOTO = path.join('tests', 'fixtures', 'tickets', '558903.jpg');
/** Names of fields that carry money anywhere in the API. */
const MONEY =
  /"(amount|unitPrice|price|cost|costPerYd3|dollars\w*|billed|expected|difference|against)":/;

/** A ticket says for everyone where it is billed; for whoever may not know, the list is empty. */
const withoutEmpty = (text: string) => text.replaceAll('"billed":[]', '');

test('the foreman snaps a ticket on a small phone, corrects what the reader doubts, and sees the yards move @journey', async ({
  browser,
  baseURL,
}) => {
  test.setTimeout(400_000);
  const context = await windowOf(browser, baseURL, 'foreman', {
    viewport: { width: 360, height: 740 },
    isMobile: true,
    hasTouch: true,
  });
  const page = await context.newPage();
  const answers: string[] = [];
  page.on('response', async (response) => {
    if (!response.url().includes('/api/')) return;
    if (!(response.headers()['content-type'] ?? '').includes('json')) return;
    answers.push(await response.text().catch(() => ''));
  });
  await page.goto('/pour-day');
  await page.getByRole('link', { name: /Basement floor/ }).click();
  await page.waitForURL(/\/pour-day\/[0-9a-f-]{36}$/);
  const tally = page.getByRole('region', { name: 'Yards in' });
  const yards = async () => Number(((await tally.textContent()) ?? '').match(/\d+\.\d\d/)?.[0]);
  const before = await yards();

  await page.getByLabel('Choose a photo').setInputFiles(PHOTO);
  await page.waitForURL(/\/pour-day\/tickets\//);
  await expect(page.getByRole('heading', { name: /look/i })).toBeVisible({ timeout: 240_000 });
  await expect(page.getByLabel('Ticket number')).toHaveValue('558903');
  const doubted = page.getByLabel('Yards', { exact: true });
  await doubted.fill('10.00');
  await expect(page.getByText('$')).toHaveCount(0);
  await page.getByRole('button', { name: /Confirm 10\.00/ }).click();
  await page.waitForURL(/\/pour-day\/[0-9a-f-]{36}$/);
  await expect.poll(yards).toBe(before + 10);
  await expect(page.getByText('$')).toHaveCount(0);
  const width = await page.evaluate(() => document.documentElement.scrollWidth);
  expect(width).toBeLessThanOrEqual(360);
  expect(answers.length).toBeGreaterThan(0);
  for (const answer of answers) expect(withoutEmpty(answer)).not.toMatch(MONEY);
  await context.close();
});

test('no answer that a foreman can get carries money', async ({ browser, baseURL }) => {
  const context = await windowOf(browser, baseURL, 'foreman');
  const { request } = context;
  const placements = (await (await request.get('/api/pour-day')).json()).placements;
  const orders = (await (await request.get('/api/orders')).json()).rows;
  const tickets = (await (await request.get('/api/tickets')).json()).rows;
  const jobs = (await (await request.get('/api/jobs')).json()).rows;
  expect(orders.length * tickets.length * jobs.length * placements.length).toBeGreaterThan(0);
  for (const address of [
    '/api/account',
    '/api/jobs',
    `/api/jobs/${jobs[0].id}`,
    `/api/jobs/${jobs[0].id}/placements`,
    '/api/orders',
    `/api/orders/${orders[0].id}`,
    '/api/tickets',
    '/api/tickets/choices',
    `/api/tickets/${tickets[0].id}`,
    '/api/pump-tickets',
    '/api/pour-day',
    `/api/pour-day/${placements[0].id}`,
  ]) {
    const answer = await request.get(address);
    expect(answer.status(), address).toBe(200);
    expect(withoutEmpty(await answer.text()), address).not.toMatch(MONEY);
  }
  await context.close();
});
