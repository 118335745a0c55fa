import AxeBuilder from '@axe-core/playwright';
import type { Page } from '@playwright/test';
import { expect, test } from '@playwright/test';
import { originOf, signedIn, windowOf } from './support/sign-in';

/** Long lists are asked for short: more rows of a kind tell nothing more. */
const PAGES = [
  '/pour-day',
  '/jobs',
  '/jobs/new',
  '/orders?limit=10',
  '/orders/new',
  '/tickets?limit=10',
  '/tickets/new',
  '/tickets/pump',
  '/suppliers',
  '/suppliers/new',
  '/statements?limit=10',
  '/statements/import',
  '/variances?limit=10',
  '/yield',
  '/company',
  '/company/people',
  '/company/outbox?limit=10',
  '/company/activity?limit=10',
  '/company/keys',
  '/account',
];

/** Pages of one record each, found through the API. */
async function recordPages(baseURL: string | undefined): Promise<string[]> {
  const owner = await signedIn(baseURL, 'owner');
  const get = async (address: string) => (await owner.get(address)).json();
  const [job] = (await get('/api/jobs')).rows;
  const [order] = (await get('/api/orders')).rows;
  const [ticket] = (await get('/api/tickets?search=558801')).rows;
  const [supplier] = (await get('/api/suppliers?search=Cinder')).rows;
  const [sheet] = (await get(`/api/suppliers/${supplier.id}`)).rateSheets;
  const [statement] = (await get('/api/statements?status=closed')).rows;
  const [placement] = (await get('/api/pour-day')).placements;
  const [prairie] = (await get('/api/suppliers?search=Prairie')).rows;
  const upload = await owner.post(`/api/imports?supplierId=${prairie.id}`, {
    data: 'Ticket,Date,Description,Qty,Amount\nA-1,11/03/2026,Form stock,3.00,375.00\n',
    headers: { 'content-type': 'text/csv', 'x-file-name': 'axe.csv' },
  });
  const { importId } = await upload.json();
  const seen = await get(`/api/imports/${importId}`);
  const taken = await owner.post(`/api/imports/${importId}/accept`, {
    data: { ...seen.proposed, fileSha256: seen.preview.fileSha256 },
  });
  const { statementId } = await taken.json();
  await owner.dispose();
  return [
    `/statements/import/${importId}`,
    `/statements/${statementId}`,
    `/jobs/${job.id}`,
    `/jobs/${job.id}/edit`,
    `/orders/${order.id}`,
    `/placements/${placement.id}`,
    `/placements/${placement.id}/edit`,
    `/tickets/${ticket.id}`,
    `/suppliers/${supplier.id}`,
    `/rate-sheets/${sheet.id}`,
    `/statements/${statement.id}`,
    `/pour-day/${placement.id}`,
    `/pour-day/${placement.id}/by-hand`,
  ];
}

const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa'];

test.describe.configure({ mode: 'parallel' });

const LOOKS = [
  { name: 'desktop, light', viewport: { width: 1440, height: 900 }, colorScheme: 'light' },
  { name: 'phone, dark', viewport: { width: 360, height: 740 }, colorScheme: 'dark' },
] as const;

async function inspect(page: Page, address: string, found: string[]): Promise<void> {
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
  for (const one of violations) {
    if (one.impact !== 'serious' && one.impact !== 'critical') continue;
    found.push(`${address}: ${one.id} at ${one.nodes[0]?.target.join(' ')}`);
  }
  const over = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  if (over > 0) found.push(`${address}: ${over} px too wide`);
}

for (const { name, ...look } of LOOKS) {
  test(`axe finds nothing serious on any screen, and none is wider than its window: ${name}`, async ({
    browser,
    baseURL,
  }) => {
    test.setTimeout(600_000);
    const context = await windowOf(browser, baseURL, 'owner', look);
    const page = await context.newPage();
    const found: string[] = [];
    for (const address of [...PAGES, ...(await recordPages(baseURL))]) {
      await page.goto(address);
      await inspect(page, address, found);
    }
    const stranger = await browser.newContext({ baseURL: originOf(baseURL), ...look });
    const door = await stranger.newPage();
    for (const address of ['/sign-in', '/sign-up', '/forgot-password']) {
      await door.goto(address);
      await inspect(door, address, found);
    }
    await stranger.close();
    expect(found).toEqual([]);
    await context.close();
  });
}
