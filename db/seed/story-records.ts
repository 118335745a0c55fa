import Decimal from 'decimal.js';
import type { OrderFacts, PumpTicketFacts, TicketFacts } from '../../lib/domain/facts';
import { quantity } from '../../lib/domain/money/money';
import type { RateSheetFacts } from '../../lib/domain/rating/clauses';
import type { ClockMinutes } from '../../lib/domain/time/clock-minutes';
import { parseClock } from '../../lib/domain/time/clock-minutes';
import { JOBS, POURS, type StoryPour, SUPPLIERS } from './story';

/**
 * The story as the facts that rating reasons about. Ids are readable keys; the loader gives
 * the database its own.
 */
export interface StoryFacts {
  readonly rateSheets: RateSheetFacts[];
  readonly orders: OrderFacts[];
  readonly tickets: TicketFacts[];
  readonly pumpTickets: PumpTicketFacts[];
}

const HAUL_MINUTES = 25;

function clock(text: string): ClockMinutes {
  const minutes = parseClock(text);
  if (minutes === null) throw new Error(`The story has a time that is none: ${text}`);
  return minutes;
}

export function ticketNumber(supplier: StoryPour['supplier'], serial: number): string {
  return supplier === 'halvorsen' ? `H-${serial}` : String(serial);
}

const TRUCKS = { cinderRidge: ['187', '214', '203'], halvorsen: ['41', '44', '38'] } as const;

/** The loads of one pour, a truck every `spacing` minutes, times varied a little but fixed. */
export function ticketsOf(pour: StoryPour): TicketFacts[] {
  const job = JOBS.find((one) => one.key === pour.job);
  return pour.loads.map((yards, index) => {
    const batchedAt = clock(pour.firstBatch) + pour.spacing * index;
    const arrivedAt = batchedAt + HAUL_MINUTES + ((pour.firstTicket + index * 7) % 4);
    const startedAt = arrivedAt + 3 + ((pour.firstTicket + index * 5) % 4);
    const discharge = new Decimal(yards).times('2.6').ceil().toNumber();
    const finishedAt = startedAt + discharge + (pour.slow?.[index + 1] ?? 0);
    const serial = pour.firstTicket + index;
    return {
      id: `${pour.supplier}:${serial}`,
      number: ticketNumber(pour.supplier, serial),
      supplierId: pour.supplier,
      orderId: pour.orderNumber,
      jobId: pour.job,
      jobName: job?.name ?? null,
      date: pour.date,
      plant: pour.supplier === 'cinderRidge' ? 'North' : '2',
      truck: TRUCKS[pour.supplier][index % 3] ?? null,
      loadNumber: index + 1,
      mixCode: pour.mix,
      quantityYd3: quantity(yards),
      returnedYd3: null,
      batchedAt,
      arrivedAt,
      startedAt,
      finishedAt,
      leftAt: finishedAt + 6,
    };
  });
}

function sheetsOf(): RateSheetFacts[] {
  return SUPPLIERS.flatMap((supplier) =>
    supplier.sheets.map((sheet) => ({
      id: `${supplier.key}:v${sheet.version}`,
      supplierId: supplier.key,
      jobId: null,
      name: sheet.name,
      version: sheet.version,
      effectiveFrom: sheet.from,
      effectiveTo: sheet.to,
      clauses: sheet.clauses.map((clause, index) => ({
        id: `${supplier.key}:v${sheet.version}:${index}`,
        clause,
      })),
    })),
  );
}

function orderOf(pour: StoryPour): OrderFacts {
  return {
    id: pour.orderNumber,
    number: pour.orderNumber,
    supplierId: pour.supplier,
    jobId: pour.job,
    jobName: JOBS.find((one) => one.key === pour.job)?.name ?? null,
    date: pour.date,
    mixCode: pour.mix,
    orderedYd3: quantity(pour.orderedYd3),
    firstTruckAt: clock(pour.firstBatch) + HAUL_MINUTES,
    spacingMinutes: pour.spacing || null,
    taxable: true,
  };
}

function pumpTicketOf(pour: StoryPour): PumpTicketFacts[] {
  if (!pour.pump) return [];
  const pumped = pour.loads.reduce((sum, yards) => sum.plus(yards), new Decimal(0));
  return [
    {
      id: `${pour.pump.supplier}:${pour.pump.number}`,
      number: pour.pump.number,
      supplierId: pour.pump.supplier,
      orderId: null,
      jobId: pour.job,
      jobName: JOBS.find((one) => one.key === pour.job)?.name ?? null,
      date: pour.date,
      leftYardAt: clock(pour.pump.leftYard),
      arrivedAt: clock(pour.pump.arrived),
      finishedAt: clock(pour.pump.finished),
      leftAt: clock(pour.pump.left),
      backInYardAt: clock(pour.pump.back),
      pumpedYd3: quantity(pumped),
      setUps: 1,
    },
  ];
}

export function storyFacts(): StoryFacts {
  return {
    rateSheets: sheetsOf(),
    orders: POURS.map(orderOf),
    tickets: POURS.flatMap(ticketsOf),
    pumpTickets: POURS.flatMap(pumpTicketOf),
  };
}
