import { expect, test } from '@playwright/test';
import { windowOf } from '../support/sign-in';

test('the owner sees which job ran over, opens its tickets in two clicks, invites a foreman and reads the outbox @journey', async ({
  browser,
  baseURL,
}) => {
  const context = await windowOf(browser, baseURL, 'owner', {
    viewport: { width: 1440, height: 900 },
  });
  const page = await context.newPage();
  await page.goto('/jobs');
  await page.getByRole('link', { name: 'Yield', exact: true }).click();
  const table = page.getByRole('table', { name: 'Yield by job' });
  const worst = table.getByRole('row').nth(1);
  await expect(worst).toContainText('+');
  await worst.getByRole('link', { name: 'tickets' }).click();
  await page.waitForURL(/\/tickets\?jobId=/);
  await expect(page.getByText(/^\d+ tickets?$/)).toBeVisible();

  await page.goto('/company/people');
  await page
    .getByRole('button', { name: /Invite/ })
    .first()
    .click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Name').fill('Ana Reyes');
  await dialog.getByLabel(/E-mail/).fill('ana@bluestem.example');
  await dialog.getByRole('button', { name: /Invite|Send/ }).click();
  await expect(page.getByText('ana@bluestem.example').first()).toBeVisible();
  await page.goto('/company/outbox');
  const mail = page.getByRole('row').filter({ hasText: 'ana@bluestem.example' });
  await expect(mail).toContainText('Bluestem Flatwork invites you');
  await mail.getByRole('button').first().click();
  await expect(page.getByRole('dialog')).toContainText('Hello Ana Reyes');
  await context.close();
});
