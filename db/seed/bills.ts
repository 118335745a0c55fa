import Decimal from 'decimal.js';
import type { ChargeKind } from '../../lib/domain/facts';
import { money, roundCents } from '../../lib/domain/money/money';
import { expectedBill } from '../../lib/domain/rating/expected-bill';
import type { Plant } from './planted';
import { PLANTS } from './planted';
import type { SupplierKey } from './story';
import { type StoryFacts, storyFacts } from './story-records';

/** A line as the invented supplier bills it, before it is written in that supplier's style. */
export interface BillRow {
  readonly date: string;
  readonly invoice: string;
  readonly ticket: string;
  readonly job: string;
  readonly truck: string;
  readonly charge: ChargeKind;
  readonly description: string;
  readonly mixCode: string;
  readonly quantity: Decimal;
  readonly unit: string;
  readonly price: Decimal;
  readonly amount: Decimal;
}

const CHARGE_ORDER: readonly ChargeKind[] = [
  'mix',
  'pumpTime',
  'pumpMinimum',
  'pumpYards',
  'pumpSetUp',
  'shortLoad',
  'waiting',
  'perLoadFee',
  'perYardFee',
  'other',
  'tax',
];

const UNITS: Partial<Record<ChargeKind, string>> = {
  mix: 'YD',
  waiting: 'MIN',
  perYardFee: 'YD',
  pumpTime: 'HR',
  pumpYards: 'YD',
};

const WORDS: Partial<Record<ChargeKind, string>> = {
  mix: 'Concrete',
  shortLoad: 'Short load charge',
  waiting: 'Waiting time',
  pumpTime: 'Pump hours',
  pumpYards: 'Yards pumped',
  pumpSetUp: 'Set-up',
};

/** The invoice of a day's order: the digits of its number behind a 9. */
function invoiceOf(orderNumber: string): string {
  return `9${orderNumber.replace(/\D/g, '')}`;
}

/** What the supplier bills for a month: the agreed charges, spoilt by the planted errors. */
export function makeBill(supplier: SupplierKey, month: string): BillRow[] {
  const facts = storyFacts();
  const plants = PLANTS.filter((plant) => plant.supplier === supplier && plant.month === month);
  const honest = honestRows(facts, supplier);
  const inMonth = honest.filter((row) => row.date.startsWith(month));
  const spoilt = plants.reduce((rows, plant) => spoil(rows, plant, honest), inMonth);
  const sorted = spoilt
    .map((row, index) => ({ row, index }))
    .sort(
      (a, b) =>
        a.row.date.localeCompare(b.row.date) ||
        a.row.ticket.localeCompare(b.row.ticket) ||
        CHARGE_ORDER.indexOf(a.row.charge) - CHARGE_ORDER.indexOf(b.row.charge) ||
        a.index - b.index,
    )
    .map(({ row }) => row);
  return withTax(sorted, facts, supplier, plants);
}

function honestRows(facts: StoryFacts, supplier: SupplierKey): BillRow[] {
  const mine = <T extends { supplierId: string }>(rows: readonly T[]) =>
    rows.filter((row) => row.supplierId === supplier);
  const bill = expectedBill({
    rateSheets: mine(facts.rateSheets),
    orders: mine(facts.orders),
    tickets: mine(facts.tickets),
    pumpTickets: mine(facts.pumpTickets),
  });
  return bill.lines.flatMap((line): BillRow[] => {
    if (line.chargeKind === 'tax') return [];
    if (line.status !== 'owed') throw new Error(`The story lacks a fact for ${line.label}`);
    const ticket = facts.tickets.find((one) => line.ticketIds.includes(one.id));
    const pumpTicket = facts.pumpTickets.find((one) => line.pumpTicketIds.includes(one.id));
    const delivery = ticket ?? pumpTicket;
    if (!delivery) throw new Error(`No delivery for ${line.label}`);
    const unit = UNITS[line.chargeKind] ?? 'EA';
    return [
      {
        date: line.date,
        invoice: ticket?.orderId ? invoiceOf(ticket.orderId) : '',
        ticket: delivery.number,
        job: delivery.jobName ?? '',
        truck: ticket?.truck ?? '',
        charge: line.chargeKind,
        description:
          line.chargeKind === 'mix'
            ? `Concrete ${ticket?.mixCode ?? ''}`
            : (WORDS[line.chargeKind] ?? feeWords(line.label)),
        mixCode: line.chargeKind === 'mix' ? (ticket?.mixCode ?? '') : '',
        quantity: line.quantity,
        unit,
        price: line.rate,
        amount: line.amount,
      },
    ];
  });
}

/** "Environmental" of whatever the engine calls the fee's line. */
function feeWords(label: string): string {
  return /environmental/i.test(label) ? 'Environmental' : 'Fuel';
}

function priced(row: BillRow, change: Partial<BillRow>): BillRow {
  const next = { ...row, ...change };
  return { ...next, amount: roundCents(next.quantity.times(next.price)) };
}

function spoil(rows: BillRow[], plant: Plant, honest: readonly BillRow[]): BillRow[] {
  const { change } = plant;
  const isOn = (charge: string) => (row: BillRow) =>
    row.ticket === plant.on && row.charge === charge;
  const alter = (charge: string, how: (row: BillRow) => BillRow): BillRow[] => {
    if (!rows.some(isOn(charge))) throw new Error(`Nothing to spoil: ${plant.on} ${charge}`);
    return rows.map((row) => (isOn(charge)(row) ? how(row) : row));
  };
  switch (change.do) {
    case 'quantity':
      return alter(change.charge, (row) => priced(row, { quantity: new Decimal(change.quantity) }));
    case 'price':
      return alter(change.charge, (row) => priced(row, { price: new Decimal(change.price) }));
    case 'amount':
      return alter(change.charge, (row) => ({ ...row, amount: money(change.amount) }));
    case 'mix':
      return alter('mix', (row) =>
        priced(row, {
          mixCode: change.mixCode,
          description: `Concrete ${change.mixCode}`,
          price: new Decimal(change.price),
        }),
      );
    case 'leaveOut':
      return rows.filter((row) => row.ticket !== plant.on);
    case 'repeat': {
      const again = honest.find(isOn(change.charge));
      if (!again) throw new Error(`Nothing to repeat: ${plant.on}`);
      return [...rows, { ...again, date: change.date, invoice: `${again.invoice}-2` }];
    }
    case 'add': {
      const base = rows.find((row) => row.ticket === plant.on);
      if (!base) throw new Error(`Nothing to add to: ${plant.on}`);
      const added = priced(base, {
        charge: change.charge as ChargeKind,
        description: change.description,
        mixCode: '',
        quantity: new Decimal(change.quantity),
        unit: change.unit,
        price: new Decimal(change.price),
      });
      return [...rows, added];
    }
    case 'phantom':
      return [
        ...rows,
        ...rows
          .filter((row) => row.ticket === change.like && row.charge !== 'waiting')
          .map((row) => ({ ...row, ticket: plant.on, truck: '219' })),
      ];
    case 'taxRate':
      return rows;
  }
}

/** A tax line an invoice, on what the invoice bills, as a supplier's own system would. */
function withTax(
  rows: readonly BillRow[],
  facts: StoryFacts,
  supplier: SupplierKey,
  plants: readonly Plant[],
): BillRow[] {
  const clause = facts.rateSheets
    .filter((sheet) => sheet.supplierId === supplier)
    .flatMap((sheet) => sheet.clauses)
    .map((one) => one.clause)
    .find((one) => one.kind === 'tax');
  if (clause?.kind !== 'tax') return [...rows];
  const taxed = new Set<string>(clause.taxes.map((kind) => (kind === 'mixPrice' ? 'mix' : kind)));
  const result: BillRow[] = [];
  rows.forEach((row, index) => {
    result.push(row);
    if (rows.slice(index + 1).some((later) => later.invoice === row.invoice)) return;
    const base = rows
      .filter((one) => one.invoice === row.invoice && taxed.has(one.charge))
      .reduce((sum, one) => sum.plus(one.amount), new Decimal(0));
    const wrong = plants.find((one) => one.change.do === 'taxRate' && one.on === row.invoice);
    const percent = wrong?.change.do === 'taxRate' ? wrong.change.percent : clause.ratePercent;
    const amount = roundCents(base.times(percent).div(100));
    result.push({
      ...row,
      ticket: '',
      truck: '',
      charge: 'tax',
      description: `Sales tax ${percent}%`,
      mixCode: '',
      quantity: new Decimal(1),
      unit: 'EA',
      price: amount,
      amount,
    });
  });
  return result;
}
