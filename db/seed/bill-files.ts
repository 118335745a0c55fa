import type Decimal from 'decimal.js';
import { type Money, sumMoney } from '../../lib/domain/money/money';
import { type BillRow, makeBill } from './bills';
import type { SupplierKey } from './story';

/** Each supplier's own way of writing a statement, so that the importer meets four styles. */
interface BillFile {
  readonly name: string;
  readonly bytes: Buffer;
}

const MONTHS = ['JAN', 'FEB', 'MAR', 'APR', 'MAY', 'JUN', 'JUL', 'AUG', 'SEP', 'OCT', 'NOV', 'DEC'];

function grouped(value: Decimal, places = 2): string {
  const [whole = '0', fraction] = value.toFixed(places).split('.');
  return `${whole.replace(/\B(?=(\d{3})+$)/g, ',')}${fraction ? `.${fraction}` : ''}`;
}

function slashed(date: string): string {
  const [year = '', month, day] = date.split('-');
  return `${month}/${day}/${year.slice(2)}`;
}

function named(date: string): string {
  const [year, month, day] = date.split('-');
  return `${day}-${MONTHS[Number(month) - 1]}-${year}`;
}

function quoted(cell: string, delimiter: string): string {
  return cell.includes(delimiter) || cell.includes('"') ? `"${cell.replaceAll('"', '""')}"` : cell;
}

function lines(rows: readonly (readonly string[])[], delimiter: string, end: string): string {
  return (
    rows.map((row) => row.map((cell) => quoted(cell, delimiter)).join(delimiter)).join(end) + end
  );
}

function totalOf(rows: readonly BillRow[]): Money {
  return sumMoney(rows.map((row) => row.amount as Money));
}

function lastDay(month: string): string {
  return month === '2026-10' ? '31' : '30';
}

function statementNumber(prefix: string, month: string): string {
  return `${prefix}-${month.slice(2).replace('-', '')}`;
}

/** Comma, US dates, dollar signs, a letterhead above the table and balances below it. */
function cinderRidge(month: string, rows: readonly BillRow[]): Buffer {
  const total = totalOf(rows);
  const [year, mm] = month.split('-');
  const table = [
    ['Cinder Ridge Ready-Mix'],
    ['Statement', statementNumber('CR', month)],
    ['Account', 'BLU-044', 'Bluestem Flatwork'],
    ['Period', `${mm}/01/${year} - ${mm}/${lastDay(month)}/${year}`],
    [],
    [
      'Date',
      'Invoice',
      'Ticket',
      'Job',
      'Truck',
      'Description',
      'Mix',
      'Qty',
      'UM',
      'Price',
      'Amount',
    ],
    ...rows.map((row) => [
      slashed(row.date),
      row.invoice,
      row.ticket,
      row.job,
      row.truck,
      row.description,
      row.mixCode,
      row.charge === 'tax' ? '' : grouped(row.quantity),
      row.charge === 'tax' ? '' : row.unit,
      row.charge === 'tax' ? '' : `$${grouped(row.price)}`,
      `$${grouped(row.amount)}`,
    ]),
    ['', '', '', '', '', 'Total', '', '', '', '', `$${grouped(total)}`],
  ];
  return Buffer.from(lines(table, ',', '\r\n'), 'utf8');
}

/** Semicolons, 14-NOV-2026, ticket numbers without their dash, a byte-order mark. */
function halvorsen(month: string, rows: readonly BillRow[]): Buffer {
  const table = [
    ['HALVORSEN CONCRETE', `STATEMENT ${statementNumber('HC', month)}`],
    [
      'Ticket #',
      'Delivered',
      'Job name',
      'Product',
      'Description',
      'Quantity',
      'Unit',
      'Unit price',
      'Ext price',
      'Inv no',
    ],
    ...rows.map((row) => [
      row.ticket.replace('-', ''),
      named(row.date),
      row.job,
      row.mixCode,
      row.description,
      row.charge === 'tax' ? '' : grouped(row.quantity),
      row.charge === 'tax' ? '' : row.unit,
      row.charge === 'tax' ? '' : grouped(row.price),
      grouped(row.amount),
      row.invoice,
    ]),
  ];
  return Buffer.from(`\uFEFF${lines(table, ';', '\n')}`, 'utf8');
}

/** ISO dates, a work order for a ticket, no invoice numbers. */
function longreach(_month: string, rows: readonly BillRow[]): Buffer {
  const table = [
    ['Work order', 'Date', 'Site', 'Charge', 'Units', 'UM', 'Rate', 'Total'],
    ...rows.map((row) => [
      row.ticket,
      row.date,
      row.job,
      row.description,
      row.quantity.toFixed(2),
      row.unit,
      row.price.toFixed(2),
      row.amount.toFixed(2),
    ]),
  ];
  return Buffer.from(lines(table, ',', '\n'), 'utf8');
}

/** Tabs and Windows-1252, with an en dash that is no UTF-8. */
function triCounty(_month: string, rows: readonly BillRow[]): Buffer {
  const table = [
    ['Ticket', 'Date', 'Job', 'Description', 'Qty', 'UM', 'Unit price', 'Amount'],
    ...rows.map((row) => [
      row.ticket,
      slashed(row.date),
      row.job,
      `Line pump \u2013 ${row.description}`,
      grouped(row.quantity),
      row.unit,
      grouped(row.price),
      grouped(row.amount),
    ]),
  ];
  // latin1 leaves everything but the dash as Windows-1252 has it.
  const text = lines(table, '\t', '\r\n').replaceAll('\u2013', '\u0096');
  return Buffer.from(text, 'latin1');
}

const STYLES = { cinderRidge, halvorsen, longreach, triCounty };
export const BILLING_SUPPLIERS = Object.keys(STYLES) as (keyof typeof STYLES)[];

/** The statement of `supplier` for `month` ("2026-11") as the file it would send. */
export function billFile(supplier: keyof typeof STYLES, month: string): BillFile {
  const rows = makeBill(supplier, month);
  const slug: Partial<Record<SupplierKey, string>> = {
    cinderRidge: 'cinder-ridge',
    halvorsen: 'halvorsen',
    longreach: 'longreach',
    triCounty: 'tri-county',
  };
  return { name: `${slug[supplier]}-${month}.csv`, bytes: STYLES[supplier](month, rows) };
}
