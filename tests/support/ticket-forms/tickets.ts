import Decimal from 'decimal.js';
import { JOBS, POURS, SUPPLIERS, TODAYS_POUR } from '../../../db/seed/story';
import { ticketsOf } from '../../../db/seed/story-records';
import type { TicketField } from '../../../importers/ocr/reading';
import { quantityText } from '../../../lib/domain/money/money';
import { clockText, parseClock } from '../../../lib/domain/time/clock-minutes';
import type { FieldText, PrintedTicket } from './printed-ticket';

/**
 * The loads whose tickets are photographed: two pours of the demo's story, today's pour, and a
 * supplier that the demo company has never bought from.
 */
const TIMES = ['batchedAt', 'arrivedAt', 'startedAt', 'finishedAt', 'leftAt'] as const;

const ADDRESSES: Readonly<Record<string, string>> = {
  'Cinder Ridge Ready-Mix': '2200 Cinder Ridge Rd  -  dispatch 555-0118',
  'Halvorsen Concrete': '14 Depot Street  -  555-0142',
  'Sawtooth Concrete': '600 Sawtooth Lane  -  555-0155',
};

const MIX_WORDS: Readonly<Record<string, string>> = {
  '4000P': '4000 PSI PUMP MIX',
  HC40: '4000 PSI AIR',
  'S-5000': '5000 PSI 3/8 STONE',
};

const DRIVERS = ['R. Pell', 'T. Amari', 'J. Okonski', 'L. Brandt'];

function without(fields: FieldText, dropped: readonly TicketField[]): FieldText {
  const entries = Object.entries(fields) as [TicketField, string][];
  return Object.fromEntries(entries.filter(([field]) => !dropped.includes(field)));
}

function printed(fields: FieldText, jobAddress: string, index: number): PrintedTicket {
  return {
    fields,
    supplierAddress: ADDRESSES[fields.supplierName ?? ''] ?? '',
    customer: 'Bluestem Flatwork',
    jobAddress,
    driver: DRIVERS[index % DRIVERS.length] ?? '',
    mixWords: MIX_WORDS[fields.mixCode ?? ''] ?? '',
    slumpIn: '4.00',
    waterAllowedGal: String(12 + index),
  };
}

/** The tickets of a pour of the story, with the yards to date counted up. */
function storyTickets(orderNumber: string): PrintedTicket[] {
  const pour = POURS.find((one) => one.orderNumber === orderNumber);
  if (!pour) throw new Error(`The story has no order ${orderNumber}`);
  const job = JOBS.find((one) => one.key === pour.job);
  const supplier = SUPPLIERS.find((one) => one.key === pour.supplier);
  let toDate = new Decimal(0);
  return ticketsOf(pour).map((ticket, index) => {
    toDate = toDate.plus(ticket.quantityYd3);
    const times = TIMES.flatMap((field): [TicketField, string][] => {
      const minutes = ticket[field];
      return minutes === null ? [] : [[field, clockText(minutes)]];
    });
    const fields: FieldText = {
      ticketNumber: ticket.number,
      supplierName: supplier?.name ?? '',
      date: ticket.date,
      plant: ticket.plant ?? '',
      truck: ticket.truck ?? '',
      orderNumber: pour.orderNumber,
      poNumber: job?.number ?? '',
      jobName: job?.name ?? '',
      mixCode: ticket.mixCode,
      quantityYd3: quantityText(ticket.quantityYd3),
      orderedYd3: pour.orderedYd3,
      toDateYd3: quantityText(toDate),
      loadNumber: String(ticket.loadNumber),
      ...Object.fromEntries(times),
    };
    return printed(fields, job?.address ?? '', index);
  });
}

const TODAYS_TRUCKS = ['203', '187', '214', '221'];

/** Four loads of the pour on 1 December 2026, the demo's present day. */
export function todaysTickets(): PrintedTicket[] {
  const job = JOBS.find((one) => one.key === TODAYS_POUR.job);
  return TODAYS_TRUCKS.map((truck, index) => {
    const batchedAt = (parseClock('07:05') ?? 0) + index * TODAYS_POUR.spacing;
    const fields: FieldText = {
      ticketNumber: String(558901 + index),
      supplierName: 'Cinder Ridge Ready-Mix',
      date: '2026-12-01',
      plant: 'North',
      truck,
      orderNumber: TODAYS_POUR.orderNumber,
      poNumber: job?.number ?? '',
      jobName: job?.name ?? '',
      mixCode: TODAYS_POUR.mix,
      quantityYd3: '10.00',
      orderedYd3: TODAYS_POUR.orderedYd3,
      toDateYd3: `${(index + 1) * 10}.00`,
      loadNumber: String(index + 1),
      batchedAt: clockText(batchedAt),
      arrivedAt: clockText(batchedAt + 26 + (index % 3)),
      startedAt: clockText(batchedAt + 31 + (index % 2)),
      ...(index % 2 === 0 ? { waterAddedGal: String(5 + index) } : {}),
    };
    return printed(fields, job?.address ?? '', index);
  });
}

export function foundryTickets(): PrintedTicket[] {
  const tickets = storyTickets('CR-1187');
  return tickets.map((ticket, index) => {
    // The first two came without a clock on the truck; the others stamp the job times.
    if (index >= 2) return ticket;
    return {
      ...ticket,
      fields: without(ticket.fields, ['arrivedAt', 'startedAt', 'finishedAt', 'leftAt']),
    };
  });
}

export function larkspurTickets(): PrintedTicket[] {
  return storyTickets('H-2207');
}

/** An afternoon pour from a supplier that nobody has told the reader about. */
export function sawtoothTickets(): PrintedTicket[] {
  const loads = [
    ['8.50', '8.50', '13:10', '62', 'North Yard'],
    ['8.50', '17.00', '13:42', '57', 'North Yard'],
    ['6.25', '23.25', '14:19', '62', 'Mill'],
    ['8.00', '8.00', '09:55', '70', 'Mill'],
  ] as const;
  return loads.map(([quantityYd3, toDateYd3, batched, truck, plant], index) => {
    const batchedAt = parseClock(batched) ?? 0;
    const fields: FieldText = {
      ticketNumber: String(70931 + index * 3),
      supplierName: 'Sawtooth Concrete',
      date: index < 3 ? '2026-11-05' : '2026-11-06',
      plant,
      truck,
      orderNumber: index < 3 ? '4417' : '4420',
      jobName: index < 3 ? 'Heron Lane slab' : 'Mill Race apron',
      mixCode: 'S-5000',
      quantityYd3,
      orderedYd3: index < 3 ? '23.25' : '8.00',
      toDateYd3,
      loadNumber: String(index < 3 ? index + 1 : 1),
      batchedAt: clockText(batchedAt),
      arrivedAt: clockText(batchedAt + 22),
      startedAt: clockText(batchedAt + 29),
      finishedAt: clockText(batchedAt + 51),
      leftAt: clockText(batchedAt + 58),
      waterAddedGal: String(index * 4 + 2),
    };
    return printed(fields, '18 Heron Ln', index);
  });
}
