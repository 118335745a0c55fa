import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { BILLING_SUPPLIERS, billFile } from './bill-files';
import { makeBill } from './bills';
import { PLANTS } from './planted';

const MONTHS = ['2026-09', '2026-10', '2026-11'];

describe('the demo’s statements', () => {
  it('stand in tests/fixtures/statements as the story makes them (npm run demo-bills)', () => {
    for (const month of MONTHS) {
      for (const supplier of BILLING_SUPPLIERS) {
        const { name, bytes } = billFile(supplier, month);
        const file = path.join('tests', 'fixtures', 'statements', name);
        const isBilled = makeBill(supplier, month).length > 0;
        expect(existsSync(file), file).toBe(isBilled);
        if (isBilled) expect(readFileSync(file).equals(bytes), file).toBe(true);
      }
    }
  });

  it('are told in the demo’s README, every planted variance at its place', () => {
    const text = readFileSync(path.join('db', 'seed', 'README.md'), 'utf8');
    for (const plant of PLANTS) expect(text, plant.on).toContain(plant.on);
  });

  it('have every kind of variance planted somewhere, but what the story can’t leave unproven', () => {
    const kinds = new Set(PLANTS.map((plant) => plant.kind));
    expect([...kinds].sort()).toMatchInlineSnapshot(`
      [
        "arithmeticWrong",
        "billedNotDelivered",
        "billedTwice",
        "deliveredNotBilled",
        "feeNotAgreed",
        "mixDiffers",
        "priceDiffers",
        "pumpHoursDiffer",
        "pumpMinimumWrong",
        "pumpYardsDiffer",
        "shortLoadNotOwed",
        "shortLoadWrongAmount",
        "taxWrong",
        "waitingNotOwed",
        "waitingWrongAmount",
        "waitingWrongMinutes",
        "yardsDiffer",
      ]
    `);
  });
});
