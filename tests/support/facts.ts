import type {
  BillLineFacts,
  OrderFacts,
  PumpTicketFacts,
  TicketFacts,
} from '../../lib/domain/facts';
import { money, quantity } from '../../lib/domain/money/money';
import { type Clause, clauseSchema, type RateSheetFacts } from '../../lib/domain/rating/clauses';
import { parseClock } from '../../lib/domain/time/clock-minutes';

/** Short ways to write the core's facts in tests. Everything not named is plain and agrees. */

const clock = (text: string | null | undefined) => (text ? parseClock(text) : null);

export interface TicketSketch {
  readonly number: string;
  readonly yards?: string;
  readonly mix?: string;
  readonly date?: string;
  readonly truck?: string | null;
  readonly supplier?: string;
  readonly order?: string | null;
  readonly job?: string | null;
  readonly jobName?: string | null;
  readonly load?: number | null;
  readonly batched?: string | null;
  readonly arrived?: string | null;
  readonly started?: string | null;
  readonly finished?: string | null;
  readonly left?: string | null;
}

export function aTicket(sketch: TicketSketch): TicketFacts {
  return {
    id: `t-${sketch.number}`,
    number: sketch.number,
    supplierId: sketch.supplier ?? 'ready',
    orderId: sketch.order ?? null,
    jobId: sketch.job ?? null,
    jobName: sketch.jobName ?? null,
    date: sketch.date ?? '2026-09-03',
    plant: null,
    truck: sketch.truck === undefined ? '214' : sketch.truck,
    loadNumber: sketch.load ?? null,
    mixCode: sketch.mix ?? '4000A',
    quantityYd3: quantity(sketch.yards ?? '10'),
    returnedYd3: null,
    batchedAt: clock(sketch.batched),
    arrivedAt: clock(sketch.arrived === undefined ? '07:26' : sketch.arrived),
    startedAt: clock(sketch.started),
    finishedAt: clock(sketch.finished === undefined ? '07:50' : sketch.finished),
    leftAt: clock(sketch.left),
  };
}

export interface PumpSketch {
  readonly number: string;
  readonly date?: string;
  readonly supplier?: string;
  readonly jobName?: string | null;
  readonly leftYard?: string | null;
  readonly arrived?: string | null;
  readonly finished?: string | null;
  readonly left?: string | null;
  readonly back?: string | null;
  readonly yards?: string;
  readonly setUps?: number;
}

export function aPumpTicket(sketch: PumpSketch): PumpTicketFacts {
  return {
    id: `p-${sketch.number}`,
    number: sketch.number,
    supplierId: sketch.supplier ?? 'pump',
    orderId: null,
    jobId: null,
    jobName: sketch.jobName ?? null,
    date: sketch.date ?? '2026-09-03',
    leftYardAt: clock(sketch.leftYard),
    arrivedAt: clock(sketch.arrived === undefined ? '07:00' : sketch.arrived),
    finishedAt: clock(sketch.finished),
    leftAt: clock(sketch.left === undefined ? '12:00' : sketch.left),
    backInYardAt: clock(sketch.back),
    pumpedYd3: quantity(sketch.yards ?? '60'),
    setUps: sketch.setUps ?? 1,
  };
}

export interface LineSketch {
  readonly at: number;
  readonly kind?: BillLineFacts['chargeKind'];
  readonly ticket?: string | null;
  readonly quantity?: string | null;
  readonly unit?: string | null;
  readonly price?: string | null;
  readonly amount: string;
  readonly mix?: string | null;
  readonly date?: string | null;
  readonly truck?: string | null;
  readonly jobName?: string | null;
  readonly invoice?: string | null;
  readonly supplier?: string;
  readonly says?: string;
}

export function aLine(sketch: LineSketch): BillLineFacts {
  const decimal = (text: string | null | undefined) => (text ? quantity(text) : null);
  return {
    id: `l-${sketch.at}`,
    supplierId: sketch.supplier ?? 'ready',
    position: sketch.at,
    invoiceNumber: sketch.invoice ?? null,
    date: sketch.date === undefined ? '2026-09-03' : sketch.date,
    ticketNumber: sketch.ticket ?? null,
    jobName: sketch.jobName ?? null,
    truck: sketch.truck ?? null,
    chargeKind: sketch.kind ?? 'mix',
    description: sketch.says ?? '',
    mixCode: sketch.mix ?? null,
    quantity: decimal(sketch.quantity),
    unit: sketch.unit ?? null,
    unitPrice: sketch.price ? money(sketch.price) : null,
    amount: money(sketch.amount),
  };
}

export function anOrder(sketch: {
  readonly id: string;
  readonly job?: string | null;
  readonly jobName?: string | null;
  readonly taxable?: boolean;
}): OrderFacts {
  return {
    id: sketch.id,
    number: sketch.id,
    supplierId: 'ready',
    jobId: sketch.job ?? null,
    jobName: sketch.jobName ?? null,
    date: '2026-09-03',
    mixCode: null,
    orderedYd3: quantity('50'),
    firstTruckAt: null,
    spacingMinutes: null,
    taxable: sketch.taxable ?? true,
  };
}

/** A sheet of clauses as they come in from JSON; clause ids are `${id}-1`, `${id}-2`… */
export function aSheet(
  clauses: readonly unknown[],
  sketch: Partial<Omit<RateSheetFacts, 'clauses'>> = {},
): RateSheetFacts {
  const id = sketch.id ?? 'sheet';
  const read = (clause: unknown): Clause => clauseSchema.parse(clause);
  return {
    id,
    supplierId: 'ready',
    jobId: null,
    name: 'Rate sheet 2026',
    version: 1,
    effectiveFrom: '2026-01-01',
    effectiveTo: null,
    ...sketch,
    clauses: clauses.map((clause, at) => ({ id: `${id}-${at + 1}`, clause: read(clause) })),
  };
}
