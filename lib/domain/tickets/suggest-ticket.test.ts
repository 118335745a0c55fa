import { expect, test } from 'vitest';
import { suggestTicket } from './suggest-ticket';

const field = (value: string, doubtful = false) => ({ value, doubtful, box: null });
const context = {
  pourDate: '2026-09-03',
  suppliers: [
    { id: 'cinder', name: 'Cinder Ridge Ready-Mix' },
    { id: 'halvorsen', name: 'Halvorsen Concrete' },
  ],
  orders: [
    {
      id: 'order-1',
      number: 'CR-1187',
      supplierReference: '60415',
      supplierId: 'cinder',
      mixCodes: ['4000AE'],
    },
  ],
};
const sure = {
  ticketNumber: field('558142'),
  supplierName: field('CINDER RIDGE READY MIX, INC.'),
  date: field('2026-09-03'),
  mixCode: field('4000AE'),
  quantityYd3: field('10.00'),
};

test('a clean reading that fits the order leaves nothing to look at', () => {
  expect(suggestTicket(sure, context)).toMatchObject({
    values: { number: '558142', supplierId: 'cinder', date: '2026-09-03', quantityYd3: '10.00' },
    orderId: 'order-1',
    doubtful: [],
  });
});

test('what the reader doubts stays doubtful under the ticket’s own field name', () => {
  const read = { ...sure, ticketNumber: field('55B142', true) };
  expect(suggestTicket(read, context).doubtful).toEqual(['number']);
});

test('a missing number, quantity or supplier is asked for, never passed over', () => {
  const nothing = suggestTicket({}, { ...context, orders: [] });
  expect(nothing.doubtful.sort()).toEqual(['number', 'quantityYd3', 'supplierId']);
});

test('with no name on the paper the only supplier ordered from is taken', () => {
  const { supplierName: _, ...read } = sure;
  const suggestion = suggestTicket(read, context);
  expect(suggestion.values.supplierId).toBe('cinder');
  expect(suggestion.doubtful).toEqual([]);
});

test('a supplier nobody ordered from, and a name nobody knows, are doubtful', () => {
  const other = { ...sure, supplierName: field('Halvorsen Concrete') };
  expect(suggestTicket(other, context)).toMatchObject({
    values: { supplierId: 'halvorsen' },
    orderId: null,
    doubtful: ['supplierId'],
  });
  const unknown = { ...sure, supplierName: field('Somewhere Sand & Gravel') };
  expect(suggestTicket(unknown, context).doubtful).toEqual(['supplierId']);
});

test('a slightly misread name is resolved but shown', () => {
  const read = { ...sure, supplierName: field('Cindor Rldge Ready-M1x') };
  expect(suggestTicket(read, context)).toMatchObject({
    values: { supplierId: 'cinder' },
    doubtful: ['supplierId'],
  });
});

test('a mix that was not ordered, another day and an impossible load are doubtful', () => {
  const read = {
    ...sure,
    mixCode: field('3000'),
    date: field('2026-08-03'),
    quantityYd3: field('100.0'),
  };
  expect(suggestTicket(read, context).doubtful.sort()).toEqual(['date', 'mixCode', 'quantityYd3']);
});

test('the order is found by the supplier’s own reference among several', () => {
  const second = {
    ...context.orders[0],
    id: 'order-2',
    number: 'CR-1188',
    supplierReference: '60416',
  };
  const orders = [...context.orders, { ...second, supplierId: 'cinder', mixCodes: ['4000AE'] }];
  const read = { ...sure, orderNumber: field('60416') };
  expect(suggestTicket(read, { ...context, orders }).orderId).toBe('order-2');
  expect(suggestTicket(sure, { ...context, orders }).orderId).toBeNull();
});
