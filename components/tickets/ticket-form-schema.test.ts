import { expect, test } from 'vitest';
import { emptyForm, fillable, ticketForm } from './ticket-form-schema';

const id = '3f0e2c66-5d4e-4a5f-9f61-0a3c1de8a001';
const filled = emptyForm({
  number: '558142',
  supplierId: id,
  jobId: id,
  date: '2026-09-03',
  quantityYd3: '10',
});

test('empty fields become nothing, times minutes, a comma a point', () => {
  const parsed = ticketForm.parse({ ...filled, quantityYd3: '9,5', batchedAt: '07:26' });
  expect(parsed).toMatchObject({
    quantityYd3: '9.5',
    batchedAt: 446,
    arrivedAt: null,
    placementId: null,
    truck: null,
    returnedYd3: null,
  });
});

test('a pour past midnight goes on counting', () => {
  const parsed = ticketForm.parse({ ...filled, batchedAt: '23:40', arrivedAt: '00:10' });
  expect(parsed).toMatchObject({ batchedAt: 1420, arrivedAt: 1450 });
});

test('what is missing and what is wrong is said at its field', () => {
  const wrong = { ...filled, number: '', supplierId: '', quantityYd3: 'ten', loadNumber: '2.5' };
  const parsed = ticketForm.safeParse(wrong);
  const issues = parsed.error?.issues.map((issue) => [issue.path[0], issue.message]);
  expect(issues).toContainEqual(['number', 'needed']);
  expect(issues).toContainEqual(['supplierId', 'needed']);
  expect(issues).toContainEqual(['quantityYd3', 'a number such as 12.50']);
  expect(issues?.map(([field]) => field)).toContain('loadNumber');
});

test('a reading fills what is empty and untouched, never what a person typed', () => {
  const suggestion = {
    values: { number: '558142', truck: '187', mixCode: '4000AE', date: '2026-09-04' },
    orderId: id,
    doubtful: [],
    boxes: {},
  };
  const form = emptyForm({ truck: '178', date: '2026-09-03' });
  const fields = fillable(suggestion, form, new Set(['mixCode'])).map(([field]) => field);
  expect(fields).toEqual(['number', 'date', 'orderId']);
});
