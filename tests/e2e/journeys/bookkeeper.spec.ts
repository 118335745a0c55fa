import path from 'node:path';
import { expect, test } from '@playwright/test';
import { PLANTS } from '../../../db/seed/planted';
import { signedIn, windowOf } from '../support/sign-in';

const BILL = path.join('tests', 'fixtures', 'statements', 'cinder-ridge-2026-11.csv');
const PLANTED = PLANTS.filter(
  (plant) => plant.supplier === 'cinderRidge' && plant.month === '2026-11',
);

interface Row {
  chargeKind: string;
  verdict: string;
  settled: { state: string; reason: string } | null;
  deliveries: { number: string }[];
  billed: { ticketNumber: string | null; invoiceNumber: string | null } | null;
  findings: { kind: string }[];
}

/** "558703 yardsDiffer": where a finding stands, as the demo's text names it. */
function placesOf(rows: readonly Row[]): string[] {
  return rows
    .flatMap((row) => {
      const place =
        row.chargeKind === 'tax'
          ? row.billed?.invoiceNumber
          : (row.deliveries[0]?.number ?? row.billed?.ticketNumber);
      return row.findings.map((finding) => `${place} ${finding.kind}`);
    })
    .sort();
}

test('the bookkeeper imports the open month, sees what was planted and nothing else, strikes off the rest, and finds it as she left it @journey', async ({
  browser,
  baseURL,
}) => {
  const context = await windowOf(browser, baseURL, 'bookkeeper', {
    viewport: { width: 1440, height: 900 },
  });
  const page = await context.newPage();
  await page.goto('/statements/import');
  await page.getByLabel('Who sent it').selectOption({ label: 'Cinder Ridge Ready-Mix' });
  await page.getByLabel('Choose a file').setInputFiles(BILL);
  await expect(page.getByRole('heading', { name: 'What each column holds' })).toBeVisible();
  await expect(page.getByText('As you confirmed it for this supplier’s last file')).toBeVisible();
  await page.getByRole('button', { name: 'Take in 131 lines' }).click();
  await page.waitForURL(/\/statements\/[0-9a-f-]{36}$/);
  const statementId = page.url().split('/').at(-1) ?? '';
  await expect(page.getByText('0 of 132 rows struck off')).toBeVisible();

  const sheet = async () =>
    (await (await context.request.get(`/api/statements/${statementId}/sheet`)).json()) as {
      rows: Row[];
    };
  const planted = PLANTED.flatMap((plant) =>
    Array.from({ length: plant.lines }, () => `${plant.on} ${plant.kind}`),
  ).sort();
  expect(placesOf((await sheet()).rows)).toEqual(planted);
  await page.getByRole('button', { name: 'findings' }).click();
  await expect(page.locator('.ledger .ag-row')).toHaveCount(planted.length);
  await page.getByRole('button', { name: 'all rows' }).click();

  await expect(page.locator('.ag-row-focus')).toBeVisible();
  await page.keyboard.press('n');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Shift+S');
  await expect(page.getByText(`${132 - planted.length} of 132 rows struck off`)).toBeVisible();
  await page.keyboard.press('n');
  await page.keyboard.press('c');
  await expect(page.getByText(`${133 - planted.length} of 132 rows struck off`)).toBeVisible();
  await page.keyboard.press('n');
  await page.keyboard.press('a');
  await page.getByLabel('Reason').fill('Agreed by phone');
  await page.getByLabel('Reason').press('Enter');
  await expect(page.getByText(`${134 - planted.length} of 132 rows struck off`)).toBeVisible();
  await expect(page.getByRole('dialog')).toBeHidden();
  await page.keyboard.press('u');
  await expect(page.getByText(`${133 - planted.length} of 132 rows struck off`)).toBeVisible();
  await expect(page.getByText('Took back 1 row.')).toBeVisible();

  await page.goto('/jobs');
  await page.goto(`/statements/${statementId}`);
  await expect(page.getByText(`${133 - planted.length} of 132 rows struck off`)).toBeVisible();
  const { rows } = await sheet();
  expect(rows.filter((row) => row.settled?.state === 'claimed')).toHaveLength(1);
  expect(rows.filter((row) => row.settled?.state === 'struck')).toHaveLength(132 - planted.length);
  expect(
    rows.filter((row) => row.settled?.state === 'struck').every((row) => row.verdict !== 'finding'),
  ).toBe(true);
  await page.goto('/variances');
  await expect(page.getByText(/\d+ variances/)).toBeVisible();
  await context.close();
});

test('the same file again is recognised and not doubled @journey', async ({ baseURL }) => {
  const bookkeeper = await signedIn(baseURL, 'bookkeeper');
  const suppliers = await (await bookkeeper.get('/api/suppliers?search=Tri')).json();
  const send = async () => {
    const answer = await bookkeeper.post(`/api/imports?supplierId=${suppliers.rows[0].id}`, {
      data: 'Ticket,Date,Description,Qty,Amount\n9001,11/03/2026,Pump hours,3.00,375.00\n',
      headers: { 'content-type': 'text/csv', 'x-file-name': 'twice.csv' },
    });
    return answer.json();
  };
  const [first, again] = [await send(), await send()];
  expect(again).toMatchObject({ importId: first.importId, repeated: true });
  await bookkeeper.delete(`/api/imports/${first.importId}`);
  await bookkeeper.dispose();
});
