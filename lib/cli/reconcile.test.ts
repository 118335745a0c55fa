import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import { afterEach, expect, test } from 'vitest';
import { z } from 'zod';

const root = path.resolve(import.meta.dirname, '../..');
const fixture = (name: string) => path.join(root, 'tests/fixtures/reconcile', name);
const run = promisify(execFile);
const folders: string[] = [];

afterEach(async () => {
  for (const folder of folders.splice(0)) await rm(folder, { recursive: true });
});

function reconcileWith(bill: string) {
  return run(
    path.join(root, 'node_modules/.bin/tsx'),
    [
      path.join(root, 'lib/cli/reconcile.ts'),
      ...['--rates', fixture('rates.json'), '--tickets', fixture('tickets.csv')],
      ...['--orders', fixture('orders.csv'), '--pump', fixture('pump.csv'), '--bill', bill],
    ],
    { cwd: root },
  );
}

async function changedBill(change: (text: string) => string): Promise<string> {
  const folder = await mkdtemp(path.join(tmpdir(), 'reconcile-'));
  folders.push(folder);
  const file = path.join(folder, 'bill.csv');
  await writeFile(file, change(await readFile(fixture('bill.csv'), 'utf8')));
  return file;
}

const output = z.object({
  variances: z.array(
    z.object({ kind: z.string(), billLineId: z.string().nullable(), difference: z.string() }),
  ),
  totals: z.record(z.string(), z.unknown()),
});

test('the worked example gives the variances and totals that its README section lists', async () => {
  const { stdout } = await reconcileWith(fixture('bill.csv'));
  const expected = JSON.parse(await readFile(fixture('expected.json'), 'utf8'));
  const { variances, totals } = output.parse(JSON.parse(stdout));
  const found = variances.map(({ kind, billLineId, difference }) => [kind, billLineId, difference]);
  expect(found).toEqual(expected.variances);
  expect(totals).toMatchObject(expected.totals);
});

test('bad cells end with 1 and a sentence each, with file, row and column', async () => {
  const bill = await changedBill((text) =>
    text
      .replace('10.50,YD,158.00,1659.00', 'ten,YD,158.00,1659.00')
      .replace(',mix,4000', ',mud,4000'),
  );
  const failure = z
    .object({ code: z.literal(1), stdout: z.literal(''), stderr: z.string() })
    .parse(await reconcileWith(bill).catch((error: unknown) => error));
  expect(failure.stderr.trim().split('\n')).toEqual([
    expect.stringMatching(/bill\.csv, row 2, column charge: wants one of mix, .*got "mud"\.$/),
    expect.stringMatching(/bill\.csv, row 2, column quantity: wants a number .*got "ten"\.$/),
  ]);
});

test('a misspelt column is told, not ignored', async () => {
  const bill = await changedBill((text) => text.replace('unitPrice', 'unit_price'));
  const failure = z
    .object({ code: z.literal(1), stderr: z.string() })
    .parse(await reconcileWith(bill).catch((error: unknown) => error));
  expect(failure.stderr).toContain('row 1, column unit_price: is not a column that is read here');
});
